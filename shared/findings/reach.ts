import type { CircuitDocument, PortRef } from '../circuit/schema.ts';
import { kindOf } from '../kinds/registry.ts';

/** Where oil can get to on the drawing, without running anything. Ports are written 'component.port'. */
export interface Reach {
  /** Name of the net of a port: its smallest port address. */
  netOf: (port: string) => string;
  /** Nets that oil from this port reaches whatever the valves do: through elements that cannot close in that direction
   *  (a check valve forward counts as open). The port's own net is among them. */
  always: (port: string) => ReadonlySet<string>;
  /** Nets on which this port's pressure can stand: through open valves towards the work, never past a relief or to tank. */
  loaded: (port: string) => ReadonlySet<string>;
}

export function portKey(ref: PortRef): string {
  return `${ref.component}.${ref.port}`;
}

export function findReach(document: CircuitDocument): Reach {
  const parent = new Map<string, string>();
  const root = (port: string): string => {
    let at = port;
    for (;;) {
      const up = parent.get(at);
      if (up === undefined || up === at) return at;
      at = up;
    }
  };
  const join = (a: string, b: string) => {
    const [low, high] = [root(a), root(b)].sort() as [string, string];
    if (low !== high) parent.set(high, low);
  };
  for (const line of document.lines) join(portKey(line.from), portKey(line.to));
  const open: [string, string][] = [];
  const towardsWork: [string, string][] = [];
  for (const component of document.components) {
    const kind = kindOf(component.kind);
    if (!kind) continue;
    const oil = kind.ports.filter((port) => port.medium === 'oil');
    for (const port of oil)
      for (const other of oil) if (port.node && port.node === other.node) join(`${component.id}.${port.id}`, `${component.id}.${other.id}`);
    for (const [from, to] of kind.passes) open.push([`${component.id}.${from}`, `${component.id}.${to}`]);
    for (const [from, to] of workPaths(
      component.kind,
      oil.map((port) => port.id),
    ))
      towardsWork.push([`${component.id}.${from}`, `${component.id}.${to}`]);
  }
  const spread = (port: string, paths: readonly [string, string][]): Set<string> => {
    const seen = new Set([root(port)]);
    for (let grew = true; grew; ) {
      grew = false;
      for (const [from, to] of paths) {
        if (!seen.has(root(from)) || seen.has(root(to))) continue;
        seen.add(root(to));
        grew = true;
      }
    }
    return seen;
  };
  return { netOf: root, always: (port) => spread(port, open), loaded: (port) => spread(port, [...open, ...towardsWork]) };
}

/** Paths on which supply pressure travels on towards the work while a valve is open. */
function workPaths(kind: string, ports: readonly string[]): readonly [string, string][] {
  if (ports.includes('P') && ports.includes('A'))
    return [
      ['P', 'A'],
      ['P', 'B'],
    ];
  if (ports.length === 2 && ports.includes('A') && ports.includes('B') && kind !== 'cylinder') {
    return kind === 'check-valve'
      ? [['A', 'B']]
      : [
          ['A', 'B'],
          ['B', 'A'],
        ];
  }
  return [];
}
