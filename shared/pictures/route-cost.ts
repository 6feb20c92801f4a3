import type { Point } from '../symbols/place.ts';
import type { Box } from './placement.ts';

/** What a route costs: length, bends, and what it comes near. In modules. */

export interface Segment {
  readonly a: Point;
  readonly b: Point;
  readonly horizontal: boolean;
}

/** A leg by where it runs: from `low` to `high` along its axis, at `at` across it. */
interface Leg {
  readonly horizontal: boolean;
  readonly low: number;
  readonly high: number;
  readonly at: number;
}

/** What routes keep clear of: symbols, and lines already on the sheet. */
export interface Surroundings {
  readonly boxes: readonly Box[];
  readonly legs: readonly Leg[];
}

export const BEND = 3;
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

/** The same legs, to be kept clear of. */
export function legsOf(points: readonly Point[]): Leg[] {
  return segmentsOf(points).map(({ a, b, horizontal }) => {
    const p = horizontal ? a.x : a.y;
    const q = horizontal ? b.x : b.y;
    return { horizontal, low: Math.min(p, q), high: Math.max(p, q), at: horizontal ? a.y : a.x };
  });
}

function boxCost({ horizontal, low, high, at }: Leg, box: Box): number {
  const left = horizontal ? box.x : box.y;
  const right = left + (horizontal ? box.w : box.h);
  const top = horizontal ? box.y : box.x;
  const bottom = top + (horizontal ? box.h : box.w);
  if (low >= right + 0.9 || high <= left - 0.9 || at <= top - 0.9 || at >= bottom + 0.9) return 0;
  return low < right - 0.3 && high > left + 0.3 && at > top + 0.3 && at < bottom - 0.3 ? THROUGH_SYMBOL : NEAR_SYMBOL;
}

function legCost(s: Leg, other: Leg): number {
  if (s.horizontal !== other.horizontal) {
    return other.at > s.low && other.at < s.high && s.at > other.low && s.at < other.high ? CROSSING : 0;
  }
  const gap = Math.abs(s.at - other.at);
  if (gap >= LINE_GAP) return 0;
  const shared = Math.min(s.high, other.high) - Math.max(s.low, other.low);
  if (shared <= 0) return 0;
  return gap < 0.5 ? ON_LINE + 3 * shared : NEAR_LINE + shared;
}

/** Cost of a path at right angles; stops counting once it is no better than `limit`. */
export function routeCost(path: readonly Point[], { boxes, legs }: Surroundings, limit: number): number {
  const own = legsOf(path);
  let cost = BEND * Math.max(0, own.length - 1);
  for (const leg of own) cost += leg.high - leg.low;
  for (const leg of own) {
    for (const box of boxes) {
      if (cost >= limit) return cost;
      cost += boxCost(leg, box);
    }
    for (const other of legs) {
      if (cost >= limit) return cost;
      cost += legCost(leg, other);
    }
  }
  return cost;
}
