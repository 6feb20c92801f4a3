import { describe, expect, it } from 'vitest';
import { demoCircuit } from '#shared/circuit/samples/demo.ts';
import { figures, find, rulesOf, values, words } from '#tests/support/finding-words.ts';
import { assess, bar, changed, cubic, litresPerMinute } from '#tests/support/synthetic-run.ts';

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

  it('that nobody switches on is said so, without a verdict of its own', () => {
    const finding = find(assess({ channels: { 'M1.speed': 0, 'M1.current': 0, 'M1.terminalVoltage': 0 } }), 'not-up-to-speed');
    expect(words(finding.headline)).toBe('Motor is never switched on');
    expect(finding.verdict).toBeUndefined();
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

  it('at 480 V and 60 Hz a 400 V 50 Hz plate has its volts per hertz; at 400 V and 60 Hz it has not', () => {
    const at60 = (volts: number) =>
      assess({
        document: { ...demoCircuit, supply: { ...demoCircuit.supply, voltage: volts, frequency: 60 } },
        channels: { 'M1.terminalVoltage': volts, 'M1.speed': (t) => Math.min(1, t / 0.1) * 183 },
      });
    expect(rulesOf(at60(480))).not.toContain('supply-out-of-band');
    expect(values(find(at60(400), 'supply-out-of-band').headline)[0]).toBeCloseTo(1 / 6, 6);
  });

  it('that gives less than its plate is looked at before the pump’s screws', () => {
    const dips = { 'M1.speed': (t: number) => (t < 0.1 ? (153 * t) / 0.1 : t > 2 && t < 2.3 ? 60 : 150) };
    const finding = find(assess({ document: changed({ 'M1.fault.stuck-in-star': 1 }), channels: dips }), 'dips-and-recovers');
    expect(finding.remedy?.seek).toBeUndefined();
    expect(values(finding.remedy!.words)[1]).toBeCloseTo((2 * RATED) / 3, 0);
    expect(find(assess({ channels: dips }), 'dips-and-recovers').remedy?.seek).toBeDefined();
  });

  it('that stalls on friction, not on oil, is turned by hand; in oil far too thick it is warmed', () => {
    const stalled = { 'M1.speed': stall, 'P1.displacement': 8 * cubic, 'P1.outlet.pressure': 60 * bar };
    const dry = find(assess({ channels: stalled }), 'motor-stalls').remedy!;
    expect(dry.seek).toBeUndefined();
    expect(words(dry.words)).toContain('turn the shaft by hand');
    const cold = { ...demoCircuit, fluid: { ...demoCircuit.fluid, temperature: 268.15 } };
    expect(words(find(assess({ document: cold, channels: stalled }), 'motor-stalls').remedy!.words)).toContain('Warm it first');
  });

  it('that turns the wrong way is told so, and neither driven by a load nor starving', () => {
    const result = assess({
      channels: { 'M1.speed': (t) => -Math.min(1, t / 0.1) * 156, 'M1.torque': -2.6, 'M1.current': 4.9, 'P1.filling': 0 },
    });
    expect(words(find(result, 'not-up-to-speed').headline)).toBe('Motor turns the wrong way');
    expect(rulesOf(result)).not.toContain('load-drives-pump');
    expect(rulesOf(result)).not.toContain('inlet-starving');
  });

  it('whose relay opens in the run says with what current, not with a mean that it could carry', () => {
    const event = { component: 'M1', signal: 'overload-trip', rising: true, time: 6, label: 'trips' };
    const result = assess({ channels: { 'M1.current': (t) => (t > 5 && t < 6 ? 40 : 8) }, run: { events: [event] } });
    expect(values(find(result, 'will-trip').cause)[0]).toBe(40);
  });

  it('inside its nameplate on a dial set under it: the dial is checked, never set above', () => {
    const remedy = find(assess({ document: changed({ 'M1.relayDial': 5 }), channels: { 'M1.current': 8 } }), 'will-trip').remedy!;
    expect(remedy.seek).toBeUndefined();
    expect(words(remedy.words)).toContain('never set it above');
  });

  it('without volts for a moment has a margin of nought, and every figure is a number', () => {
    const dip = { id: 'dip', time: 3, ramp: 0, target: 'supply', input: 'voltage', value: 0, label: 'Dip' };
    const document = { ...demoCircuit, duty: { ...demoCircuit.duty, commands: [...demoCircuit.duty.commands, dip] } };
    const result = assess({ document, channels: { 'M1.torque': 50 } });
    const all = result.findings.flatMap((finding) => [...values(finding.headline), ...values(finding.cause)]);
    expect(values(find(result, 'small-stall-margin').cause)[0]).toBeCloseTo(50, 0);
    expect(all.every(Number.isFinite)).toBe(true);
  });

  it('outside ±10 % volts has no nameplate verdict, only the supply', () => {
    const result = assess({ channels: { 'M1.current': 12, 'M1.terminalVoltage': 348 } });
    const supply = find(result, 'supply-out-of-band');
    expect(values(supply.headline)[0]).toBeCloseTo(0.13, 6);
    expect(words(supply.remedy!.words)).toContain('licensed electrician');
    expect(rulesOf(result)).not.toContain('over-nameplate');
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

  it('under a load that rests on its end is said to push what it pushes, not what the load asks', () => {
    const heavy = { ...stuck, 'A1.position': 0, 'A1.loadForce': 80e3, 'A1.force': 59e3, 'P1.outlet.pressure': 189 * bar };
    const document = changed({ 'A1.workForce': 0 });
    const finding = find(assess({ document: { ...document, requirements: [] }, channels: heavy }), 'rod-stops-short');
    expect(values(finding.cause)).toEqual(expect.arrayContaining([expect.closeTo(59e3, 0), expect.closeTo(80e3, 0)]));
    expect(words(finding.cause)).toContain('the load asks for');
  });

  it('that never moves because the pump gives nothing stops short; no screw is offered', () => {
    const nothing = { ...stuck, 'A1.position': -1e-7, 'A1.velocity': 0, 'A1.loadForce': 0, 'A1.A.pressure': -1e-6, 'P1.flow': 0 };
    const result = assess({ channels: { ...nothing, 'P1.outlet.pressure': -1e-6 } });
    expect(result.verdict.id).toBe('rod-stops-short');
    const finding = find(result, 'rod-stops-short');
    expect(words(finding.cause)).toContain('gives no flow');
    expect(finding.remedy?.seek).toBeUndefined();
  });

  it('with a relief that lets the flow by far under the compensator is not offered a higher compensator', () => {
    const passing = { 'V2.flow': 20 * litresPerMinute, 'V2.P.pressure': 18 * bar, 'P1.outlet.pressure': 18 * bar };
    const finding = find(assess({ channels: { ...stuck, ...passing } }), 'rod-stops-short');
    expect(finding.remedy?.seek).toBeUndefined();
    expect(words(finding.cause)).toContain('crosses V2');
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
    const fast = (t: number) => (t > 0.6 && t < 4 ? 0.21 : 0);
    const all = assess({ channels: { ...moving, 'A1.velocity': fast, 'A1.A.flow': 39 * litresPerMinute }, run: { phases } });
    expect(rulesOf(all)).not.toContain('slower-than-pump');
  });

  it('whose piston lets oil by is slower, and is told so; a rod that drifts at centre is not', () => {
    const phases = [{ label: 'Solenoid a on', from: 0.6, to: 5.2, channels: {} }];
    const bypass = {
      'A1.velocity': (t: number) => (t > 0.6 && t < 4 ? 0.08 : 0),
      'A1.A.flow': 39 * litresPerMinute,
      'P1.displacement': 28 * cubic,
    };
    expect(words(find(assess({ channels: bypass, run: { phases } }), 'slower-than-pump').cause)).toContain('past the piston of A1');
    expect(rulesOf(assess({ channels: { ...bypass, 'V3.spool': 0 }, run: { phases } }))).not.toContain('slower-than-pump');
  });
});
