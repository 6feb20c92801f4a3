import type { Phrase } from '#shared/findings/finding.ts';
import { THIN_SPACE } from '#shared/units/format.ts';
import type { QuantityId } from '#shared/units/quantities.ts';
import { explain } from '#src/stores/explain-store.ts';
import { useFormat } from './use-format.ts';

export interface QuantityTextProps {
  /** SI value. */
  readonly value: number;
  readonly quantity: QuantityId;
  readonly digits?: number;
  readonly rounding?: 'nearest' | 'down';
  readonly style?: 'reading' | 'plate' | 'figure';
}

/** Value in the reading face, unit after a thin space. */
export function QuantityText({ value, quantity, digits, rounding, style }: QuantityTextProps) {
  const shown = useFormat().quantity(value, quantity, { digits, rounding, style });
  return (
    <span className="quantity">
      <span className="reading">{shown.value}</span>
      {shown.unit && (
        <>
          {THIN_SPACE}
          <span className="unit">{shown.unit}</span>
        </>
      )}
    </span>
  );
}

export interface PhraseTextProps {
  readonly phrase: Phrase;
  /** Case whose run the figures belong to: they then open "How is this computed?". */
  readonly caseId?: string;
}

/** Words with their figures; a figure that came from somewhere opens its explanation. */
export function PhraseText({ phrase, caseId }: PhraseTextProps) {
  const parts = useFormat().parts(phrase);
  return (
    <>
      {parts.map((part, index) => {
        const key = `${index}:${part.text}`;
        if (part.type === 'words') return <span key={key}>{part.text}</span>;
        const { address } = part;
        if (!address)
          return (
            <span key={key} className="figure">
              {part.text}
            </span>
          );
        return (
          <button
            key={key}
            type="button"
            className="figure figure-open"
            title="How is this computed?"
            onClick={() => explain(address, caseId)}
          >
            {part.text}
          </button>
        );
      })}
    </>
  );
}
