import { useFormat } from '#src/components/use-format.ts';
import type { PlateValue } from './plate-value.ts';

/** Where a value comes from, told by its frame: typed solid fill, part solid frame, fit dashed with its spread, typical dotted
 *  with its range. */
export function SourceFrame({ row }: { readonly row: PlateValue }) {
  const format = useFormat();
  if (row.value === null && row.source === 'typical') return <span className="source-note">nobody has entered it</span>;
  const { spec } = row;
  let note = '';
  if (row.changed) note = 'in this case';
  else if (row.source === 'fit' && row.spread !== undefined)
    note = `\u00b1 ${format.quantity(row.spread, 'fraction', { style: 'plate' }).text}`;
  else if (row.source === 'typical' && spec.type === 'number' && spec.typicalRange) {
    const [low, high] = spec.typicalRange;
    note = `${format.quantity(low, spec.quantity, { style: 'plate' }).value} to ${format.quantity(high, spec.quantity, { style: 'plate' }).text}`;
  }
  return (
    <>
      <span className={`source source-${row.source}`}>{row.source}</span>
      {note !== '' && <span className="source-note">{note}</span>}
    </>
  );
}
