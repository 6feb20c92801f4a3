import type { PortSpec } from '../kinds/kind.ts';
import { isOpen, openArm } from './edit/joins.ts';
import { flowOrder } from './flow-order.ts';
import { findComponent, findKind } from './kind-lookup.ts';
import type { CircuitDocument, PortRef } from './schema.ts';

export interface OpenPort extends PortRef {
  readonly spec: PortSpec;
}

/** Ports without line or shaft, in flow order. A junction shows one open arm at most, the next free one; with three lines it
 *  is complete and `optional`: a place where one may still branch. */
export function openPorts(document: CircuitDocument): (OpenPort & { readonly optional: boolean })[] {
  return flowOrder(document).flatMap((id) => {
    const component = findComponent(document, id);
    const kind = component && findKind(component.kind);
    if (!kind) return [];
    const seen = new Set<string>();
    return kind.ports.flatMap((spec) => {
      const ref = { component: id, port: spec.id };
      if (spec.node !== undefined) {
        if (seen.has(spec.node)) return [];
        seen.add(spec.node);
        const arm = openArm(document, ref);
        const found = kind.ports.find((port) => port.id === arm.port);
        if (!found || !isOpen(document, arm)) return [];
        const lines = document.lines.filter((line) => line.from.component === id || line.to.component === id).length;
        return [{ ...arm, spec: found, optional: lines >= 3 }];
      }
      return isOpen(document, ref) ? [{ ...ref, spec, optional: false }] : [];
    });
  });
}
