import { effectiveValue } from '../circuit/effective.ts';
import { findKind } from '../circuit/kind-lookup.ts';
import type { CircuitDocument, Component } from '../circuit/schema.ts';

/** Parameter values of a component as a case sees them (document, then case; typical values filled in), for its symbol. */
export function symbolValues(document: CircuitDocument, caseId: string, component: Component): Readonly<Record<string, number | string>> {
  const values: Record<string, number | string> = {};
  for (const [id, entry] of Object.entries(component.parameters)) values[id] = entry.value;
  for (const spec of findKind(component.kind)?.parameters ?? []) {
    const value = effectiveValue(document, caseId, component.id, spec.id);
    if (value !== null) values[spec.id] = value;
  }
  return values;
}
