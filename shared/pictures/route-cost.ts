import type { Point } from '../symbols/place.ts';
import type { Box } from './placement.ts';

/** What a route costs: length, bends, and what it comes near. In modules. */

export interface Segment {
  readonly a: Point;
  readonly b: Point;
  readonly horizontal: boolean;
}

const BEND = 3;
const THROUGH_SYMBOL = 60;
const NEAR_SYMBOL = 1.5;
const ON_LINE = 40;
const NEAR_LINE = 6;
const CROSSING = 2;
/** Parallel lines stay this far apart. */
export const LINE_GAP = 2;

/** Legs of a path; slanted legs of stubs are left out. */
export function segmentsOf(points: readonly Point[]): Segment[] {
  const result: Segment[] = [];
  for (let k = 0; k + 1 < points.length; k += 1) {
    const a = points[k] as Point;
    const b = points[k + 1] as Point;
    if (a.x === b.x || a.y === b.y) result.push({ a, b, horizontal: a.y === b.y });
  }
  return result;
}

function span(s: Segment): readonly [number, number] {
  const p = s.horizontal ? s.a.x : s.a.y;
  const q = s.horizontal ? s.b.x : s.b.y;
  return p < q ? [p, q] : [q, p];
}

function across(s: Segment): number {
  return s.horizontal ? s.a.y : s.a.x;
}

function meets(s: Segment, box: Box, grow: number): boolean {
  const [low, high] = span(s);
  const at = across(s);
  const left = (s.horizontal ? box.x : box.y) - grow;
  const right = (s.horizontal ? box.x + box.w : box.y + box.h) + grow;
  const top = (s.horizontal ? box.y : box.x) - grow;
  const bottom = (s.horizontal ? box.y + box.h : box.x + box.w) + grow;
  return low < right && high > left && at > top && at < bottom;
}

function lineCost(s: Segment, other: Segment): number {
  const [low, high] = span(s);
  const [from, to] = span(other);
  if (s.horizontal !== other.horizontal) {
    const crosses = across(other) > low && across(other) < high && across(s) > from && across(s) < to;
    return crosses ? CROSSING : 0;
  }
  const shared = Math.min(high, to) - Math.max(low, from);
  if (shared <= 0) return 0;
  const gap = Math.abs(across(s) - across(other));
  if (gap < 0.5) return ON_LINE + 3 * shared;
  return gap < LINE_GAP ? NEAR_LINE + shared : 0;
}

/** Cost of a path; stops counting once it is no better than `limit`. */
export function routeCost(path: readonly Point[], obstacles: readonly Box[], drawn: readonly Segment[], limit: number): number {
  const segments = segmentsOf(path);
  let cost = BEND * Math.max(0, segments.length - 1);
  for (const s of segments) {
    const [low, high] = span(s);
    cost += high - low;
  }
  for (const s of segments) {
    for (const box of obstacles) {
      if (cost >= limit) return cost;
      if (meets(s, box, -0.3)) cost += THROUGH_SYMBOL;
      else if (meets(s, box, 0.9)) cost += NEAR_SYMBOL;
    }
    for (const other of drawn) {
      if (cost >= limit) return cost;
      cost += lineCost(s, other);
    }
  }
  return cost;
}
