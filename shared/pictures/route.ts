import type { CircuitDocument, Line } from '../circuit/schema.ts';
import { type PlacedPort, type Point, sweptBox } from '../symbols/place.ts';
import { symbolOf } from '../symbols/registry.ts';
import { endOf, outward, writtenValues } from './line-ends.ts';
import type { Box } from './placement.ts';
import { BEND, legsOf, routeCost, type Surroundings } from './route-cost.ts';

/** Routes of lines on the sheet: orthogonal, leaving each port along its side, on half-modules. Bends a person set are kept;
 *  otherwise the cheapest of a set of lanes is taken that avoids symbols and keeps parallel lines apart. Crossings never join. */

export interface RoutedLine {
  readonly id: string;
  readonly kind: 'working' | 'drain' | 'pilot';
  /** Corners from body to body, ends included, in modules. */
  readonly points: readonly Point[];
}

const LEAD = 1;
const MOST_LANES = 14;

function snap(value: number): number {
  return Math.round(value * 2) / 2;
}

function isVertical(side: PlacedPort['side']): boolean {
  return side === 'top' || side === 'bottom';
}

/** Drops repeated points and the middle of straight runs; null when the path doubles back on itself. */
export function straighten(points: readonly Point[]): Point[] | null {
  const result: Point[] = [];
  for (const point of points) {
    const last = result[result.length - 1];
    if (last && last.x === point.x && last.y === point.y) continue;
    const before = result[result.length - 2];
    if (last && before) {
      const cross = (last.x - before.x) * (point.y - last.y) - (last.y - before.y) * (point.x - last.x);
      const dot = (last.x - before.x) * (point.x - last.x) + (last.y - before.y) * (point.y - last.y);
      if (Math.abs(cross) < 1e-9) {
        if (dot < 0) return null;
        result.pop();
      }
    }
    result.push(point);
  }
  return result;
}

/** Path through bends that a person set: right angles between them, leaving and arriving along the ports' sides. */
function throughBends(from: PlacedPort, to: PlacedPort, bends: readonly Point[]): Point[] {
  const points: Point[] = [{ x: from.x, y: from.y }];
  let vertical = isVertical(from.side);
  const stops = [...bends, { x: to.x, y: to.y }];
  stops.forEach((next, index) => {
    const last = points[points.length - 1] as Point;
    if (last.x !== next.x && last.y !== next.y) {
      const arriving = index === stops.length - 1;
      const first = arriving ? !isVertical(to.side) : vertical;
      points.push(first ? { x: last.x, y: next.y } : { x: next.x, y: last.y });
    }
    const corner = points[points.length - 1] as Point;
    vertical = corner.x !== next.x ? true : corner.y !== next.y ? false : vertical;
    points.push(next);
  });
  return points;
}

function lanes(a: number, b: number, edges: readonly number[]): number[] {
  const low = Math.min(a, b) - 10;
  const high = Math.max(a, b) + 10;
  const middle = snap((a + b) / 2);
  const wanted = [a, b, middle, ...edges.filter((value) => value > low && value < high)];
  for (let k = 2; k <= 8; k += 2) wanted.push(middle + k, middle - k, a + k, a - k, b + k, b - k);
  const unique = [...new Set(wanted.map(snap))];
  unique.sort((p, q) => Math.abs(p - a) + Math.abs(p - b) - (Math.abs(q - a) + Math.abs(q - b)) || p - q);
  return unique;
}

/** Length and bends of a path of at most a few corners, in modules; infinite when it doubles back, slants, or does not leave its
 *  first point along `away` and its last one along `toward`. Tells without any list whether a path is worth a closer look. */
function plainCost(path: readonly Point[], away: Point, toward: Point): number {
  let cost = -BEND;
  let fx = 0;
  let fy = 0;
  for (let k = 1; k < path.length; k += 1) {
    const dx = path[k]!.x - path[k - 1]!.x;
    const dy = path[k]!.y - path[k - 1]!.y;
    if (dx === 0 && dy === 0) continue;
    if (dx !== 0 && dy !== 0) return Number.POSITIVE_INFINITY;
    const along = dx * fx + dy * fy;
    if (along < 0) return Number.POSITIVE_INFINITY;
    if (fx === 0 && fy === 0 && dx * away.x + dy * away.y <= 0) return Number.POSITIVE_INFINITY;
    cost += Math.abs(dx) + Math.abs(dy) + (along === 0 ? BEND : 0);
    fx = dx;
    fy = dy;
  }
  return fx * toward.x + fy * toward.y < 0 ? cost : Number.POSITIVE_INFINITY;
}

/** Cheapest route between two ports. */
export function routeBetween(from: PlacedPort, to: PlacedPort, around: Surroundings): Point[] {
  const p0 = { x: from.x, y: from.y };
  const q0 = { x: to.x, y: to.y };
  const pd = outward(from.side);
  const qd = outward(to.side);
  const p = { x: p0.x + pd.x * LEAD, y: p0.y + pd.y * LEAD };
  const q = { x: q0.x + qd.x * LEAD, y: q0.y + qd.y * LEAD };
  let best: Point[] | null = null;
  let least = Number.POSITIVE_INFINITY;
  const offer = (...middle: readonly Point[]) => {
    const whole = [p0, ...middle, q0];
    // What a path comes near only adds to its cost.
    if (!(plainCost(whole, pd, qd) < least)) return;
    const path = straighten(whole);
    if (!path) return;
    const cost = routeCost(path, around, least);
    if (cost < least - 1e-9) {
      least = cost;
      best = path;
    }
  };
  offer();
  offer({ x: p0.x, y: q0.y });
  offer({ x: q0.x, y: p0.y });
  const { boxes } = around;
  const xs = lanes(
    p.x,
    q.x,
    boxes.flatMap((box) => [box.x - 1, box.x + box.w + 1]),
  );
  const ys = lanes(
    p.y,
    q.y,
    boxes.flatMap((box) => [box.y - 1, box.y + box.h + 1]),
  );
  for (const x of xs) {
    offer(p, { x, y: p.y }, { x, y: q.y }, q);
    offer({ x, y: p0.y }, { x, y: q0.y });
  }
  for (const y of ys) {
    offer(p, { x: p.x, y }, { x: q.x, y }, q);
    offer({ x: p0.x, y }, { x: q0.x, y });
  }
  if (least > directCost(p0, q0) + 12) {
    for (const x of xs.slice(0, MOST_LANES)) {
      for (const y of ys.slice(0, MOST_LANES)) {
        offer(p, { x, y: p.y }, { x, y }, { x: q.x, y }, q);
        offer(p, { x: p.x, y }, { x, y }, { x, y: q.y }, q);
      }
    }
  }
  return best ?? throughBends(from, to, [p, q]);
}

function directCost(a: Point, b: Point): number {
  return Math.abs(a.x - b.x) + Math.abs(a.y - b.y) + (a.x === b.x || a.y === b.y ? 0 : 3);
}

/** Body to body: the stubs of both ends joined on. */
function withStubs(from: PlacedPort, points: readonly Point[], to: PlacedPort): Point[] {
  const joined = [...from.path.slice(0, -1), ...points, ...to.path.slice(0, -1).reverse()];
  return straighten(joined) ?? joined;
}

/** Routes of all lines whose two ports exist. Lines with bends of their own are laid first, then short ones before long ones. */
export function routeLines(document: Pick<CircuitDocument, 'components' | 'lines'>): ReadonlyMap<string, RoutedLine> {
  const components = new Map(document.components.map((component) => [component.id, component]));
  const obstacles: Box[] = [];
  for (const component of document.components) {
    const symbol = symbolOf(component.kind);
    if (symbol) obstacles.push(sweptBox(symbol, component, writtenValues(component)));
  }
  const due: { line: Line; from: PlacedPort; to: PlacedPort; length: number }[] = [];
  for (const line of document.lines) {
    const from = endOf(components.get(line.from.component), line.from.port);
    const to = endOf(components.get(line.to.component), line.to.port);
    if (from && to) due.push({ line, from, to, length: Math.abs(from.x - to.x) + Math.abs(from.y - to.y) });
  }
  const order = due.map((_, index) => index);
  const rank = (index: number) => (due[index]!.line.route.length > 0 ? -1 : due[index]!.length);
  order.sort((a, b) => rank(a) - rank(b) || a - b);
  const around: { boxes: Box[]; legs: ReturnType<typeof legsOf> } = { boxes: obstacles, legs: [] };
  const routes = new Map<string, RoutedLine>();
  for (const index of order) {
    const { line, from, to } = due[index]!;
    const bends = line.route;
    const points =
      bends.length > 0 ? (straighten(throughBends(from, to, bends)) ?? throughBends(from, to, bends)) : routeBetween(from, to, around);
    const kind = from.line !== 'working' ? from.line : to.line;
    const whole = withStubs(from, points, to);
    around.legs.push(...legsOf(whole));
    routes.set(line.id, { id: line.id, kind, points: whole });
  }
  return routes;
}

/** Changes when, and only when, a route may change: for caching. */
export function routeSignature(document: Pick<CircuitDocument, 'components' | 'lines'>): string {
  const parts: string[] = [];
  for (const { id, kind, at, turn, mirror, parameters } of document.components) {
    const loads = kind === 'cylinder' ? ['workForce', 'springRate', 'loadForce', 'mass'].map((name) => parameters[name]?.value ?? '') : [];
    parts.push(`${id} ${kind} ${at.x} ${at.y} ${turn} ${mirror} ${loads.join(' ')}`);
  }
  for (const { id, from, to, route } of document.lines) {
    parts.push(`${id} ${from.component}.${from.port} ${to.component}.${to.port} ${route.map((p) => `${p.x},${p.y}`).join(' ')}`);
  }
  return parts.join('|');
}
