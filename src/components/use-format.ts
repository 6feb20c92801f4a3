import { useMemo } from 'react';
import type { Figure, Phrase } from '#shared/findings/finding.ts';
import type { UnitPreferences } from '#shared/units/convert.ts';
import {
  type FormatOptions,
  type FormattedQuantity,
  formatNumber,
  formatPhrase,
  formatQuantity,
  type PhrasePart,
  phraseParts,
} from '#shared/units/format.ts';
import type { QuantityId } from '#shared/units/quantities.ts';
import { tradeWords } from '#shared/units/trade-words.ts';
import { usePreferences } from '#src/stores/preferences-store.ts';

export interface Format {
  readonly preferences: UnitPreferences;
  readonly quantity: (value: number, quantity: QuantityId, options?: FormatOptions) => FormattedQuantity;
  readonly figure: (figure: Figure) => FormattedQuantity;
  readonly number: (value: number, digits: number, rounding?: 'nearest' | 'down') => string;
  readonly phrase: (phrase: Phrase) => string;
  readonly parts: (phrase: Phrase) => PhrasePart[];
  /** Plain text in the words of the person's trade. */
  readonly words: (text: string) => string;
}

/** Numbers in the person's units and decimal sign. */
export function useFormat(): Format {
  const system = usePreferences((state) => state.system);
  const overrides = usePreferences((state) => state.overrides);
  const decimal = usePreferences((state) => state.decimal);
  return useMemo(() => {
    const preferences: UnitPreferences = { system, overrides, decimal };
    return {
      preferences,
      quantity: (value, quantity, options) => formatQuantity(value, quantity, preferences, options),
      figure: ({ value, quantity, digits, rounding }) =>
        formatQuantity(value, quantity, preferences, { style: 'figure', digits, rounding }),
      number: (value, digits, rounding) => formatNumber(value, digits, preferences, rounding),
      phrase: (phrase) => formatPhrase(phrase, preferences),
      parts: (phrase) => phraseParts(phrase, preferences),
      words: (text) => tradeWords(text, system),
    };
  }, [system, overrides, decimal]);
}
