import { useState } from 'react';
import { useDocument } from '#src/stores/document-store.ts';
import { PlateRow } from './plate-row.tsx';
import { type PlateValue, plateValue } from './plate-value.ts';

export interface PlateTableProps {
  readonly caption: string;
  readonly target: string;
  readonly fields: readonly string[];
  /** Folded until asked for; `note` says what is in it. */
  readonly folded?: boolean;
  /** The column heads are shown once, on the first table of a plate. */
  readonly heads?: boolean;
}

export function usePlateValues(target: string, fields: readonly string[]): readonly PlateValue[] {
  const document = useDocument((state) => state.document);
  const activeCase = useDocument((state) => state.activeCase);
  return fields.map((field) => plateValue(document, activeCase, target, field)).filter((row) => row !== null);
}

/** Rows of a plate under one caption. */
export function PlateTable({ caption, target, fields, folded = false, heads = false }: PlateTableProps) {
  const rows = usePlateValues(target, fields);
  const [open, setOpen] = useState(!folded);
  if (rows.length === 0) return null;
  const given = rows.filter((row) => row.source !== 'typical' || row.changed).length;
  return (
    <section className="plate-section">
      {folded && (
        <button type="button" className="plate-fold" aria-expanded={open} onClick={() => setOpen(!open)}>
          {caption}
          <span className="source-note">
            {rows.length} values, {given === 0 ? 'none entered' : `${given} entered`}
          </span>
        </button>
      )}
      {open && (
        <table className="plate-table">
          <caption className={heads || folded ? 'visually-hidden' : 'plate-caption'}>{caption}</caption>
          <thead className={heads ? undefined : 'visually-hidden'}>
            <tr>
              <th scope="col">{heads ? caption : 'Name'}</th>
              <th scope="col">Value</th>
              <th scope="col">Also</th>
              <th scope="col">Where it comes from</th>
            </tr>
          </thead>
          <tbody>
            {rows.map((row) => (
              <PlateRow key={`${row.target}.${row.field}`} row={row} />
            ))}
          </tbody>
        </table>
      )}
    </section>
  );
}
