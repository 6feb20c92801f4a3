import { clearValue, removeChange } from '#shared/circuit/edit/values.ts';
import { documentValue, effectiveNumber, effectiveValue, findChange, firstCase, screwRange } from '#shared/circuit/effective.ts';
import { findComponent, findKind, findScrew } from '#shared/circuit/kind-lookup.ts';
import type { CircuitDocument, ValueSource } from '#shared/circuit/schema.ts';
import { type FieldSpec, fieldSpec } from '#src/lib/field-specs.ts';
import { useDocument } from '#src/stores/document-store.ts';

/** Everything a row of a plate shows about one value, as the case on the drawing sees it. */
export interface PlateValue {
  readonly target: string;
  readonly field: string;
  readonly spec: FieldSpec;
  /** Effective value [SI]; null = not given. */
  readonly value: number | string | null;
  readonly typed?: string;
  readonly source: ValueSource;
  readonly spread?: number;
  readonly min: number;
  readonly max: number;
  /** The bounds are the ends of a screw. */
  readonly screw: boolean;
  /** The case changes it; `found` is the document's own value. */
  readonly changed: boolean;
  readonly found: number | string | null;
  /** The choice's values are numbers in the document. */
  readonly numericChoice: boolean;
  /** Set above a rating of the part [SI]. */
  readonly above?: { readonly rating: number; readonly label: string };
  /** Takes the given value away, where the field may be empty or typical. */
  readonly onClear?: () => void;
}

/** Settings that are held against a rating of the same part, by parameter id. */
const heldAgainst: Record<string, string> = { compensatorPressure: 'ratedPressure', setPressure: 'ratedPressure' };

function aboveRating(document: CircuitDocument, caseId: string, target: string, field: string): PlateValue['above'] {
  const rated = heldAgainst[field];
  if (!rated) return undefined;
  const value = effectiveNumber(document, caseId, target, field);
  const rating = effectiveNumber(document, caseId, target, rated);
  if (value === null || rating === null || value <= rating) return undefined;
  return { rating, label: fieldSpec(document, target, rated)?.label ?? rated };
}

/** @returns null when the target has no such field. */
export function plateValue(document: CircuitDocument, caseId: string, target: string, field: string): PlateValue | null {
  const spec = fieldSpec(document, target, field);
  if (!spec) return null;
  const component = findComponent(document, target);
  const kind = component && findKind(component.kind);
  const given = component?.parameters[field];
  const change = caseId === firstCase(document).id ? undefined : findChange(document, caseId, target, field);
  const range = kind && findScrew(kind, field) ? screwRange(document, caseId, target, field) : undefined;
  const bounds = range ?? (spec.type === 'number' ? spec : { min: 0, max: 0 });
  const clear = change
    ? () => useDocument.getState().edit((present) => removeChange(present, caseId, target, field))
    : given
      ? () => useDocument.getState().edit((present) => clearValue(present, target, field))
      : undefined;
  return {
    target,
    field,
    spec,
    value: effectiveValue(document, caseId, target, field),
    typed: change ? change.typed : given?.typed,
    source: change ? 'typed' : given ? given.source : component ? 'typical' : 'typed',
    spread: change ? undefined : given?.spread,
    min: bounds.min,
    max: bounds.max,
    screw: range !== undefined,
    changed: change !== undefined,
    found: documentValue(document, target, field) ?? null,
    numericChoice: field === 'loss' && component === undefined,
    above: aboveRating(document, caseId, target, field),
    onClear: clear,
  };
}
