import { describe, expect, it } from 'vitest';
import { inkScale, inkShare, oilStops, oilTint, oilTintCss, oklab, strandCount, strandInk, strandOffsets } from './pressure-ink.ts';

const bar = 1e5;

describe('scale of the pressure ink', () => {
  it('is the smallest step not below the peak nor the lowest rating', () => {
    expect(inkScale(90 * bar, 80 * bar)).toBe(100 * bar);
    expect(inkScale(161 * bar, 100 * bar)).toBe(250 * bar);
    expect(inkScale(161 * bar, 280 * bar)).toBe(350 * bar);
    expect(inkScale(250 * bar, 250 * bar)).toBe(250 * bar);
  });
  it('is 420 bar without any rating and never above it', () => {
    expect(inkScale(50 * bar, 0)).toBe(420 * bar);
    expect(inkScale(700 * bar, 315 * bar)).toBe(420 * bar);
  });
});

describe('strands', () => {
  it('gain one at each fifth and the fifth only at the top', () => {
    const shares = [0, 0.19, 0.2, 0.4, 0.6, 0.8, 0.999, 1, 1.3];
    expect(shares.map(strandCount)).toEqual([0, 0, 1, 2, 3, 4, 4, 5, 5]);
  });
  it('lie evenly and inside the line', () => {
    for (let count = 1; count <= 5; count += 1) {
      const offsets = strandOffsets(count, 0.7);
      expect(offsets).toHaveLength(count);
      expect(offsets.reduce((sum, value) => sum + value, 0)).toBeCloseTo(0, 12);
      for (const offset of offsets) expect(Math.abs(offset)).toBeLessThan(0.35);
    }
  });
  it('change to the colour of the sheet from 2.6 fifths', () => {
    expect(strandInk(0.51)).toBe('ink');
    expect(strandInk(0.52)).toBe('sheet');
  });
});

describe('tint', () => {
  // Lightness of the stops as the design page states them.
  const stated = { light: [0.89, 0.82, 0.7, 0.57, 0.42, 0.26], dark: [0.46, 0.53, 0.63, 0.75, 0.86, 0.96] };
  it.each(['light', 'dark'] as const)('has the stated lightness at the stops of the %s theme', (theme) => {
    oilStops[theme].forEach((stop, k) => {
      expect(oklab(stop)[0]).toBeCloseTo(stated[theme][k] as number, 1);
      expect(oilTint(k / 5, theme)).toBe(stop);
    });
  });
  it('falls steadily in the light theme and rises in the dark one', () => {
    for (let k = 1; k <= 50; k += 1) {
      expect(oklab(oilTint(k / 50, 'light'))[0]).toBeLessThan(oklab(oilTint((k - 1) / 50, 'light'))[0]);
      expect(oklab(oilTint(k / 50, 'dark'))[0]).toBeGreaterThan(oklab(oilTint((k - 1) / 50, 'dark'))[0]);
    }
  });
  it('never turns red: green is never far below red', () => {
    for (let k = 0; k <= 100; k += 1) {
      const hex = oilTint(k / 100, 'light');
      const red = Number.parseInt(hex.slice(1, 3), 16);
      const green = Number.parseInt(hex.slice(3, 5), 16);
      expect(green).toBeGreaterThan(red * 0.7);
    }
  });
  it('is the same mix for the style sheet', () => {
    expect(oilTintCss(0.4)).toBe('var(--oil-400)');
    expect(oilTintCss(0.5)).toBe('color-mix(in oklab, var(--oil-400), var(--oil-600) 50%)');
    expect(oilTintCss(7)).toBe('color-mix(in oklab, var(--oil-800), var(--oil-1000) 100%)');
  });
  it('keeps pressures below zero at the empty end', () => {
    expect(inkShare(-2 * bar, 250 * bar)).toBe(0);
    expect(inkShare(300 * bar, 250 * bar)).toBeCloseTo(1.2, 12);
  });
});
