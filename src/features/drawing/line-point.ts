import type { Line } from '#shared/circuit/schema.ts';

interface Point {
  readonly x: number;
  readonly y: number;
}

/** Where on a drawn line a point lies. */
export interface LinePoint extends Point {
  /** Share of the drawn length before it, 0..1. */
  readonly share: number;
  /** Bends that a person set and that lie before it. */
  readonly bendsBefore: number;
}

/** Nearest point of a route to a place on the sheet, on half modules; null for a route without length. */
export function nearestOnLine(line: Pick<Line, 'route'>, points: readonly Point[], place: Point): LinePoint | null {
  const nearest = alongRoute(points, place);
  if (!nearest) return null;
  const bendsBefore = line.route.filter((bend) => (alongRoute(points, bend)?.along ?? 0) < nearest.along).length;
  return {
    x: Math.round(nearest.x * 2) / 2,
    y: Math.round(nearest.y * 2) / 2,
    share: nearest.along / nearest.length,
    bendsBefore,
  };
}

function alongRoute(points: readonly Point[], place: Point): (Point & { along: number; length: number }) | null {
  let length = 0;
  let best: (Point & { along: number; distance: number }) | null = null;
  for (let k = 0; k + 1 < points.length; k++) {
    const a = points[k] as Point;
    const b = points[k + 1] as Point;
    const run = Math.hypot(b.x - a.x, b.y - a.y);
    if (run === 0) continue;
    const t = Math.min(1, Math.max(0, ((place.x - a.x) * (b.x - a.x) + (place.y - a.y) * (b.y - a.y)) / (run * run)));
    const x = a.x + t * (b.x - a.x);
    const y = a.y + t * (b.y - a.y);
    const distance = Math.hypot(place.x - x, place.y - y);
    if (!best || distance < best.distance) best = { x, y, along: length + t * run, distance };
    length += run;
  }
  return best && length > 0 ? { x: best.x, y: best.y, along: best.along, length } : null;
}
