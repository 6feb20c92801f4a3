import { flowOrder } from '#shared/circuit/flow-order.ts';
import { findKind, findParameter } from '#shared/circuit/kind-lookup.ts';
import type { CircuitDocument } from '#shared/circuit/schema.ts';
import type { ScrewSpec } from '#shared/kinds/kind.ts';
import { type Point, placePoint } from '#shared/symbols/place.ts';
import { symbolOf } from '#shared/symbols/registry.ts';
import type { QuantityId } from '#shared/units/quantities.ts';

/** What on the drawing can be turned: adjusting screws of parts, and as dials the supply voltage and the load of a cylinder. */
export interface TagSpec {
  /** 'component.field' or 'supply.voltage'. */
  readonly address: string;
  readonly target: string;
  readonly field: string;
  /** Component the tag is tied to. */
  readonly component: string;
  readonly label: string;
  readonly short: string;
  readonly quantity: QuantityId;
  readonly screw: ScrewSpec | null;
  readonly anchor: Point;
}

function cylinderLoad(values: Readonly<Record<string, { readonly value: number | string }>>): { field: string; label: string } | null {
  const given = (field: string) => {
    const value = values[field]?.value;
    return typeof value === 'number' && value !== 0;
  };
  if (given('workForce')) return { field: 'workForce', label: 'Bale' };
  if (given('loadForce')) return { field: 'loadForce', label: 'Load' };
  return null;
}

/** All tags of a circuit in flow order. */
export function tagSpecs(document: CircuitDocument): TagSpec[] {
  const specs: TagSpec[] = [];
  let supplied = false;
  for (const id of flowOrder(document)) {
    const component = document.components.find((entry) => entry.id === id);
    const symbol = component && symbolOf(component.kind);
    const kind = component && findKind(component.kind);
    if (!component || !symbol || !kind) continue;
    const anchorAt = (name: string): Point => placePoint(symbol, component, symbol.anchors[name] ?? { x: symbol.width / 2, y: 0 });
    if (kind.id === 'electric-motor' && !supplied) {
      supplied = true;
      specs.push({
        address: 'supply.voltage',
        target: 'supply',
        field: 'voltage',
        component: id,
        label: 'Supply',
        short: 'Supply',
        quantity: 'voltage',
        screw: null,
        anchor: anchorAt('supply'),
      });
    }
    for (const screw of kind.screws) {
      const parameter = findParameter(kind, screw.id);
      if (parameter?.type !== 'number') continue;
      specs.push({
        address: `${id}.${screw.id}`,
        target: id,
        field: screw.id,
        component: id,
        label: screw.label,
        short: screw.short,
        quantity: parameter.quantity,
        screw,
        anchor: anchorAt(screw.anchor),
      });
    }
    const load = kind.id === 'cylinder' ? cylinderLoad(component.parameters) : null;
    if (load) {
      specs.push({
        address: `${id}.${load.field}`,
        target: id,
        field: load.field,
        component: id,
        label: load.label,
        short: load.label,
        quantity: 'force',
        screw: null,
        anchor: anchorAt('load'),
      });
    }
  }
  return specs;
}
