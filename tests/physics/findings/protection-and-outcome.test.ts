import { describe, expect, it } from 'vitest';
import { demoCircuit } from '#shared/circuit/samples/demo.ts';
import { find, rulesOf, values, words } from '#tests/support/finding-words.ts';
import { assess, bar, changed, cubic } from '#tests/support/synthetic-run.ts';

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
    const finding = find(assess({ document: changed({ 'V2.fault.stuck-shut': 1 }) }), 'no-relief');
    expect(words(finding.cause)).toContain('stuck shut');
    expect(words(finding.remedy!.words)).not.toContain('Join a relief');
  });

  it('oil held back on the rod side is intensified by the areas', () => {
    const finding = find(
      assess({ channels: { 'A1.A.pressure': 150 * bar, 'A1.B.pressure': (t) => (t > 3 && t < 3.2 ? 220 * bar : 0) } }),
      'intensification',
    );
    expect(values(finding.cause)[2]).toBeCloseTo(63 ** 2 / (63 ** 2 - 36 ** 2), 3);
    expect(finding.severity).toBe(1);
  });

  it('rod-side pressure of an ordinary throttled return, under dead-head, is a note', () => {
    const low = { 'A1.A.pressure': 60 * bar, 'A1.B.pressure': 110 * bar, 'P1.outlet.pressure': 61 * bar };
    expect(find(assess({ channels: low }), 'intensification').severity).toBe(3);
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

  it('a shaft that springs back a little on oil shut in by a check valve is not driven by the load', () => {
    const result = assess({
      channels: {
        'M1.speed': (t) => (t < 0.1 ? (153 * t) / 0.1 : t < 5 ? 150 : t < 5.1 ? -20 : 0),
        'M1.current': (t) => (t > 4.9 ? 0 : 8),
        'M1.terminalVoltage': (t) => (t > 4.9 ? 0 : 400),
      },
    });
    expect(rulesOf(result)).not.toContain('load-drives-pump');
  });

  it('pressure left behind a closed valve is named with its place', () => {
    const finding = find(assess({ run: { pressureLeft: [{ net: 'A1.B', label: 'A1 rod side', pressure: 90 * bar }] } }), 'pressure-left');
    expect(values(finding.headline)).toEqual([90 * bar]);
    expect(words(finding.headline)).toContain('A1 rod side');
  });
});

describe('rods that the load moves', () => {
  const up = { 'V3.spool': (t: number) => (t > 0.6 && t < 5 ? 1 : 0), 'A1.A.pressure': 3 * bar };
  it('against the command: the load runs back, whatever the motor says', () => {
    const result = assess({ channels: { ...up, 'A1.velocity': (t) => (t > 3 && t < 4 ? -0.3 : 0.1) } });
    expect(result.verdict).toMatchObject({ id: 'rod-stops-short', word: 'Load runs back' });
    const finding = find(result, 'load-runs-away');
    expect(values(finding.cause)[0]).toBeCloseTo(0.3, 1);
    expect(finding.caution).toContain('does not hold a load');
  });

  it('at centre: said, with the caution; leakage is not', () => {
    const drop = (speed: number) => assess({ channels: { ...up, 'A1.velocity': (t) => (t > 5.5 && t < 7 ? -speed : 0) } });
    expect(words(find(drop(0.4), 'load-runs-away').headline)).toContain('with the valve at centre');
    expect(rulesOf(drop(0.002))).not.toContain('load-runs-away');
  });

  it('ahead of the oil: the driven side is drawn apart', () => {
    const pulled = { ...up, 'A1.velocity': (t: number) => (t > 2 && t < 3 ? 0.8 : 0), 'A1.A.pressure': -0.9 * bar };
    const finding = find(assess({ channels: pulled }), 'load-runs-away');
    expect(values(finding.cause)).toEqual([0.8, -0.9 * bar]);
    expect(rulesOf(assess({ channels: { ...pulled, 'A1.A.pressure': 2 * bar } }))).not.toContain('load-runs-away');
  });
});

describe('a pump above its setting', () => {
  const above = (t: number) => (t > 3 && t < 5 ? 206 : 100) * bar;
  it('that still gives flow does not go off stroke: something sticks', () => {
    const finding = find(assess({ channels: { 'P1.outlet.pressure': above } }), 'does-not-destroke');
    expect(values(finding.cause).slice(0, 2)).toEqual([expect.closeTo(206 * bar, -5), 190 * bar]);
    expect(words(finding.remedy!.words)).toContain('swash plate sticks');
  });

  it('is told from a minimum stop wound in and from a blocked case line', () => {
    const wound = find(
      assess({ document: changed({ 'P1.minVolumeStop': 6 * cubic }), channels: { 'P1.outlet.pressure': above } }),
      'does-not-destroke',
    );
    expect(words(wound.remedy!.words)).toContain('minimum volume stop');
    const blocked = find(assess({ channels: { 'P1.outlet.pressure': above, 'P1.drain.pressure': 14 * bar } }), 'does-not-destroke');
    expect(words(blocked.cause)).toContain('bar for bar');
  });

  it('for a moment, or with no flow of its own, is no fault', () => {
    const spike = (t: number) => (t > 3 && t < 3.1 ? 206 : 100) * bar;
    expect(rulesOf(assess({ channels: { 'P1.outlet.pressure': spike } }))).not.toContain('does-not-destroke');
    expect(rulesOf(assess({ channels: { 'P1.outlet.pressure': above, 'P1.flow': 0 } }))).not.toContain('does-not-destroke');
  });
});

describe('pump, heat, outcome', () => {
  it('an inlet under 0.8 bar absolute warns; loss of filling starves', () => {
    expect(find(assess({ channels: { 'P1.suctionPressure': 0.7 * bar } }), 'inlet-starving').severity).toBe(2);
    expect(find(assess({ channels: { 'P1.suctionPressure': 0.3 * bar, 'P1.filling': 0.6 } }), 'inlet-starving').severity).toBe(1);
  });

  it('thin air at altitude is named, not the strainer', () => {
    const document = { ...demoCircuit, site: { altitude: 4000 } };
    const finding = find(assess({ document, channels: { 'P1.suctionPressure': 0.616 * bar } }), 'inlet-starving');
    expect(words(finding.cause)).toContain('at this altitude');
    expect(words(finding.remedy!.words)).not.toContain('strainer');
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
    expect(words(find(assess({ run: { audit: audit({ V2: 9e4 }) } }), 'heat').cause)).toContain('would not settle under');
    expect(rulesOf(assess({ run: { audit: audit({ M1: 5e4, P1: 4e3 }) } }))).not.toContain('heat');
  });

  it('a missed requirement is a finding of its own', () => {
    const slow = (t: number) => Math.min(53e3, t > 5 ? 53e3 : 1e3);
    const result = assess({ channels: { 'A1.loadForce': slow, 'A1.velocity': (t) => (t > 0.6 && t < 5.6 ? 0.05 : 0) } });
    expect(find(result, 'requirement').id).toBe('requirement:bale-time');
    expect(words(find(result, 'within-limits').headline)).toContain('the job asked for is not done');
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
