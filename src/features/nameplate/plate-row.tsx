import { type ReactNode, useState } from 'react';
import { otherUnit, preferredUnit } from '#shared/units/convert.ts';
import { typedText } from '#shared/units/parse.ts';
import type { QuantityId } from '#shared/units/quantities.ts';
import { type FieldRefusal, QuantityField } from '#src/components/quantity-field.tsx';
import { useFormat } from '#src/components/use-format.ts';
import { VerdictMark } from '#src/components/verdict.tsx';
import { applyValue } from '#src/stores/apply-value.ts';
import { explain } from '#src/stores/explain-store.ts';
import type { PlateValue } from './plate-value.ts';
import { SourceFrame } from './source-frame.tsx';

/** One value of a plate: name, value as typed, the same in the other system, and where it comes from. */
export function PlateRow({ row }: { readonly row: PlateValue }) {
  const { spec } = row;
  const { words } = useFormat();
  const [slot, setSlot] = useState<HTMLTableCellElement | null>(null);
  return (
    <>
      <tr className="plate-row" data-field={row.field} data-changed={row.changed || undefined}>
        <th scope="row">
          <button
            type="button"
            className="plate-name"
            title={`${spec.help} How is this computed?`}
            onClick={() => explain(`plate:${row.target}.${row.field}`)}
          >
            {words(spec.label)}
          </button>
        </th>
        <td className="plate-value">
          {spec.type === 'choice' ? (
            <select
              className="select plate-select"
              aria-label={spec.label}
              value={String(row.value ?? spec.initial)}
              onChange={(event) => applyValue(row.target, row.field, row.numericChoice ? Number(event.target.value) : event.target.value)}
            >
              {spec.choices.map((choice) => (
                <option key={choice.value} value={choice.value}>
                  {choice.label}
                </option>
              ))}
            </select>
          ) : (
            <QuantityField
              label={spec.label}
              hideLabel
              value={typeof row.value === 'number' ? row.value : null}
              typed={row.typed}
              quantity={spec.quantity}
              limits={{ min: row.min, max: row.max, label: spec.label, screw: row.screw }}
              placeholder="not given"
              onCommit={(value, typed): FieldRefusal | undefined => applyValue(row.target, row.field, value, typed)}
              onClear={row.onClear}
              refusalSlot={slot}
            />
          )}
        </td>
        <td className="plate-also">{spec.type === 'number' && <Also row={row} quantity={spec.quantity} />}</td>
        <td className="plate-source">
          <SourceFrame row={row} />
        </td>
      </tr>
      <tr className="plate-refusal">
        <td colSpan={4} ref={setSlot} />
      </tr>
      {row.above && (
        <tr className="plate-above">
          <td colSpan={4}>
            <div className="above-rating">
              <VerdictMark verdict="above-rating" size={18} />
              <span>
                <strong>Above rating.</strong> Runs as a trial, is never recommended.
              </span>
              <BackTo row={row} />
            </div>
          </td>
        </tr>
      )}
    </>
  );
}

/** The same value in the other system, and what the case found. */
function Also({ row, quantity }: { readonly row: PlateValue; readonly quantity: QuantityId }): ReactNode {
  const format = useFormat();
  if (typeof row.value !== 'number') return null;
  const parts: string[] = [];
  const other = otherUnit(quantity, preferredUnit(quantity, format.preferences));
  const shown = format.quantity(row.value, quantity, { style: 'plate' }).text;
  if (row.typed && typedText(row.typed, quantity).replace(/\s/g, '') !== shown.replace(/\s/g, '')) parts.push(shown);
  else if (other) parts.push(format.quantity(row.value, quantity, { style: 'plate', unit: other.id }).text);
  if (row.changed && typeof row.found === 'number') parts.push(`as found ${format.quantity(row.found, quantity, { style: 'plate' }).text}`);
  return parts.join(', ');
}

function BackTo({ row }: { readonly row: PlateValue }) {
  const format = useFormat();
  if (!row.above || row.spec.type !== 'number') return null;
  const { rating } = row.above;
  const { text } = format.quantity(rating, row.spec.quantity, { style: 'plate' });
  return (
    <button type="button" className="button button-small" onClick={() => applyValue(row.target, row.field, rating)}>
      Back to {text}
    </button>
  );
}
