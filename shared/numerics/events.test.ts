import { describe, expect, it } from 'vitest';
import { bisect, crosses, EVENT_TIME_TOLERANCE } from './events.ts';

describe('sign changes', () => {
  it('count zero as not below', () => {
    expect(crosses(-1, 0)).toBe('rises');
    expect(crosses(0, 1)).toBeNull();
    expect(crosses(0, -1)).toBe('falls');
    expect(crosses(-1, -2)).toBeNull();
    expect(crosses(Number.NaN, 1)).toBeNull();
  });

  it('are narrowed down to the time tolerance, on the side where they have happened', () => {
    const length = 0.3;
    const place = bisect((q) => q - 0.6180339, 0.5, 0.75, true, length);
    expect(place).toBeGreaterThanOrEqual(0.6180339);
    expect((place - 0.6180339) * length).toBeLessThanOrEqual(EVENT_TIME_TOLERANCE);
    const falling = bisect((q) => 0.2 - q, 0, 0.25, false, length);
    expect(falling).toBeGreaterThan(0.2);
    expect((falling - 0.2) * length).toBeLessThanOrEqual(EVENT_TIME_TOLERANCE);
  });
});
