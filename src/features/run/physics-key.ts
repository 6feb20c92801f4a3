import type { CircuitCase, CircuitDocument, Component } from '#shared/circuit/schema.ts';

/** Whether an edit can change a run: positions, names of cases, notes and labels cannot. Documents share what an edit did
 *  not touch, so identity of the parts is enough and costs nothing. */

function sameComponent(a: Component, b: Component): boolean {
  return a === b || (a.id === b.id && a.kind === b.kind && a.name === b.name && a.parameters === b.parameters);
}

function sameList<T>(a: readonly T[], b: readonly T[], same: (x: T, y: T) => boolean): boolean {
  if (a === b) return true;
  return a.length === b.length && a.every((entry, i) => same(entry, b[i] as T));
}

/** True when `next` can give another result than `previous` for every case. */
export function samePhysics(previous: CircuitDocument, next: CircuitDocument): boolean {
  return (
    sameList(previous.components, next.components, sameComponent) &&
    sameList(previous.lines, next.lines, (a, b) => a === b || sameLine(a, b)) &&
    previous.shafts === next.shafts &&
    previous.fluid === next.fluid &&
    previous.reservoir === next.reservoir &&
    previous.supply === next.supply &&
    previous.site === next.site &&
    previous.duty === next.duty &&
    previous.requirements === next.requirements
  );
}

function sameLine(a: CircuitDocument['lines'][number], b: CircuitDocument['lines'][number]): boolean {
  const keys = ['id', 'from', 'to', 'length', 'bore', 'wall', 'volume', 'loss', 'laminar', 'quadratic'] as const;
  return keys.every((key) => a[key] === b[key]);
}

/** True when one case's own changes are the same. */
export function sameCase(a: CircuitCase | undefined, b: CircuitCase | undefined): boolean {
  return a !== undefined && b !== undefined && a.changes === b.changes;
}
