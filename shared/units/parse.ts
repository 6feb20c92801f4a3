import { quantityOf, toSi, type UnitPreferences, unitById } from './convert.ts';
import { formatQuantity, joined } from './format.ts';
import { type Quantity, type QuantityId, quantities, type Unit } from './quantities.ts';

/** Numbers as people type them. The suffix decides the unit ("2000 psi" in a bar field). Comma and point are both decimal
 *  signs; one separator followed by exactly three digits after a non-zero first part is ambiguous and is asked back.
 *  Fractions of a turn or an inch are read (2½, 2 1/2). What was typed, up to six digits, prints back as typed. */

export interface ParsedQuantity {
  readonly ok: true;
  /** SI value. */
  readonly value: number;
  /** Number as typed and its unit, for printing back. */
  readonly typed: string;
  readonly unit: string;
}
export interface Reading {
  readonly label: string;
  readonly value: number;
  readonly typed: string;
}
export interface RefusedQuantity {
  readonly ok: false;
  readonly reason: 'empty' | 'not-a-number' | 'ambiguous' | 'unknown-unit' | 'out-of-range';
  /** What was wrong and what is allowed, in words. */
  readonly message: string;
  /** The two ways an ambiguous number can be meant. */
  readonly readings?: readonly Reading[];
  /** Nearest allowed value when out of range. */
  readonly nearest?: Reading;
}
export type ParseOutcome = ParsedQuantity | RefusedQuantity;

export interface ParseLimits {
  /** Bounds [SI], inclusive. */
  readonly min: number;
  readonly max: number;
  /** Name of the field in the message. */
  readonly label?: string;
  /** The bounds are the ends of an adjusting screw, and the sentence says so. */
  readonly screw?: boolean;
  readonly preferences?: UnitPreferences;
}

const FRACTIONS: Record<string, number> = {
  '¼': 0.25,
  '½': 0.5,
  '¾': 0.75,
  '⅛': 0.125,
  '⅜': 0.375,
  '⅝': 0.625,
  '⅞': 0.875,
  '⅓': 1 / 3,
  '⅔': 2 / 3,
};
const NUMBER =
  /^([+-]?)((?:\d|[.,](?=\d)|(?<=\d)[.,](?!\d)|(?<=\d) (?=\d{3}(?!\d)(?!\/))|(?<=\d)'(?=\d{3}(?!\d)))*)(e[+-]?\d{1,3})?(?:\s*([¼½¾⅛⅜⅝⅞⅓⅔])|[\s-]*(\d{1,3})\/(\d{1,3}))?\s*(.*)$/iu;

const FRACTION_ONLY = /^([+-]?)(\d{1,3}\/\d{1,3}(?![\d/]).*)$/;

function plain(text: string): string {
  return text
    .replace(/[\u00a0\u2000-\u200a\u202f]/g, ' ')
    .replace(/[\u2212\u2012\u2013]/g, '-')
    .replace(/[\u2019]/g, "'")
    .replace(/[\u2033\u201d]/g, '"')
    .trim()
    .replace(/ +/g, ' ');
}

type Digits = { readonly value: number } | { readonly either: readonly [number, string, number, string] } | null;

/** Reads the digits with their separators. */
function readDigits(text: string, exact: boolean): Digits {
  const body = text.replace(/[ ']/g, '');
  const separators = body.replace(/\d/g, '');
  if (separators === '') return { value: Number(body) };
  const last = separators[separators.length - 1] as string;
  if (separators.length === 1) {
    const [first = '', rest = ''] = body.split(last);
    const decimal = Number(`${first || '0'}.${rest || '0'}`);
    if (!exact && rest.length === 3 && Number(first) !== 0) {
      return {
        either: [Number(first + rest), first + rest, decimal, `${first}.${rest}`],
      };
    }
    return { value: decimal };
  }
  const groups = body.split(/[.,]/);
  const same = separators.split('').every((sign) => sign === last);
  const inner = same ? groups.slice(1) : groups.slice(1, -1);
  const first = groups[0] as string;
  if (first.length < 1 || first.length > 3 || inner.some((group) => group.length !== 3)) return null;
  if (same) return { value: Number(groups.join('')) };
  // Two kinds: the last one is the decimal sign, the others must all be the other kind.
  if (separators.slice(0, -1).includes(last)) return null;
  return {
    value: Number(`${groups.slice(0, -1).join('')}.${groups[groups.length - 1]}`),
  };
}

function suffixKey(text: string): string {
  return text.toLowerCase().replace(/\s+/g, '').replace(/²/g, '2').replace(/³/g, '3').replace(/[·*]/g, '.');
}

function findUnit(quantity: Quantity, suffix: string): Unit | undefined {
  const exact = quantity.units.find((unit) => unit.id === suffix || unit.symbol === suffix);
  if (exact) return exact;
  const key = suffixKey(suffix);
  return quantity.units.find((unit) => [unit.id, unit.symbol, ...unit.aliases].some((name) => suffixKey(name) === key));
}

function refuseUnit(suffix: string, quantity: Quantity): RefusedQuantity {
  const names = quantity.units.map((unit) => unit.symbol || 'a plain number');
  const allowed = names.length > 1 ? `${names.slice(0, -1).join(', ')} or ${names[names.length - 1]}` : (names[0] as string);
  const other = Object.values<Quantity>(quantities).find((entry) => entry.units.length > 0 && findUnit(entry, suffix) !== undefined);
  const what = other ? `"${suffix}" is a unit of ${other.label.toLowerCase()}` : `"${suffix}" is not a unit known here`;
  return {
    ok: false,
    reason: 'unknown-unit',
    message: `${what}; ${quantity.label.toLowerCase()} takes ${allowed}.`,
  };
}

/** Number as typed, at most six digits, with its unit. */
function printBack(number: string, value: number, unit: Unit): string {
  const digits = number.replace(/e.*$/i, '').replace(/\D/g, '').replace(/^0+/, '').length;
  const kept = digits > 6 || number.length > 16 ? String(Number(value.toPrecision(6))) : number;
  return joined(kept.replace(/^-/, '\u2212'), unit.symbol).replace(/\u202f/g, ' ');
}

function withinLimits(parsed: ParsedQuantity, quantity: QuantityId, unit: Unit, limits: ParseLimits | undefined): ParseOutcome {
  // An entry that prints as the bound itself is the bound: 28 cm³/rev must not fail on the last bit.
  const slack = limits ? 1e-9 * Math.max(Math.abs(limits.min), Math.abs(limits.max)) : 0;
  if (!limits || (parsed.value >= limits.min - slack && parsed.value <= limits.max + slack)) {
    return limits
      ? {
          ...parsed,
          value: Math.min(limits.max, Math.max(limits.min, parsed.value)),
        }
      : parsed;
  }
  const preferences = limits.preferences ?? { system: 'si' };
  const show = (value: number) =>
    formatQuantity(value, quantity, preferences, {
      style: 'plate',
      unit: unit.id,
    }).text;
  const bound = parsed.value < limits.min ? limits.min : limits.max;
  return {
    ok: false,
    reason: 'out-of-range',
    message: `${limits.screw ? 'The screw turns' : `${limits.label ?? quantityOf(quantity).label} lies`} between ${show(limits.min)} and ${show(limits.max)}; ${parsed.typed} cannot be set.`,
    nearest: {
      label: show(bound),
      value: bound,
      typed: show(bound).replace(/\u202f/g, ' '),
    },
  };
}

/** @param unitId unit taken when no suffix is typed
 *  @param limits range [SI] beyond which the value is refused with the nearest one offered
 *  Never throws; every refusal says what is allowed. */
export function parseQuantity(text: string, quantity: QuantityId, unitId: string, limits?: ParseLimits): ParseOutcome {
  const entry = plain(text);
  const fallback = unitById(quantity, unitId);
  const label = limits?.label ?? quantityOf(quantity).label;
  if (entry === '')
    return {
      ok: false,
      reason: 'empty',
      message: `${label} is empty; type a number, for example in ${fallback.symbol || 'digits'}.`,
    };
  // "1/4" and "3/8 in": a fraction without a whole part is read as 0 1/4.
  const match = NUMBER.exec(entry.replace(FRACTION_ONLY, '$10 $2'));
  const [, sign = '', digits = '', exponent = '', glyph = '', over = '', under = '', suffix = ''] = match ?? [];
  const bare = digits === '' && glyph === '' && over === '';
  if (!match || bare) return notANumber(label, entry);
  const read: Digits = digits === '' ? { value: 0 } : readDigits(digits, exponent !== '' || glyph !== '' || over !== '');
  if (read === null || (under !== '' && Number(under) === 0)) return notANumber(label, entry);
  const unit = suffix === '' ? fallback : findUnit(quantityOf(quantity), suffix);
  if (!unit) return /^[\d.,/+-]/.test(suffix) ? notANumber(label, entry) : refuseUnit(suffix, quantityOf(quantity));

  const negative = sign === '-' ? -1 : 1;
  if ('either' in read) {
    const [large, largeText, small, smallText] = read.either;
    const reading = (value: number, shown: string): Reading => {
      const number = (negative < 0 ? '-' : '') + shown;
      return {
        label: joined(number.replace('-', '\u2212'), unit.symbol),
        value: toSi(negative * value, unit),
        typed: printBack(number, value, unit),
      };
    };
    return {
      ok: false,
      reason: 'ambiguous',
      message: `"${entry}" can be read in two ways: ${largeText} or ${smallText}.`,
      readings: [reading(large, largeText), reading(small, smallText)],
    };
  }
  const part = glyph !== '' ? (FRACTIONS[glyph] as number) : over !== '' ? Number(over) / Number(under) : 0;
  const shown = negative * (Number(`${read.value}${exponent}`) + part);
  const value = toSi(shown, unit);
  if (!Number.isFinite(value)) return notANumber(label, entry);
  const number = suffix === '' ? entry : entry.slice(0, entry.length - suffix.length).trim();
  return withinLimits({ ok: true, value, typed: printBack(number, shown, unit), unit: unit.id }, quantity, unit, limits);
}

function notANumber(label: string, entry: string): RefusedQuantity {
  const shown = entry.length > 30 ? `${entry.slice(0, 30)}\u2026` : entry;
  return {
    ok: false,
    reason: 'not-a-number',
    message: `${label}: "${shown}" is not a number; type digits with one decimal sign, and a unit if you like.`,
  };
}

/** What was typed, ready to print: a unit written by its id or an alias is printed by its symbol ("16 cm3/rev" → "16 cm³/rev"). */
export function typedText(typed: string, quantity: QuantityId): string {
  const match = /^(.*?[\d½¼¾.,])\s*([^\d\s].*)$/u.exec(typed.trim());
  const unit = match && findUnit(quantityOf(quantity), (match[2] as string).trim());
  return unit ? joined(match[1] as string, unit.symbol).replace(/\u202f/g, ' ') : typed;
}
