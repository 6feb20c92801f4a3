import { asFoundValue, isLocked } from '#shared/circuit/edit/values.ts';
import { documentValue, effectiveNumber, findChange, screwRange } from '#shared/circuit/effective.ts';
import { findKind, findParameter } from '#shared/circuit/kind-lookup.ts';
import type { CircuitDocument } from '#shared/circuit/schema.ts';
import type { TagSpec } from './tag-specs.ts';

/** Everything a tag shows, from the document and the case on the drawing. All values SI. */
export interface TagState {
  readonly value: number;
  /** As typed, when it was. */
  readonly typed: string | undefined;
  readonly asFound: number;
  readonly min: number;
  readonly max: number;
  /** Change of the value per whole turn inwards; signed; for a dial one twentieth of its range. */
  readonly perTurn: number;
  /** Turns in from as found; negative = out. */
  readonly turns: number;
  readonly locked: boolean;
  readonly rating: number | null;
  /** Values of the other cases that differ, with their inks. */
  readonly others: readonly { readonly ink: number; readonly value: number }[];
  /** Cases other than A in which this is changed, by name letter. */
  readonly changedIn: readonly number[];
}

/** Turn of a dial that has no turns of its own: a tidy step of the quantity. */
const dialStep: Readonly<Record<string, number>> = { voltage: 20, force: 4000 };

export function tagState(document: CircuitDocument, caseId: string, spec: TagSpec): TagState | null {
  const value = effectiveNumber(document, caseId, spec.target, spec.field);
  if (value === null) return null;
  const own = documentValue(document, spec.target, spec.field);
  const asFound = (spec.screw ? asFoundValue(document, spec.target, spec.field) : typeof own === 'number' ? own : null) ?? value;
  const { min, max } = bounds(document, caseId, spec, asFound);
  const given = spec.screw ? effectiveNumber(document, caseId, spec.target, spec.screw.perTurn) : null;
  const size = given !== null && given > 0 ? given : (dialStep[spec.quantity] ?? Math.max((max - min) / 10, 1e-12));
  const perTurn = spec.screw?.inward === 'lowers' ? -size : size;
  const component = document.components.find((entry) => entry.id === spec.target);
  const change = findChange(document, caseId, spec.target, spec.field);
  const others: TagState['others'][number][] = [];
  const changedIn: number[] = [];
  for (const entry of document.cases) {
    const theirs = effectiveNumber(document, entry.id, spec.target, spec.field);
    if (entry.id !== caseId && theirs !== null && theirs !== value) others.push({ ink: entry.ink, value: theirs });
    if (findChange(document, entry.id, spec.target, spec.field)) changedIn.push(entry.ink);
  }
  return {
    value,
    typed: change ? change.typed : component?.parameters[spec.field]?.typed,
    asFound,
    min,
    max,
    perTurn,
    turns: (value - asFound) / perTurn,
    locked: spec.screw ? isLocked(document, spec.target, spec.field) : false,
    rating: ratingOf(document, caseId, spec),
    others,
    changedIn,
  };
}

function bounds(document: CircuitDocument, caseId: string, spec: TagSpec, asFound: number): { min: number; max: number } {
  if (spec.screw) {
    const range = screwRange(document, caseId, spec.target, spec.field);
    if (range) return range;
  }
  if (spec.target === 'supply') return { min: 0.5 * asFound, max: 1.25 * asFound };
  return asFound < 0 ? { min: 2 * asFound, max: 0 } : { min: 0, max: 2 * asFound || 1 };
}

/** The lowest pressure rating in the circuit that a pressure screw could pass; null for other quantities. */
function ratingOf(document: CircuitDocument, caseId: string, spec: TagSpec): number | null {
  if (spec.quantity !== 'pressure') return null;
  let lowest = Number.POSITIVE_INFINITY;
  for (const component of document.components) {
    const kind = findKind(component.kind);
    if (!kind || !findParameter(kind, 'ratedPressure')) continue;
    const rating = effectiveNumber(document, caseId, component.id, 'ratedPressure');
    if (rating !== null && rating < lowest) lowest = rating;
  }
  return Number.isFinite(lowest) ? lowest : null;
}

/** How a tag is shown: full only while in hand, changed in some case, or pinned. */
export function isFull(document: CircuitDocument, spec: TagSpec, inHand: string | null): boolean {
  if (inHand === spec.address) return true;
  if (document.tagPlaces[spec.address]?.pinned) return true;
  return document.cases.some((entry) => entry.changes.some((change) => change.target === spec.target && change.field === spec.field));
}
