import type { CircuitDocument } from '#shared/circuit/schema.ts';
import { caseLetter } from '#shared/pictures/case-pens.ts';
import { type FormattedQuantity, formatTurns } from '#shared/units/format.ts';
import type { Format } from '#src/components/use-format.ts';
import type { TagSpec } from './tag-specs.ts';
import type { TagState } from './tag-state.ts';

/** Words of a tag. */

export function tagTitle(spec: TagSpec): string {
  return spec.label.replace('volume', 'vol.');
}

export function tagValue(spec: TagSpec, state: TagState, format: Format): FormattedQuantity {
  return format.quantity(state.value, spec.quantity);
}

/** "3 turns in", "lock-nut tight", "C differs", "nameplate 400": what is most worth knowing. */
export function tagNote(spec: TagSpec, state: TagState, activeInk: number, pinned: boolean, plate: number | null, format: Format): string {
  if (!spec.screw) {
    if (plate !== null) return `nameplate ${format.quantity(plate, spec.quantity).value}`;
    if (Math.abs(state.turns) > 1e-6) return `as found ${format.quantity(state.asFound, spec.quantity).value}`;
    return 'as found';
  }
  if (Math.abs(state.turns) >= 0.125) return formatTurns(state.turns);
  const elsewhere = state.changedIn.filter((ink) => ink !== activeInk);
  if (elsewhere.length > 0) return `${elsewhere.map(caseLetter).join(', ')} ${elsewhere.length === 1 ? 'differs' : 'differ'}`;
  if (state.locked) return format.words('lock-nut tight');
  if (Math.abs(state.turns) > 1e-6) return 'a touch off';
  return pinned ? 'pinned' : 'as found';
}

/** Rated voltage of the motor on which the supply's tag hangs [V]; null for other tags. */
export function plateVoltage(document: CircuitDocument, spec: TagSpec): number | null {
  if (spec.target !== 'supply') return null;
  const value = document.components.find((entry) => entry.id === spec.component)?.parameters.ratedVoltage?.value;
  return typeof value === 'number' ? value : null;
}

/** The whole tag in one sentence, for those who hear it. */
export function spokenValue(spec: TagSpec, state: TagState, format: Format): string {
  const parts = [tagValue(spec, state, format).text];
  if (spec.screw) parts.push(formatTurns(state.turns));
  if (state.locked) parts.push(format.words('lock nut tight'));
  if (aboveRating(state)) parts.push('above the lowest rating');
  return parts.join(', ');
}

export function aboveRating(state: TagState): boolean {
  return state.rating !== null && state.value > state.rating * (1 + 1e-9);
}
