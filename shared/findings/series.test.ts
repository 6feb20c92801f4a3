import { describe, expect, it } from 'vitest';
import { firstReach, highest, integrate, lowest, mean, median, stretches } from './series.ts';

const times = Float64Array.of(0, 1, 2, 4);
const values = Float64Array.of(0, 2, 2, -2);

describe('columns of a run', () => {
  it('integrates straight lines exactly, also over part of a step', () => {
    expect(integrate(times, values, { from: 0, to: 4 })).toBeCloseTo(1 + 2 + 0, 12);
    expect(integrate(times, values, { from: 0.5, to: 1 })).toBeCloseTo(0.75, 12);
    expect(integrate(times, values, { from: 2.5, to: 3.5 })).toBeCloseTo(0, 12);
    expect(integrate(times, values, { from: 5, to: 6 })).toBe(0);
  });

  it('averages over time, not over rows; an empty window gives 0', () => {
    expect(mean(times, values, { from: 0, to: 4 })).toBeCloseTo(0.75, 12);
    expect(mean(times, values, { from: 3, to: 3 })).toBe(0);
  });

  it('finds the extremes and when', () => {
    expect(highest(times, values, { from: 0, to: 4 })).toEqual({ value: 2, time: 1 });
    expect(lowest(times, values, { from: 0, to: 4 })).toEqual({ value: -2, time: 4 });
  });

  it('weighs the median with time', () => {
    expect(median(Float64Array.of(0, 1, 1, 10), Float64Array.of(5, 5, 1, 1), { from: 0, to: 10 })).toBe(1);
  });

  it('finds when a level is first reached, interpolated', () => {
    expect(firstReach(times, values, 1, { from: 0, to: 4 })).toBeCloseTo(0.5, 12);
    expect(firstReach(times, values, 3, { from: 0, to: 4 })).toBeNull();
    expect(firstReach(times, values, 1, { from: 1.5, to: 4 })).toBe(2);
  });

  it('finds stretches above zero with interpolated ends, no shorter than asked', () => {
    const wave = Float64Array.of(-1, 1, 1, -1);
    expect(stretches(times, (i) => wave[i]!, 0)).toEqual([{ from: 0.5, to: 3 }]);
    expect(stretches(times, (i) => wave[i]!, 3)).toEqual([]);
    expect(stretches(times, () => 1, 0)).toEqual([{ from: 0, to: 4 }]);
    expect(stretches(new Float64Array(0), () => 1, 0)).toEqual([]);
  });
});
