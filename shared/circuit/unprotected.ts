import { kindOf } from '../kinds/registry.ts';
import { addressOf, findNets, isOpen } from './nets.ts';
import { netsReached, waysBetweenNets } from './reach.ts';
import type { CircuitDocument, PortRef } from './schema.ts';

/** Joined pump outlets from which neither a relief nor a tank is always reached, whatever the valves do. An outlet that is
 *  still open is not listed: that it leads nowhere is said already. */
export function unprotectedSources(document: CircuitDocument): PortRef[] {
  const nets = findNets(document);
  const ways = waysBetweenNets(document, nets);
  const ends = new Set<number>();
  for (const component of document.components) {
    const port = component.kind === 'relief-valve' ? 'P' : component.kind === 'tank' ? 'T' : null;
    const net = port === null ? undefined : nets.oilNetOf.get(`${component.id}.${port}`);
    if (net !== undefined) ends.add(net);
  }
  return document.components.flatMap((component) =>
    (kindOf(component.kind)?.ports ?? []).flatMap((port) => {
      const ref = { component: component.id, port: port.id };
      const start = port.source ? nets.oilNetOf.get(addressOf(ref)) : undefined;
      if (start === undefined || isOpen(nets, addressOf(ref))) return [];
      return [...netsReached(start, ways)].some((net) => ends.has(net)) ? [] : [ref];
    }),
  );
}
