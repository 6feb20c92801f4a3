import { caseLetter } from '#shared/circuit/edit/cases.ts';
import { asFoundValue } from '#shared/circuit/edit/values.ts';
import { effectiveNumber } from '#shared/circuit/effective.ts';
import { findComponent, findKind, nameInWords } from '#shared/circuit/kind-lookup.ts';
import type { CircuitCase, CircuitDocument } from '#shared/circuit/schema.ts';
import { QuantityText } from '#src/components/quantity.tsx';
import { fieldSpec } from '#src/lib/field-specs.ts';

/** Numerals printed at the screws instead of tags: address 'component.screw' → numeral. */
export function screwNumerals(document: CircuitDocument): ReadonlyMap<string, string> {
  const numerals = new Map<string, string>();
  for (const component of document.components) {
    for (const screw of findKind(component.kind)?.screws ?? []) numerals.set(`${component.id}.${screw.id}`, String(numerals.size + 1));
  }
  return numerals;
}

export interface PrintedSettingsProps {
  readonly document: CircuitDocument;
  readonly shown: readonly CircuitCase[];
  readonly numerals: ReadonlyMap<string, string>;
}

/** What each numeral on the printed drawing stands at, as found and in the cases shown. */
export function PrintedSettings({ document, shown, numerals }: PrintedSettingsProps) {
  if (numerals.size === 0) return null;
  return (
    <table className="table">
      <caption>Settings</caption>
      <thead>
        <tr>
          <th scope="col">No.</th>
          <th scope="col">Screw</th>
          <th scope="col" className="number">
            As found
          </th>
          {shown.map((entry) => (
            <th key={entry.id} scope="col" className="number">
              {caseLetter(entry)}
            </th>
          ))}
        </tr>
      </thead>
      <tbody>
        {[...numerals].map(([address, numeral]) => {
          const [target = '', field = ''] = address.split('.');
          const component = findComponent(document, target);
          const spec = fieldSpec(document, target, field);
          if (!component || spec?.type !== 'number') return null;
          const found = asFoundValue(document, target, field);
          return (
            <tr key={address}>
              <td>{numeral}</td>
              <th scope="row">
                {spec.label}, {nameInWords(component)}
              </th>
              <td className="number">{found !== null && <QuantityText value={found} quantity={spec.quantity} style="plate" />}</td>
              {shown.map((entry) => {
                const value = effectiveNumber(document, entry.id, target, field);
                return (
                  <td key={entry.id} className="number">
                    {value !== null && <QuantityText value={value} quantity={spec.quantity} style="plate" />}
                  </td>
                );
              })}
            </tr>
          );
        })}
      </tbody>
    </table>
  );
}
