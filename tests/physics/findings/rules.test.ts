import { describe, expect, it } from 'vitest';
import { demoCircuit } from '#shared/circuit/samples/demo.ts';
import type { Assessment, Figure, Finding, FindingRule, Phrase } from '#shared/findings/finding.ts';
import { assess, bar, changed, cubic, litresPerMinute } from '#tests/support/synthetic-run.ts';

const rulesOf = (assessment: Assessment) => assessment.findings.map((finding) => finding.rule);
function find(assessment: Assessment, rule: FindingRule): Finding {
  const finding = assessment.findings.find((entry) => entry.rule === rule);
  if (!finding) throw new Error(`no finding ${rule}, only ${rulesOf(assessment).join(', ')}`);
  return finding;
}
const figures = (phrase: Phrase): Figure[] => phrase.filter((part): part is Figure => typeof part !== 'string');
const words = (phrase: Phrase) => phrase.filter((part) => typeof part === 'string').join('');
const values = (phrase: Phrase) => figures(phrase).map((figure) => figure.value);
/** Motor torque of the demo: 5.5 kW at 1450 rpm gives 36.2 N·m, pull-out twice that. */
const RATED = 5500 / ((1450 * Math.PI) / 30);

describe('a press that does its work', () => {
  it('is within limits and says how long the job takes', () => {
    const result = assess();
    expect(result.verdict.id).toBe('within-limits');
    expect(rulesOf(result)).toEqual(['within-limits']);
    expect(words(find(result, 'within-limits').headline)).toContain('Within limits');
  });

  it('never says that anything holds or is safe', () => {
    const text = JSON.stringify([assess(), assess({ document: changed({ 'V2.setPressure': 120 * bar }) })]);
    expect(text).not.toMatch(/\bsafe\b|\bholds\b/i);
  });
});

describe('motor', () => {
  const stall = (t: number) => (t < 0.1 ? (153 * t) / 0.1 : t < 2.1 ? 148 : Math.max(2.4, 148 - 1500 * (t - 2.1)));
  it('stalls: falls below pull-out speed and is not back half a second later', () => {
    const result = assess({
      channels: {
        'M1.speed': stall,
        'M1.current': (t) => (t > 2.2 ? 65 : 11),
        'M1.torque': (t) => (t > 2.2 ? 57 : 60),
        'P1.outlet.pressure': 155 * bar,
        'P1.displacement': 28 * cubic,
      },
    });
    expect(result.verdict).toMatchObject({ id: 'motor-stalls', word: 'Motor stalls' });
    const finding = find(result, 'motor-stalls');
    expect(finding.time).toBeGreaterThan(2.1);
    expect(finding.time).toBeLessThan(2.15);
    expect(values(finding.cause)[0]).toBeCloseTo(155 * bar, -3);
    expect(values(finding.cause)[2]).toBeCloseTo(2 * RATED, 0);
    expect(finding.remedy?.seek).toMatchObject({ target: 'P1', field: 'maxVolumeStop', want: 'largest' });
    expect(finding.caution).toContain('Find the cause before resetting.');
    expect(result.yardsticks[0]).toMatchObject({ stalled: true, stallMargin: null });
    expect(result.yardsticks[0]?.stallCurrent).toBeCloseTo(65, 6);
  });

  it('dips and recovers within half a second: a finding, not a stall', () => {
    const result = assess({ channels: { 'M1.speed': (t) => (t < 0.1 ? (153 * t) / 0.1 : t > 2 && t < 2.3 ? 60 : 150) } });
    expect(result.verdict.id).toBe('within-limits');
    expect(find(result, 'dips-and-recovers').time).toBeCloseTo(2, 1);
    expect(rulesOf(result)).not.toContain('motor-stalls');
  });

  it('switched off is no stall', () => {
    const off = (t: number) => (t > 5 ? 0 : 1);
    const result = assess({
      channels: {
        'M1.speed': (t) => (t < 0.1 ? (153 * t) / 0.1 : t > 5 ? Math.max(0, 150 - 300 * (t - 5)) : 150),
        'M1.current': (t) => 8 * off(t),
        'M1.terminalVoltage': (t) => 400 * off(t),
      },
    });
    expect(rulesOf(result)).not.toContain('motor-stalls');
  });

  it('that never passes pull-out speed does not come up to speed', () => {
    const result = assess({ channels: { 'M1.speed': 40, 'M1.current': 60 } });
    expect(result.verdict).toMatchObject({ id: 'motor-stalls', word: 'Does not come up to speed' });
    expect(words(find(result, 'not-up-to-speed').remedy!.words)).toContain('unloaded');
  });

  it('with 14 A RMS on an 11 A dial trips after τ·ln(x/(x − 1)), x = (14/12.65)²', () => {
    const result = assess({ channels: { 'M1.current': 14 } });
    expect(result.verdict).toMatchObject({ id: 'trips', word: 'Trips' });
    const x = (14 / (1.15 * 11)) ** 2;
    const tau = 7 / Math.log(7.2 ** 2 / (7.2 ** 2 - 1.15 ** 2));
    expect(result.verdict.figure?.value).toBeCloseTo(tau * Math.log(x / (x - 1)), 0);
    expect(find(result, 'will-trip').caution).toContain('a second trip ends the trial');
  });

  it('between nameplate and k × dial is over, and does not trip', () => {
    const result = assess({ channels: { 'M1.current': 12 } });
    expect(result.verdict.id).toBe('over');
    expect(result.verdict.figure?.value).toBeCloseTo(12 / 11, 6);
    expect(result.yardsticks[0]?.tripTime).toBeNull();
  });

  it('ignores run-up: the starting current does not count', () => {
    const result = assess({ channels: { 'M1.current': (t) => (t < 0.25 ? 66 : 8) } });
    expect(result.yardsticks[0]?.rmsCurrent).toBeCloseTo(8 / 11, 6);
  });

  it('has its margin at the lowest supply of the duty', () => {
    const document = {
      ...demoCircuit,
      duty: {
        ...demoCircuit.duty,
        commands: [
          ...demoCircuit.duty.commands,
          { id: 'dip', time: 3, ramp: 0, target: 'supply', input: 'voltage', value: 360, label: 'Dip' },
        ],
      },
    };
    const result = assess({ document, channels: { 'M1.torque': 50, 'M1.terminalVoltage': (t) => (t > 3 ? 360 : 400) } });
    expect(result.yardsticks[0]?.stallMargin).toBeCloseTo((2 * RATED * 0.81) / 50, 1);
    const small = find(result, 'small-stall-margin');
    expect(figures(small.headline)[0]?.rounding).toBe('down');
  });

  it('outside ±10 % volts has no nameplate verdict, only the supply', () => {
    const result = assess({ channels: { 'M1.current': 12, 'M1.terminalVoltage': 348 } });
    const supply = find(result, 'supply-out-of-band');
    expect(values(supply.headline)[0]).toBeCloseTo(0.13, 6);
    expect(words(supply.remedy!.words)).toContain('licensed electrician');
    expect(rulesOf(result)).not.toContain('over-nameplate');
  });
});

describe('relief', () => {
  it('that cracks under dead-head hides the compensator; the cure is a lower compensator, never a higher relief', () => {
    const result = assess({ document: changed({ 'V2.setPressure': 120 * bar }) });
    const finding = find(result, 'relief-before-compensator');
    expect(values(finding.cause)).toEqual([expect.closeTo((120 * bar) / 1.054, 0), 190 * bar]);
    expect(finding.remedy?.seek).toMatchObject({ target: 'P1', field: 'compensatorPressure', want: 'largest', goal: 'compensates-first' });
  });

  it('that passes oil for long is heat; a short opening is not', () => {
    const passing = (t: number) => (t > 2 && t < 5 ? 38 * litresPerMinute : 0);
    const result = assess({
      document: changed({ 'V2.setPressure': 120 * bar }),
      channels: { 'V2.flow': passing, 'V2.heat': (t) => passing(t) * 119 * bar, 'V2.P.pressure': 119 * bar },
    });
    expect(result.verdict).toMatchObject({ id: 'relief-passing' });
    const finding = find(result, 'relief-passing');
    expect(values(finding.headline)[0]).toBeCloseTo(38 * litresPerMinute, 5);
    expect(finding.caution).toContain('never over one minute');
    const short = assess({ channels: { 'V2.flow': (t) => (t > 2 && t < 2.5 ? 38 * litresPerMinute : 0) } });
    expect(rulesOf(short)).not.toContain('relief-passing');
  });

  it('close above dead-head is told from the gap to cracking, not to the set pressure', () => {
    const gaps = (set: number) => assess({ document: changed({ 'V2.setPressure': set * bar }) });
    expect(values(find(gaps(208), 'relief-gap-small').headline)[0]).toBeCloseTo((208 * bar) / 1.054 - 190 * bar, 0);
    expect(rulesOf(gaps(215))).not.toContain('relief-gap-small');
  });

  it('that reseats under dead-head is a note', () => {
    const finding = find(assess({ document: changed({ 'V2.reseat': 0.9 }) }), 'relief-gap-small');
    expect(finding.severity).toBe(3);
    expect(values(finding.cause)[0]).toBeCloseTo((0.9 * 215 * bar) / 1.054, 0);
  });
});

describe('rod', () => {
  const stuck = {
    'A1.position': 0.28,
    'A1.velocity': (t: number) => (t > 0.7 && t < 2 ? 0.2 : 0),
    'A1.loadForce': 36e3,
    'A1.A.pressure': 119 * bar,
    'V3.spool': (t: number) => (t > 0.6 && t < 5.6 ? 1 : 0),
  };
  it('stops short when commanded, at rest, neither at an end nor at its force', () => {
    const result = assess({ document: changed({ 'V2.setPressure': 120 * bar }), channels: { ...stuck, 'V2.P.pressure': 119 * bar } });
    expect(result.verdict.id).toBe('rod-stops-short');
    const finding = find(result, 'rod-stops-short');
    expect(values(finding.headline)).toEqual([expect.closeTo(36e3, 0), 52e3]);
    expect(words(finding.cause)).toContain('V2 opens at');
    expect(finding.remedy?.seek).toBeUndefined();
    expect(words(finding.remedy!.words)).toContain('A higher relief is not a cure');
  });

  it('under a low compensator is offered a higher one, kept under the relief and the lowest rating', () => {
    const result = assess({
      document: changed({ 'P1.compensatorPressure': 125 * bar }),
      channels: { ...stuck, 'P1.outlet.pressure': 124 * bar },
    });
    const seek = find(result, 'rod-stops-short').remedy?.seek;
    expect(seek).toMatchObject({ target: 'P1', field: 'compensatorPressure', want: 'smallest', low: 125 * bar });
    expect(seek!.high).toBeCloseTo((215 * bar) / 1.054 - 10 * bar, 0);
  });

  it('at an end, at its force, at centre or with the motor stalled does not', () => {
    for (const channels of [
      { ...stuck, 'A1.position': 0.5 },
      { ...stuck, 'A1.loadForce': 52e3 },
      { ...stuck, 'V3.spool': 0 },
      { ...stuck, 'M1.speed': (t: number) => (t < 0.1 ? (153 * t) / 0.1 : t < 0.7 ? 150 : 3) },
    ]) {
      expect(rulesOf(assess({ channels }))).not.toContain('rod-stops-short');
    }
  });

  it('that gets too little of the pump’s flow is told where it goes', () => {
    const phases = [{ label: 'Solenoid a on', from: 0.6, to: 5.2, channels: {} }];
    const moving = {
      'A1.velocity': (t: number) => (t > 0.6 && t < 4 ? 0.08 : 0),
      'A1.A.flow': 15 * litresPerMinute,
      'P1.caseFlow': 9 * litresPerMinute,
      'P1.displacement': 28 * cubic,
    };
    const finding = find(assess({ channels: moving, run: { phases } }), 'slower-than-pump');
    expect(words(finding.cause)).toContain('through the case drain');
    const all = assess({ channels: { ...moving, 'A1.A.flow': 39 * litresPerMinute }, run: { phases } });
    expect(rulesOf(all)).not.toContain('slower-than-pump');
  });
});

describe('ratings and protection', () => {
  it('a pressure above a plate’s rating is a trial', () => {
    const result = assess({ document: changed({ 'A1.ratedPressure': 140 * bar }), channels: { 'A1.highestPressure': 150 * bar } });
    expect(result.verdict).toMatchObject({ id: 'above-rating', word: 'Above rating' });
    const finding = result.findings.find((entry) => entry.id === 'above-rating:A1.ratedPressure')!;
    expect(values(finding.cause)).toEqual([150 * bar, 140 * bar]);
  });

  it('a compensator set above the lowest rating on its net is a trial, reached or not', () => {
    const result = assess({ document: changed({ 'P1.compensatorPressure': 260 * bar, 'V2.setPressure': 300 * bar }) });
    expect(result.findings.map((finding) => finding.id)).toEqual(
      expect.arrayContaining(['above-rating:P1.compensatorPressure', 'above-rating:V2.setPressure']),
    );
  });

  it('a pump without a relief is said, and the verdict says why', () => {
    const document = {
      ...demoCircuit,
      components: demoCircuit.components.filter((component) => component.id !== 'V2'),
      lines: demoCircuit.lines.filter((line) => line.id !== 'L5' && line.id !== 'L6'),
    };
    const result = assess({ document });
    expect(result.verdict).toMatchObject({ id: 'above-rating', word: 'No relief protects a net' });
    expect(find(result, 'no-relief').caution).toContain('the relief valve is the safety device');
  });

  it('a relief behind a check valve in its forward direction counts, backwards it does not', () => {
    expect(rulesOf(assess())).not.toContain('no-relief');
    const turned = {
      ...demoCircuit,
      lines: demoCircuit.lines.map((line) =>
        line.id === 'L3'
          ? { ...line, to: { component: 'V1', port: 'B' } }
          : line.id === 'L4'
            ? { ...line, from: { component: 'V1', port: 'A' } }
            : line,
      ),
    };
    expect(rulesOf(assess({ document: turned }))).toContain('no-relief');
  });

  it('a relief stuck shut protects nothing', () => {
    expect(rulesOf(assess({ document: changed({ 'V2.fault.stuck-shut': 1 }) }))).toContain('no-relief');
  });

  it('oil held back on the rod side is intensified by the areas', () => {
    const finding = find(
      assess({ channels: { 'A1.A.pressure': 150 * bar, 'A1.B.pressure': (t) => (t > 3 && t < 3.2 ? 220 * bar : 0) } }),
      'intensification',
    );
    expect(values(finding.cause)[2]).toBeCloseTo(63 ** 2 / (63 ** 2 - 36 ** 2), 3);
  });

  it('an external load above the compensator: only the relief limits it', () => {
    const push = (t: number) => (t > 3 && t < 4 ? 200 * bar : 100 * bar);
    const finding = find(assess({ channels: { 'A1.A.pressure': push, 'A1.B.pressure': 0 } }), 'load-above-compensator');
    expect(values(finding.cause)).toEqual([200 * bar, 190 * bar]);
    expect(finding.remedy?.seek).toBeUndefined();
  });

  it('a chamber driven above pump and relief without a relief of its own', () => {
    const result = assess({ channels: { 'A1.B.pressure': (t) => (t > 3 && t < 3.2 ? 240 * bar : 0) } });
    expect(result.findings.map((finding) => finding.id)).toContain('no-relief:A1.B');
  });

  it('a shaft that turns back is driven by the load', () => {
    const finding = find(
      assess({
        channels: {
          'M1.speed': (t) => (t < 0.1 ? (153 * t) / 0.1 : t > 5 ? -20 : 150),
          'M1.current': (t) => (t > 4.9 ? 0 : 8),
          'M1.terminalVoltage': (t) => (t > 4.9 ? 0 : 400),
        },
      }),
      'load-drives-pump',
    );
    expect(finding.caution).toContain('does not hold a load');
  });

  it('pressure left behind a closed valve is named with its place', () => {
    const finding = find(assess({ run: { pressureLeft: [{ net: 'A1.B', label: 'A1 rod side', pressure: 90 * bar }] } }), 'pressure-left');
    expect(values(finding.headline)).toEqual([90 * bar]);
    expect(words(finding.headline)).toContain('A1 rod side');
  });
});

describe('pump, heat, outcome', () => {
  it('an inlet under 0.8 bar absolute warns; loss of filling starves', () => {
    expect(find(assess({ channels: { 'P1.suctionPressure': 0.7 * bar } }), 'inlet-starving').severity).toBe(2);
    expect(find(assess({ channels: { 'P1.suctionPressure': 0.3 * bar, 'P1.filling': 0.6 } }), 'inlet-starving').severity).toBe(1);
  });

  it('a stroke that swings without a command hunts', () => {
    const hunt = (t: number) => (t > 2 && t < 4 ? 0.3 + 0.1 * Math.sin(2 * Math.PI * 5 * t) : 0.3);
    expect(find(assess({ channels: { 'P1.stroke': hunt } }), 'hunting').time).toBeGreaterThan(1.9);
    expect(rulesOf(assess({ channels: { 'P1.stroke': (t) => (t > 2 ? 0.1 : 0.5) } }))).not.toContain('hunting');
  });

  it('heat counts the oil’s, not the motor’s, against the tank', () => {
    const audit = (heatBy: Record<string, number>) => ({
      supplied: 1e5,
      delivered: 0,
      heat: 1e5,
      storedChange: 0,
      residual: 0,
      volumeResidual: 0,
      heatBy,
    });
    const finding = find(assess({ run: { audit: audit({ M1: 8e3, V2: 3e4 }) } }), 'heat');
    expect(values(finding.cause)[0]).toBeCloseTo(3e4 / 8, 6);
    expect(finding.component).toBe('V2');
    expect(rulesOf(assess({ run: { audit: audit({ M1: 5e4, P1: 4e3 }) } }))).not.toContain('heat');
  });

  it('a missed requirement is a finding of its own', () => {
    const slow = (t: number) => Math.min(53e3, t > 5 ? 53e3 : 1e3);
    const result = assess({ channels: { 'A1.loadForce': slow, 'A1.velocity': 0.05 } });
    expect(find(result, 'requirement').id).toBe('requirement:bale-time');
    expect(result.requirements.find((entry) => entry.id === 'bale-time')).toMatchObject({ met: false });
  });

  it('a failed run is a verdict, with the place', () => {
    const result = assess({ run: { status: 'failed', time: 1.2, reason: 'No step fits.', stuck: { component: 'V2', state: 'lift' } } });
    expect(result.verdict).toMatchObject({ id: 'failed', word: 'Failed' });
    expect(words(find(result, 'run-failed').cause)).toContain('V2');
  });

  it('worst first: a stall comes before the relay that it trips', () => {
    const result = assess({
      channels: { 'M1.speed': (t) => (t < 0.1 ? (153 * t) / 0.1 : t < 2 ? 150 : 2), 'M1.current': (t) => (t > 2 ? 65 : 8) },
    });
    expect(rulesOf(result).slice(0, 2)).toEqual(['motor-stalls', 'will-trip']);
  });
});
