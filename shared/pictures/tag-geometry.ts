import type { Box, Point } from '../symbols/place.ts';

/** Strings, boxes and legs: what meets what. */

export interface StringLine {
  readonly from: Point;
  readonly to: Point;
}

/** Point of a box nearest to another point. */
export function nearestOn(box: Box, point: Point): Point {
  return {
    x: Math.min(box.x + box.w, Math.max(box.x, point.x)),
    y: Math.min(box.y + box.h, Math.max(box.y, point.y)),
  };
}

/** Whether a segment passes through a box (touching the edge does not count). */
export function segmentThrough(a: Point, b: Point, box: Box): boolean {
  if ((a.x <= box.x && b.x <= box.x) || (a.x >= box.x + box.w && b.x >= box.x + box.w)) return false;
  if ((a.y <= box.y && b.y <= box.y) || (a.y >= box.y + box.h && b.y >= box.y + box.h)) return false;
  let low = 0;
  let high = 1;
  for (const axis of ['x', 'y'] as const) {
    const from = axis === 'x' ? box.x : box.y;
    const to = axis === 'x' ? box.x + box.w : box.y + box.h;
    const delta = b[axis] - a[axis];
    if (Math.abs(delta) < 1e-12) {
      if (a[axis] <= from || a[axis] >= to) return false;
      continue;
    }
    const t0 = (from - a[axis]) / delta;
    const t1 = (to - a[axis]) / delta;
    low = Math.max(low, Math.min(t0, t1));
    high = Math.min(high, Math.max(t0, t1));
  }
  return high - low > 1e-9;
}

/** Whether two segments cross. */
export function segmentsCross(a: Point, b: Point, c: Point, d: Point): boolean {
  const side = (p: Point, q: Point, r: Point) => (q.x - p.x) * (r.y - p.y) - (q.y - p.y) * (r.x - p.x);
  return side(a, b, c) * side(a, b, d) < 0 && side(c, d, a) * side(c, d, b) < 0;
}

/** Whether a leg meets a box. */
export function legMeets(a: Point, b: Point, box: Box): boolean {
  return segmentThrough(a, b, box);
}

/** Whether a string passes through a box; the ends themselves may touch it. */
export function stringCrosses(string: StringLine, box: Box): boolean {
  return segmentThrough(string.from, string.to, { x: box.x + 0.05, y: box.y + 0.05, w: box.w - 0.1, h: box.h - 0.1 });
}
