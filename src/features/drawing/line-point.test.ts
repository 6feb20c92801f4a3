import { describe, expect, it } from 'vitest';
import { nearestOnLine } from './line-point.ts';

const route = [
  { x: 0, y: 0 },
  { x: 10, y: 0 },
  { x: 10, y: 10 },
];

describe('nearestOnLine', () => {
  it('gives the nearest point on half modules and the share of the length before it', () => {
    expect(nearestOnLine({ route: [] }, route, { x: 4.1, y: 3 })).toEqual({ x: 4, y: 0, share: 0.205, bendsBefore: 0 });
    expect(nearestOnLine({ route: [{ x: 10, y: 0 }] }, route, { x: 13, y: 5 })).toEqual({ x: 10, y: 5, share: 0.75, bendsBefore: 1 });
    expect(nearestOnLine({ route: [] }, route, { x: -5, y: -5 })).toMatchObject({ share: 0 });
  });

  it('gives null where there is no length', () => {
    expect(nearestOnLine({ route: [] }, [{ x: 1, y: 1 }], { x: 0, y: 0 })).toBeNull();
  });
});
