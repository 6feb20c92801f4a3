import { documentValue } from '#shared/circuit/effective.ts';
import type { CaseChange, CircuitDocument } from '#shared/circuit/schema.ts';
import { useFormat } from '#src/components/use-format.ts';
import { fieldSpec, targetWord } from '#src/lib/field-specs.ts';

/** One change of a case in words: "Max. vol. stop, Pump P1: 28 cm³/rev, here 16 cm³/rev". */
export function ChangeWords({ document, change }: { readonly document: CircuitDocument; readonly change: CaseChange }) {
  const format = useFormat();
  const spec = fieldSpec(document, change.target, change.field);
  const word = (value: number | string | null | undefined) => {
    if (value === null || value === undefined) return 'not given';
    if (spec?.type === 'number' && typeof value === 'number') return format.quantity(value, spec.quantity, { style: 'plate' }).text;
    if (spec?.type === 'choice') return spec.choices.find((choice) => choice.value === String(value))?.label ?? String(value);
    return String(value);
  };
  return (
    <>
      {spec?.label ?? change.field}, {targetWord(document, change.target)}: as found{' '}
      <span className="figure">{word(documentValue(document, change.target, change.field))}</span>, here{' '}
      <span className="figure">{change.typed ?? word(change.value)}</span>
    </>
  );
}
