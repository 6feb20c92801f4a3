import { lockScrew, resetToAsFound } from '#shared/circuit/edit/values.ts';
import { preferredUnit, type UnitPreferences } from '#shared/units/convert.ts';
import { parseQuantity, type RefusedQuantity } from '#shared/units/parse.ts';
import { applyValue, takeEdit } from '#src/stores/apply-value.ts';
import { useDocument } from '#src/stores/document-store.ts';
import type { TagSpec } from './tag-specs.ts';
import { type TagState, tagState } from './tag-state.ts';

/** Turning, typing and locking. A release writes one step to the history. */

export const QUARTER = 0.25;
export const FINE = 1 / 32;

/** Why a turn was not taken. */
export interface TurnRefusal {
  readonly message: string;
  readonly nearest?: number;
  readonly locked?: boolean;
}

export function presentState(spec: TagSpec): TagState | null {
  const { document, activeCase } = useDocument.getState();
  return tagState(document, activeCase, spec);
}

/** Drops the noise of adding quarters: a value is kept to a millionth of a turn. */
function tidy(value: number, state: TagState): number {
  const step = Math.abs(state.perTurn) / 1e6;
  const rounded = Math.round(value / step) * step;
  return Math.abs(rounded - state.asFound) < step * 2 ? state.asFound : rounded;
}

/** Sets the value in the case on the drawing; at the ends of the range it stops there and says so. */
export function setTo(spec: TagSpec, value: number): TurnRefusal | null {
  const state = presentState(spec);
  if (!state) return { message: `${spec.label} has no value to turn.` };
  if (state.locked) return lockedRefusal(spec);
  const held = Math.min(state.max, Math.max(state.min, tidy(value, state)));
  const refused = applyValue(spec.target, spec.field, held);
  if (refused) return refused;
  if (held !== tidy(value, state)) {
    return { message: held === state.max ? 'That is the upper end of its range.' : 'That is the lower end of its range.', nearest: held };
  }
  return null;
}

function lockedRefusal(spec: TagSpec): TurnRefusal {
  return { message: `The lock nut of ${spec.label.toLowerCase()} is tight. Loosen it first.`, locked: true };
}

/** Turns by a number of turns, inwards positive, as one step of the history. */
export function turnBy(spec: TagSpec, turns: number): TurnRefusal | null {
  const state = presentState(spec);
  if (!state) return null;
  return inOneStep(() => setTo(spec, state.value + turns * state.perTurn));
}

/** Runs an edit as one step of the history. */
export function inOneStep<T>(work: () => T): T {
  const { gesture, beginGesture } = useDocument.getState();
  if (gesture) return work();
  beginGesture();
  try {
    return work();
  } finally {
    useDocument.getState().endGesture();
  }
}

export function toAsFound(spec: TagSpec): TurnRefusal | null {
  const state = presentState(spec);
  if (!state) return null;
  if (state.locked) return lockedRefusal(spec);
  const { document, activeCase } = useDocument.getState();
  const refused = spec.screw
    ? takeEdit(resetToAsFound(document, activeCase, spec.target, spec.field))
    : applyValue(spec.target, spec.field, state.asFound);
  return refused ?? null;
}

export function setLock(spec: TagSpec, locked: boolean): void {
  if (spec.screw) useDocument.getState().edit((document) => lockScrew(document, spec.target, spec.field, locked));
}

export type Typed = { readonly ok: true } | { readonly ok: false; readonly refusal: RefusedQuantity };

/** Takes what was typed, with any unit of the quantity; outside the range it is refused with the nearest value. */
export function typeValue(spec: TagSpec, entry: string, preferences: UnitPreferences): Typed {
  const state = presentState(spec);
  if (!state) return { ok: true };
  const bounded = spec.screw !== null;
  const parsed = parseQuantity(entry, spec.quantity, preferredUnit(spec.quantity, preferences).id, {
    min: bounded ? state.min : Number.NEGATIVE_INFINITY,
    max: bounded ? state.max : Number.POSITIVE_INFINITY,
    label: spec.label,
    preferences,
  });
  if (!parsed.ok) return { ok: false, refusal: parsed };
  return takeValue(spec, parsed.value, parsed.typed);
}

/** Takes a value that was offered; `typed` only names it, in fewer digits. */
export function takeValue(spec: TagSpec, value: number, typed: string): Typed {
  if (presentState(spec)?.locked)
    return { ok: false, refusal: { ok: false, reason: 'not-a-number', message: lockedRefusal(spec).message } };
  const refused = applyValue(spec.target, spec.field, value, typed);
  if (refused) return { ok: false, refusal: { ok: false, reason: 'out-of-range', message: refused.message } };
  return { ok: true };
}
