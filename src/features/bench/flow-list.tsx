import { memo, useEffect, useMemo, useRef, useState } from 'react';
import { formatTurns } from '#shared/units/format.ts';
import { Icon } from '#src/components/icons.tsx';
import { followMoment, presentMoment, useMoment } from '#src/components/schematic/moment.ts';
import { SymbolIcon } from '#src/components/schematic/symbol-icon.tsx';
import { useFormat } from '#src/components/use-format.ts';
import { useDocument } from '#src/stores/document-store.ts';
import { type FlowRow, flowRows, rowWords } from './flow-rows.ts';
import { tagSpecs } from './tag-specs.ts';
import { tagState } from './tag-state.ts';
import { tagValue } from './tag-words.ts';
import type { BenchLayout } from './use-bench-layout.ts';

export interface FlowListProps {
  readonly tags: BenchLayout['screws'];
  /** Only its head is shown while the turn wheel has the room; pressing it lays the screw down. */
  readonly folded: boolean;
  readonly onOpen: (id: string) => void;
}

/** All parts in flow order with live readings; pressing a row takes its screw in hand. */
export function FlowList({ tags, folded, onOpen }: FlowListProps) {
  const document = useDocument((state) => state.document);
  const inHand = useDocument((state) => state.inHand);
  const format = useFormat();
  const [wanted, setOpen] = useState(true);
  const open = wanted && !folded;
  const when = useRef<HTMLSpanElement>(null);
  const rows = useMemo(() => flowRows(document), [document]);
  useMoment(({ time }) => {
    if (when.current) when.current.textContent = format.quantity(time, 'time', { digits: 2 }).text;
  });
  return (
    <div className="flow-list" data-open={open || undefined}>
      <button
        type="button"
        className="flow-list-head"
        aria-expanded={open}
        onClick={() => {
          if (folded) useDocument.getState().takeInHand(null);
          setOpen(!open);
        }}
      >
        <span>
          {rows.length} {rows.length === 1 ? 'part' : 'parts'} in flow order, at <span ref={when} />
        </span>
        <Icon name="chevron" />
      </button>
      {open && (
        <ul>
          {rows.map((row) => {
            const own = tags.filter(({ spec }) => spec.component === row.component.id);
            const held = own.find(({ spec }) => spec.address === inHand);
            const first = own.find(({ spec }) => spec.field === 'maxVolumeStop') ?? own[0];
            return (
              <li key={row.component.id} data-in-hand={held ? true : undefined}>
                <button
                  type="button"
                  className="flow-row"
                  onClick={() => (first && !held ? useDocument.getState().takeInHand(first.spec.address) : onOpen(row.component.id))}
                >
                  <SymbolIcon kind={row.component.kind} width={48} height={40} />
                  {held ? (
                    <>
                      <span className="flow-row-words">
                        <strong>{`${row.title}, ${held.spec.label.toLowerCase()}`}</strong>
                        <span>in hand{held.spec.screw ? `, ${formatTurns(held.state.turns)}` : ''}</span>
                      </span>
                      <span className="flow-row-value">
                        <span className="reading">{tagValue(held.spec, held.state, format).value}</span>
                        <span className="unit">{tagValue(held.spec, held.state, format).unit}</span>
                      </span>
                    </>
                  ) : (
                    <LiveRow row={row} />
                  )}
                </button>
                {held && own.length > 1 && (
                  <div className="flow-row-screws">
                    {own.map(({ spec }) => (
                      <button
                        key={spec.address}
                        type="button"
                        className="button button-small"
                        aria-pressed={spec.address === inHand}
                        onClick={() => useDocument.getState().takeInHand(spec.address)}
                      >
                        {spec.label}
                      </button>
                    ))}
                  </div>
                )}
              </li>
            );
          })}
        </ul>
      )}
    </div>
  );
}

const LiveRow = memo(function LiveRow({ row }: { readonly row: FlowRow }) {
  const format = useFormat();
  const note = useRef<HTMLSpanElement>(null);
  const value = useRef<HTMLSpanElement>(null);
  const unit = useRef<HTMLSpanElement>(null);
  useMoment((moment) => {
    const words = rowWords(row, moment, format);
    if (note.current) note.current.textContent = words.note;
    if (value.current) value.current.textContent = words.value;
    if (unit.current) unit.current.textContent = words.unit;
  });
  return (
    <>
      <span className="flow-row-words">
        <strong>{row.title}</strong>
        <span ref={note} />
      </span>
      <span className="flow-row-value">
        <span ref={value} className="reading" />
        <span ref={unit} className="unit" />
      </span>
    </>
  );
});

/** The drawing for those who hear it: the same list as plain words, renewed once the cursor and the screws have rested. */
export function SpokenList() {
  const format = useFormat();
  const [moment, setMoment] = useState(presentMoment);
  useEffect(() => {
    let timer: ReturnType<typeof setTimeout> | undefined;
    const later = () => {
      clearTimeout(timer);
      timer = setTimeout(() => setMoment({ ...presentMoment() }), 300);
    };
    const stops = [followMoment(later), useDocument.subscribe(later)];
    return () => {
      clearTimeout(timer);
      for (const stop of stops) stop();
    };
  }, []);
  const { document, activeCase } = useDocument.getState();
  const specs = tagSpecs(document);
  return (
    <ul className="visually-hidden" aria-label={`Parts in flow order at ${format.quantity(moment.time, 'time', { digits: 2 }).text}`}>
      {flowRows(document).map((row) => {
        const { value, unit, note } = rowWords(row, moment, format);
        const screws = specs.flatMap((spec) => {
          const state = spec.component === row.component.id ? tagState(document, activeCase, spec) : null;
          return state ? [`${spec.label} ${tagValue(spec, state, format).text}`] : [];
        });
        return (
          <li key={row.component.id}>{[row.title, `${value} ${unit}`.trim(), note, ...screws].filter((part) => part !== '').join(', ')}</li>
        );
      })}
    </ul>
  );
}
