import { useEffect, useRef } from 'react';
import { addCase, caseLetter } from '#shared/circuit/edit/cases.ts';
import { Icon } from '#src/components/icons.tsx';
import { takeCase } from '#src/stores/apply-value.ts';
import { useDocument } from '#src/stores/document-store.ts';
import { CaseCard } from './case-card.tsx';

export interface CaseRowProps {
  readonly form: 'cards' | 'phone';
}

/** Cards of all cases in their order; A is always as found. The last card makes a new case from the one on the drawing. */
export function CaseRow({ form }: CaseRowProps) {
  const cases = useDocument((state) => state.document.cases);
  const activeCase = useDocument((state) => state.activeCase);
  const overlays = useDocument((state) => state.overlays);
  const active = cases.find((entry) => entry.id === activeCase);
  const full = cases.length >= 10;
  const row = useRef<HTMLElement>(null);
  // biome-ignore lint/correctness/useExhaustiveDependencies: another case on the drawing is brought into view
  useEffect(() => {
    const card = row.current?.querySelector<HTMLElement>('[data-active]');
    if (row.current && card && row.current.scrollWidth > row.current.clientWidth) row.current.scrollLeft = card.offsetLeft - 84;
  }, [activeCase]);
  return (
    <nav ref={row} className={`case-row case-row-${form}`} aria-label="Cases" data-many={cases.length >= 4 || undefined}>
      {cases.map((entry) => (
        <CaseCard
          key={entry.id}
          entry={entry}
          place={entry.id === activeCase ? 'drawing' : overlays.includes(entry.id) ? 'overlaid' : 'aside'}
          form={form}
          shown={overlays.length + 1}
        />
      ))}
      {active && (
        <button
          type="button"
          className="case-new"
          disabled={full}
          title={full ? 'Ten cases at most' : undefined}
          onClick={() => {
            const { document, activeCase: from } = useDocument.getState();
            takeCase(addCase(document, from));
          }}
        >
          <Icon name="plus" size={18} />
          {form === 'phone' ? (
            <span className="visually-hidden">New case from {caseLetter(active)}</span>
          ) : (
            <span>New case from {caseLetter(active)}</span>
          )}
        </button>
      )}
    </nav>
  );
}
