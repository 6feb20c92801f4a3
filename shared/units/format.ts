import { fromSi, preferredUnit, type UnitPreferences, unitById } from './convert.ts';
import type { QuantityId, Unit } from './quantities.ts';
import { tradeWords } from './trade-words.ts';

/** Numbers as people read them: B612 value, thin space, unit; true minus sign; the person's decimal sign; five and more
 *  digits grouped by thin spaces. Loads round to nearest, margins round down (towards minus infinity). */

export const THIN_SPACE = '\u202f';
const MINUS = '\u2212';

export interface FormatOptions {
  /** Digits after the decimal sign; without it those of the unit. */
  readonly digits?: number;
  readonly rounding?: 'nearest' | 'down';
  /** 'reading' (default): fixed decimals, so that a moving number does not jump about.
   *  'plate': as many as four significant digits need, no trailing zeros.
   *  'figure': like a reading, but a small value keeps two significant digits. */
  readonly style?: 'reading' | 'plate' | 'figure';
  /** Show in this unit instead of the preferred one. */
  readonly unit?: string;
}

export interface FormattedQuantity {
  readonly value: string;
  /** Printed symbol; '' for plain numbers. */
  readonly unit: string;
  /** Value, thin space and unit in one string. */
  readonly text: string;
}

/** A number inside a sentence (the shape of `Figure` in shared/findings). */
export interface PhraseFigure {
  readonly value: number;
  readonly quantity: QuantityId;
  readonly rounding?: 'nearest' | 'down';
  readonly digits?: number;
  readonly address?: string;
}
export type PhrasePart =
  | { readonly type: 'words'; readonly text: string }
  | {
      readonly type: 'figure';
      readonly value: string;
      readonly unit: string;
      readonly text: string;
      readonly address?: string;
    };

function roundedText(value: number, digits: number, rounding: 'nearest' | 'down'): string {
  if (rounding === 'nearest') return value.toFixed(digits);
  const scale = 10 ** digits;
  // A margin of exactly 1.40 may be stored as 1.3999999999: forgive the last bits, never a visible amount.
  return (Math.floor(value * scale + 1e-9 * Math.max(1, Math.abs(value * scale))) / scale).toFixed(digits);
}

function digitsFor(value: number, unit: Unit, options: FormatOptions): number {
  if (options.digits !== undefined) return Math.min(12, Math.max(0, options.digits));
  const size = Math.abs(value);
  if (size === 0 || !Number.isFinite(size)) return unit.decimals;
  const magnitude = Math.floor(Math.log10(size));
  if (options.style === 'plate') return Math.min(12, Math.max(0, 3 - magnitude));
  if (options.style === 'figure' && 1 - magnitude > unit.decimals) return Math.min(12, 1 - magnitude);
  return unit.decimals;
}

function trimZeros(text: string, keep: number): string {
  const point = text.indexOf('.');
  if (point < 0) return text;
  let end = text.length;
  while (end > point + 1 + keep && text[end - 1] === '0') end -= 1;
  return text.slice(0, end === point + 1 ? point : end);
}

function dressed(text: string, decimal: '.' | ','): string {
  const negative = text.startsWith('-') && /[1-9]/.test(text);
  const [whole = '', fraction] = text.replace('-', '').split('.');
  const grouped = whole.length > 4 ? whole.replace(/\B(?=(\d{3})+$)/g, THIN_SPACE) : whole;
  return (negative ? MINUS : '') + grouped + (fraction ? decimal + fraction : '');
}

/** A plain number with the person's decimal sign, true minus and grouping. Non-finite values give a dash. */
export function formatNumber(
  value: number,
  digits: number,
  preferences: UnitPreferences,
  rounding: 'nearest' | 'down' = 'nearest',
): string {
  if (!Number.isFinite(value)) return '\u2013';
  if (Math.abs(value) >= 1e15) return value.toExponential(3).replace('e+', 'e').replace('-', MINUS);
  return dressed(roundedText(value, digits, rounding), preferences.decimal ?? '.');
}

/** @param value SI value
 *  @returns value and unit ready to print; a non-finite value gives a dash without a unit. */
export function formatQuantity(
  value: number,
  quantity: QuantityId,
  preferences: UnitPreferences,
  options: FormatOptions = {},
): FormattedQuantity {
  const unit = options.unit ? unitById(quantity, options.unit) : preferredUnit(quantity, preferences);
  if (!Number.isFinite(value)) return { value: '\u2013', unit: '', text: '\u2013' };
  const shown = fromSi(value, unit);
  const size = Math.abs(shown);
  let number: string;
  if (size >= 1e9 || (options.style === 'plate' && size > 0 && size < 1e-4)) {
    const [mantissa = '', exponent = '0'] = shown.toExponential(3).split('e');
    number = `${dressed(trimZeros(mantissa, 0), preferences.decimal ?? '.')}e${Number(exponent)}`;
  } else {
    const digits = digitsFor(shown, unit, options);
    const rounded = roundedText(shown, digits, options.rounding ?? 'nearest');
    const style = options.style ?? 'reading';
    const trimmed =
      options.digits !== undefined || style === 'reading'
        ? rounded
        : trimZeros(rounded, style === 'figure' ? Math.min(digits, unit.decimals) : 0);
    number = dressed(trimmed, preferences.decimal ?? '.');
  }
  return {
    value: number,
    unit: unit.symbol,
    text: joined(number, unit.symbol),
  };
}

/** A thin space before the unit, none before degrees of angle. */
export function joined(value: string, symbol: string): string {
  if (symbol === '') return value;
  return symbol === '\u00b0' ? value + symbol : value + THIN_SPACE + symbol;
}

export function phraseParts(phrase: readonly (string | PhraseFigure)[], preferences: UnitPreferences): PhrasePart[] {
  return phrase.map((part) => {
    if (typeof part === 'string') return { type: 'words', text: tradeWords(part, preferences.system) };
    const { value, unit, text } = formatQuantity(part.value, part.quantity, preferences, {
      style: 'figure',
      digits: part.digits,
      rounding: part.rounding,
    });
    return { type: 'figure', value, unit, text, address: part.address };
  });
}

/** A phrase of words and figures as one string. */
export function formatPhrase(phrase: readonly (string | PhraseFigure)[], preferences: UnitPreferences): string {
  return phraseParts(phrase, preferences)
    .map((part) => part.text)
    .join('');
}

const QUARTERS = ['', '\u00bc', '\u00bd', '\u00be'];

/** Turns in quarters: 2.5 → "2½". Positive and negative alike; the sign is said in words ("turns in"). */
export function formatQuarters(turns: number): string {
  const quarters = Math.round(Math.abs(turns) * 4);
  const whole = Math.floor(quarters / 4);
  const part = QUARTERS[quarters % 4] as string;
  return whole === 0 && part !== '' ? part : `${whole}${part}`;
}

/** "2½ turns in", "¾ turn out", "as found".
 *  @param turns turned in since as found; negative = out. */
export function formatTurns(turns: number): string {
  const quarters = Math.round(Math.abs(turns) * 4);
  if (quarters === 0) return 'as found';
  return `${formatQuarters(turns)} ${quarters <= 4 ? 'turn' : 'turns'} ${turns > 0 ? 'in' : 'out'}`;
}
