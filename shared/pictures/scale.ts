/** Straight scales and round ticks for charts; plain numbers in the reader's unit. */

export type Scale = (value: number) => number;

/** Maps [d0, d1] onto [r0, r1]; a domain without extent maps onto r0. */
export function linearScale(d0: number, d1: number, r0: number, r1: number): Scale {
  const slope = d1 === d0 ? 0 : (r1 - r0) / (d1 - d0);
  return (value) => r0 + (value - d0) * slope;
}

/** A step of 1, 2 or 5 times a power of ten that cuts `span` into about `count` parts. */
export function roundStep(span: number, count: number): number {
  if (!(span > 0) || !Number.isFinite(span)) return 1;
  const raw = span / Math.max(1, count);
  const power = 10 ** Math.floor(Math.log10(raw));
  const part = raw / power;
  return (part < 1.5 ? 1 : part < 3.5 ? 2 : part < 7.5 ? 5 : 10) * power;
}

/** Round values within [low, high], about `count` of them. */
export function roundTicks(low: number, high: number, count: number): number[] {
  const step = roundStep(high - low, count);
  const ticks: number[] = [];
  const first = Math.ceil(low / step - 1e-9);
  const last = Math.floor(high / step + 1e-9);
  for (let k = first; k <= last && ticks.length < 1000; k += 1) ticks.push(Number((k * step).toPrecision(12)) + 0);
  return ticks;
}

/** Digits after the decimal sign that tell neighbouring ticks apart. */
export function tickDigits(ticks: readonly number[]): number {
  if (ticks.length < 2) return 0;
  const step = Math.abs((ticks[1] as number) - (ticks[0] as number));
  for (let digits = 0; digits < 6; digits += 1) {
    if (Math.abs(step * 10 ** digits - Math.round(step * 10 ** digits)) < 1e-6) return digits;
  }
  return 6;
}

/** Lower and upper end of a lane: what is shown lies inside, zero is included when it is near, ends are round, so that a
 *  small change of the run does not shift the whole lane. */
export function laneDomain(low: number, high: number): readonly [number, number] {
  if (!Number.isFinite(low) || !Number.isFinite(high)) return [0, 1];
  const bottom = low > 0 && low < 0.7 * high ? 0 : low;
  const top = high < 0 && high > 0.7 * low ? 0 : high;
  const size = Math.max(Math.abs(bottom), Math.abs(top));
  const span = top - bottom;
  if (span <= size * 1e-9 || span === 0) {
    if (size === 0) return [0, 1];
    return bottom >= 0 ? [0, size * 1.25] : [-size * 1.25, size * 0.25];
  }
  const step = roundStep(span, 12);
  const down = Math.floor(bottom / step + 1e-9) * step;
  const up = Math.ceil(top / step - 1e-9) * step;
  return [down, up];
}
