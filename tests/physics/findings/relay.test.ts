import { describe, expect, it } from 'vitest';
import { demoCircuit } from '#shared/circuit/samples/demo.ts';
import { assess, changed } from '#tests/support/synthetic-run.ts';

/** Trip times as findings state them, against the rows of the reference sheet. */

const DIAL = 11;
const TAU = 7 / Math.log(7.2 ** 2 / (7.2 ** 2 - 1.15 ** 2));

/** Heat of the relay after a time at one current, from dθ/dt = (target − θ)/τ. */
function heatAfter(multiple: number, tau: number, heat: number, time: number): number {
  const target = (multiple / 1.15) ** 2;
  return target + (heat - target) * Math.exp(-time / tau);
}

function tripAt(multiple: number, plate: Record<string, number | string> = {}): number | null {
  const document = changed({ 'M1.relayDial': DIAL, ...plate });
  return assess({ document, channels: { 'M1.current': multiple * DIAL } }).yardsticks[0]!.tripTime;
}

describe('overload relay on the repeated duty', () => {
  // M16 (thermal model; the 1.05/1.2/1.5 limits of IEC 60947-4-1 are from memory): class, multiple of the dial, seconds.
  it.each([
    ['10', 1.5, 240],
    ['10', 1.2, 11.3 * 60],
    ['10', 7.2, 7],
    ['20', 1.5, 446],
    ['20', 7.2, 13],
    ['30', 1.5, 686],
    ['30', 7.2, 20],
  ])('M16: class %s at %d × dial trips after %d s', (tripClass, multiple, seconds) => {
    expect(tripAt(multiple, { 'M1.relayClass': tripClass })! / seconds).toBeCloseTo(1, 2);
  });

  it('M16: class 10 at 1.05 × dial never trips', () => {
    expect(tripAt(1.05)).toBeNull();
  });

  // M14: IEC 60947-4-1 as quoted by relay makers: class 10 trips in 4–10 s, 20 in 6–20 s, 30 in 9–30 s at 7.2 × dial from cold.
  it.each([
    ['10', 4, 10],
    ['20', 6, 20],
    ['30', 9, 30],
  ])('M14: class %s at 7.2 × dial trips between %d and %d s', (tripClass, least, most) => {
    const time = tripAt(7.2, { 'M1.relayClass': tripClass })!;
    expect(time).toBeGreaterThan(least);
    expect(time).toBeLessThan(most);
  });

  // M14: NEMA classes 10/20/30: at most that many seconds at 600 %.
  it.each(['10', '20', '30'])('M14: NEMA class %s at 6 × dial trips within its class', (tripClass) => {
    const time = tripAt(6, { 'M1.relayClass': tripClass, 'M1.relayStandard': 'NEMA' })!;
    expect(time).toBeLessThanOrEqual(Number(tripClass) * (1 + 1e-6));
    expect(time).toBeGreaterThan(0.9 * Number(tripClass));
  });

  it('takes the mean of the squares over the duty: half the time at 1.8 × dial and half at 1 × dial', () => {
    const half = (t: number) => (t < 4.15 ? 1.8 : 1) * DIAL;
    const time = assess({ channels: { 'M1.current': half } }).yardsticks[0]!.tripTime!;
    const x = (1.8 ** 2 + 1) / 2 / 1.15 ** 2;
    expect(time / (TAU * Math.log(x / (x - 1)))).toBeCloseTo(1, 1);
    // The same by stepping the relay's equation through the cycles.
    let heat = 0;
    let cycles = 0;
    while (heat < 1 && cycles < 1000) {
      heat = heatAfter(1.8, TAU, heat, 4);
      heat = heatAfter(1, TAU, heat, 4);
      cycles += 1;
    }
    expect(Math.abs(cycles * 8 - time)).toBeLessThan(0.03 * time);
  });

  it('cools three times slower at standstill', () => {
    const cycle = (t: number) => (t < 2 ? 3 * DIAL : 0);
    const time = assess({ channels: { 'M1.current': cycle, 'M1.terminalVoltage': (t) => (t < 2 ? 400 : 0) } }).yardsticks[0]!.tripTime!;
    let heat = 0;
    let elapsed = 0;
    while (heat < 1 && elapsed < 10_000) {
      heat = heatAfter(3, TAU, heat, 2);
      heat = heatAfter(0, 3 * TAU, heat, 6);
      elapsed += 8;
    }
    expect(Math.abs(elapsed - time)).toBeLessThan(0.05 * time + 8);
  });

  it('a stalled motor is counted from the heat that the run ends with', () => {
    const cold = assess({ channels: { 'M1.speed': (t) => (t < 0.1 ? 1530 * t : t < 2 ? 150 : 2), 'M1.current': 65, 'M1.overloadHeat': 0 } })
      .yardsticks[0]!.tripTime!;
    const warm = assess({
      channels: { 'M1.speed': (t) => (t < 0.1 ? 1530 * t : t < 2 ? 150 : 2), 'M1.current': 65, 'M1.overloadHeat': 0.5 },
    }).yardsticks[0]!.tripTime!;
    const x = (65 / (1.15 * DIAL)) ** 2;
    expect(cold - 8).toBeCloseTo(TAU * Math.log(x / (x - 1)), 1);
    expect(warm - 8).toBeCloseTo(TAU * Math.log((x - 0.5) / (x - 1)), 1);
  });

  it('is silent where no relay is fitted, and where the duty is not repeated', () => {
    expect(tripAt(2, { 'M1.relayFitted': 'no' })).toBeNull();
    const once = { ...demoCircuit, duty: { ...demoCircuit.duty, repeat: false } };
    expect(assess({ document: once, channels: { 'M1.current': 2 * DIAL } }).yardsticks[0]!.tripTime).toBeNull();
  });
});
