import type { QuantityId } from '../units/quantities.ts';
import type { ChoiceParameter, InputSpec, NumberParameter, ParameterGroup, Plate } from './kind.ts';
import { ENTERED } from './sources.ts';

/** Short forms in which kinds write their declarations, so that a nameplate row stays readable. */

interface NumberExtras {
  readonly typical?: readonly [number, number];
  readonly equation?: string;
  readonly ratingOf?: string;
}

/** A number on the nameplate; `range` is what may be entered [SI], `initial` the typical value or null. */
export function number(
  group: ParameterGroup,
  id: string,
  label: string,
  quantity: QuantityId,
  initial: number | null,
  range: readonly [number, number],
  help: string,
  source: string,
  extras: NumberExtras = {},
): NumberParameter {
  return {
    type: 'number',
    id,
    label,
    quantity,
    group,
    min: range[0],
    max: range[1],
    initial,
    help,
    source,
    ...(extras.typical ? { typicalRange: extras.typical } : {}),
    ...(extras.equation ? { equation: extras.equation } : {}),
    ...(extras.ratingOf ? { rating: { of: extras.ratingOf } } : {}),
  };
}

/** A raw coefficient: not given unless someone enters it; then it replaces what the plate values would give. */
export function raw(
  id: string,
  label: string,
  quantity: QuantityId,
  range: readonly [number, number],
  help: string,
  equation?: string,
): NumberParameter {
  return number(
    'raw',
    `raw.${id}`,
    label,
    quantity,
    null,
    range,
    `${help} Replaces the plate value; used as given, without correction for viscosity.`,
    ENTERED,
    equation ? { equation } : {},
  );
}

/** A choice between words; the first is the typical one unless `initial` says otherwise. */
export function choice(
  group: ParameterGroup,
  id: string,
  label: string,
  choices: readonly (readonly [value: string, label: string])[],
  initial: string,
  help: string,
  source: string,
): ChoiceParameter {
  return { type: 'choice', id, label, group, choices: choices.map(([value, text]) => ({ value, label: text })), initial, help, source };
}

/** An input that rests at the parameter of the same id and is moved by duty commands. */
export function settingInput(
  id: string,
  label: string,
  quantity: QuantityId,
  range: readonly [number, number],
  ramp: number,
  role: InputSpec['role'] = 'setting',
): InputSpec {
  return { id, label, quantity, min: range[0], max: range[1], rest: (plate) => plate.number(id), ramp, role };
}

/** Bar and cm³/rev in SI, for typical values. */
export const BAR = 1e5;
export const CUBIC_CENTIMETRE_PER_TURN = 1e-6 / (2 * Math.PI);
export const LITRE_PER_MINUTE = 1e-3 / 60;
export const TURN_PER_MINUTE = (2 * Math.PI) / 60;

/** Index of each name in its list, typed: `indices(['a', 'b']).b` is 1. Kernels read these in every pass: built in one go, because
 *  an object to which many names are added one by one becomes slow to read. */
export function indices<const N extends readonly string[]>(names: N): { readonly [K in N[number]]: number } {
  return Object.freeze(Object.fromEntries(names.map((name, index) => [name, index]))) as { readonly [K in N[number]]: number };
}

/** Severity of a fault on the nameplate, 0 where it is not entered. */
export function severity(plate: Plate, faultId: string): number {
  return plate.given(`fault.${faultId}`) ?? 0;
}
