import type { Stage } from '../kinds/kind.ts';
import { findKind } from './kind-lookup.ts';
import type { CircuitDocument, Component, PortRef } from './schema.ts';

/** Stages in flow order, as in the parts drawer. */
export const stages: readonly Stage[] = ['drive', 'pump', 'protect', 'direct', 'act', 'store', 'return'];

export const stageWords: Record<Stage, string> = {
  drive: 'Drive',
  pump: 'Pump',
  protect: 'Protect',
  direct: 'Direct',
  act: 'Act',
  store: 'Store',
  return: 'Return',
};

function rank(component: Component): number {
  const stage = findKind(component.kind)?.stage;
  return stage ? stages.indexOf(stage) : stages.length;
}

/** Ids of all components in the order in which oil (and before it the shaft) passes them: from each drive along its shaft, then
 *  breadth first along the lines; parts that hang on nothing follow by stage, then from left to right. Tab order, component
 *  lists and screen readers all use this one order. */
export function flowOrder(document: CircuitDocument): string[] {
  const neighbours = new Map<string, string[]>();
  const link = (a: PortRef, b: PortRef) => {
    const list = neighbours.get(a.component);
    if (list) list.push(b.component);
    else neighbours.set(a.component, [b.component]);
  };
  for (const shaft of document.shafts) {
    for (const a of shaft.members) for (const b of shaft.members) if (a.component !== b.component) link(a, b);
  }
  for (const line of document.lines) {
    link(line.from, line.to);
    link(line.to, line.from);
  }
  const byId = new Map(document.components.map((component) => [component.id, component]));
  const before = (a: Component, b: Component) => rank(a) - rank(b) || a.at.x - b.at.x || a.at.y - b.at.y || (a.id < b.id ? -1 : 1);
  const starts = [...document.components].sort(before);
  const seen = new Set<string>();
  const order: string[] = [];
  for (const start of starts) {
    if (seen.has(start.id)) continue;
    seen.add(start.id);
    const queue = [start];
    for (let next = queue.shift(); next; next = queue.shift()) {
      order.push(next.id);
      const around = [...new Set(neighbours.get(next.id) ?? [])].flatMap((id) => (seen.has(id) ? [] : (byId.get(id) ?? []))).sort(before);
      for (const other of around) seen.add(other.id);
      queue.push(...around);
    }
  }
  return order;
}
