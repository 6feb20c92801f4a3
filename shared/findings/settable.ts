import { documentValue, effectiveNumber } from '../circuit/effective.ts';
import type { CircuitDocument } from '../circuit/schema.ts';
import { kindOf } from '../kinds/registry.ts';
import type { Seek } from './finding.ts';

/** Turns are set in quarters. */
const QUARTER = 0.25;
/** Where a setting has no screw the range is searched in this many steps. */
const STEPS = 64;

/** Values that a screw can be set to inside the range asked for: quarter turns counted from as found, ascending [SI]. */
export function settableValues(document: CircuitDocument, caseId: string, seek: Seek): number[] {
  const component = document.components.find((entry) => entry.id === seek.target);
  const screw = component && kindOf(component.kind)?.screws.find((entry) => entry.id === seek.field);
  const perTurn = screw ? Math.abs(effectiveNumber(document, caseId, seek.target, screw.perTurn) ?? 0) : 0;
  const base = component?.screws?.[seek.field]?.asFound ?? documentNumber(document, seek);
  const step = perTurn > 0 ? perTurn * QUARTER : (seek.high - seek.low) / STEPS;
  if (!(step > 0)) return [];
  const origin = perTurn > 0 ? base : seek.low;
  const slack = 1e-9 * Math.max(Math.abs(seek.high), step);
  const values: number[] = [];
  for (let n = Math.ceil((seek.low - origin - slack) / step); origin + n * step <= seek.high + slack; n++) values.push(origin + n * step);
  return values;
}

function documentNumber(document: CircuitDocument, seek: Seek): number {
  const value = documentValue(document, seek.target, seek.field);
  return typeof value === 'number' ? value : seek.low;
}

/** The document without what a trial run does not need. */
export function baseDocumentOf(document: CircuitDocument): CircuitDocument {
  return { ...document, tagPlaces: {}, labels: [], notes: [] };
}
