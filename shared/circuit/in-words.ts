import type { NumberParameter, ParameterSpec } from '../kinds/kind.ts';
import { type QuantityId, quantities, type Unit } from '../units/quantities.ts';

/** Plain words for values in messages about documents. Messages are read by whoever edits the file, so they use the SI
 *  system's shop units (bar, cm³/rev); the screens print their own in the reader's units. */

/** A number of at most six digits without exponent tails: 0.1 + 0.2 reads 0.3. */
export function plainNumber(value: number): string {
  return String(Number(value.toPrecision(6)));
}

/** A stored value in the SI system's unit of its quantity, e.g. '190 bar'. */
export function quantityInWords(value: number, quantity: QuantityId): string {
  const definition = quantities[quantity];
  const unit = (definition.units as readonly Unit[]).find((entry) => entry.id === definition.si) ?? (definition.units[0] as Unit);
  return `${plainNumber((value - unit.offset) / unit.factor)} ${unit.symbol}`.trim();
}

/** What a parameter may be, in words. */
export function allowedInWords(spec: ParameterSpec): string {
  if (spec.type === 'choice') return `one of ${spec.choices.map((choice) => choice.value).join(', ')}`;
  return rangeInWords(spec.min, spec.max, spec.quantity);
}

export function rangeInWords(min: number, max: number, quantity: NumberParameter['quantity']): string {
  return `${quantityInWords(min, quantity)} to ${quantityInWords(max, quantity)}`;
}

/** 'a', 'a and b', 'a, b and c'. */
export function listInWords(words: readonly string[]): string {
  if (words.length < 2) return words.join('');
  return `${words.slice(0, -1).join(', ')} and ${words[words.length - 1]}`;
}

/** '1 line', '3 lines'. */
export function countInWords(count: number, one: string, many = `${one}s`): string {
  return `${count} ${count === 1 ? one : many}`;
}
