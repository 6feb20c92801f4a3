import { kindOf } from '../kinds/registry.ts';
import { addressOf, type Nets } from './nets.ts';
import type { CircuitDocument } from './schema.ts';

/** Directed ways between hydraulic nets that oil can always take: lines with loss both ways, and each kind's `passes`. */
export function waysBetweenNets(document: CircuitDocument, nets: Nets): ReadonlyMap<number, readonly number[]> {
  const ways = new Map<number, number[]>();
  const add = (from: number | undefined, to: number | undefined): void => {
    if (from === undefined || to === undefined || from === to) return;
    const there = ways.get(from);
    if (there) there.push(to);
    else ways.set(from, [to]);
  };
  for (const line of nets.lossLines) {
    const from = nets.oilNetOf.get(addressOf(line.from));
    const to = nets.oilNetOf.get(addressOf(line.to));
    add(from, to);
    add(to, from);
  }
  for (const component of document.components) {
    for (const [from, to] of kindOf(component.kind)?.passes ?? []) {
      add(nets.oilNetOf.get(`${component.id}.${from}`), nets.oilNetOf.get(`${component.id}.${to}`));
    }
  }
  return ways;
}

/** Every net that oil from `start` can always reach, `start` included. */
export function netsReached(start: number, ways: ReadonlyMap<number, readonly number[]>): ReadonlySet<number> {
  const reached = new Set<number>([start]);
  const queue = [start];
  for (let next = queue.shift(); next !== undefined; next = queue.shift()) {
    for (const other of ways.get(next) ?? []) {
      if (reached.has(other)) continue;
      reached.add(other);
      queue.push(other);
    }
  }
  return reached;
}
