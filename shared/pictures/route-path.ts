import type { Point } from '../symbols/place.ts';

/** Routes as strokes: rounded bends, strands that run beside the middle, and places for flow barbs. */

interface Leg {
  readonly ux: number;
  readonly uy: number;
  readonly length: number;
}

function legsOf(points: readonly Point[]): Leg[] {
  const legs: Leg[] = [];
  for (let k = 0; k + 1 < points.length; k += 1) {
    const a = points[k] as Point;
    const b = points[k + 1] as Point;
    const length = Math.hypot(b.x - a.x, b.y - a.y) || 1e-9;
    legs.push({ ux: (b.x - a.x) / length, uy: (b.y - a.y) / length, length });
  }
  return legs;
}

/** SVG path along a route with rounded bends, `offset` to the right of its direction (in the unit of the points).
 *  @param radius of the bends of the middle line; smaller where a leg is too short */
export function filletPath(points: readonly Point[], radius: number, offset = 0): string {
  const legs = legsOf(points);
  const first = points[0];
  const start = legs[0];
  if (!first || !start) return '';
  let d = `M${text(first.x - start.uy * offset)} ${text(first.y + start.ux * offset)}`;
  for (let k = 1; k < points.length - 1; k += 1) {
    const corner = points[k] as Point;
    const before = legs[k - 1] as Leg;
    const after = legs[k] as Leg;
    const cross = before.ux * after.uy - before.uy * after.ux;
    const dot = before.ux * after.ux + before.uy * after.uy;
    if (Math.abs(cross) < 1e-6) continue;
    // Tangent length of a bend of radius r is r · tan(angle/2).
    const tangent = Math.sqrt((1 - dot) / (1 + dot));
    const r = Math.min(radius, before.length / 2 / tangent, after.length / 2 / tangent);
    const cut = r * tangent;
    const own = Math.max(0.02, r - Math.sign(cross) * offset);
    const sx = corner.x - before.ux * cut - before.uy * offset;
    const sy = corner.y - before.uy * cut + before.ux * offset;
    const ex = corner.x + after.ux * cut - after.uy * offset;
    const ey = corner.y + after.uy * cut + after.ux * offset;
    d += `L${text(sx)} ${text(sy)}A${text(own)} ${text(own)} 0 0 ${cross > 0 ? 1 : 0} ${text(ex)} ${text(ey)}`;
  }
  const last = points[points.length - 1] as Point;
  const end = legs[legs.length - 1] as Leg;
  return `${d}L${text(last.x - end.uy * offset)} ${text(last.y + end.ux * offset)}`;
}

export interface Barb extends Point {
  /** Unit direction of the route there. */
  readonly ux: number;
  readonly uy: number;
}

/** Places of flow barbs along a route, `spacing` apart, none on legs shorter than `leastLeg`, clear of the bends.
 *  @param phase shift along the route, 0..spacing */
export function barbPlaces(points: readonly Point[], spacing: number, phase: number, leastLeg: number, clear: number): Barb[] {
  const barbs: Barb[] = [];
  const legs = legsOf(points);
  const begin = ((phase % spacing) + spacing) % spacing;
  legs.forEach((leg, k) => {
    if (leg.length < leastLeg - 1e-9) return;
    const a = points[k] as Point;
    const from = k === 0 ? clear * 0.5 : clear;
    const to = leg.length - (k === legs.length - 1 ? clear * 0.5 : clear);
    // Centre the row on its leg at phase 0, so that a resting drawing looks even.
    const count = Math.max(1, Math.floor((to - from) / spacing + 1e-9));
    const slack = (to - from - (count - 1) * spacing) / 2;
    for (let n = -1; n <= count; n += 1) {
      const along = from + slack + n * spacing + begin;
      if (along < from - 1e-9 || along > to + 1e-9) continue;
      barbs.push({ x: a.x + leg.ux * along, y: a.y + leg.uy * along, ux: leg.ux, uy: leg.uy });
    }
  });
  return barbs;
}

/** Open chevron pointing along (or against) the route, as path data. */
export function barbPath(barb: Barb, forward: boolean, depth: number, half: number): string {
  const sign = forward ? 1 : -1;
  const tx = barb.x + barb.ux * sign * depth * 0.5;
  const ty = barb.y + barb.uy * sign * depth * 0.5;
  const bx = barb.x - barb.ux * sign * depth * 0.5;
  const by = barb.y - barb.uy * sign * depth * 0.5;
  return `M${text(bx - barb.uy * half)} ${text(by + barb.ux * half)}L${text(tx)} ${text(ty)}L${text(bx + barb.uy * half)} ${text(by - barb.ux * half)}`;
}

function text(value: number): string {
  const rounded = Math.round(value * 1000) / 1000;
  return String(rounded === 0 ? 0 : rounded);
}
