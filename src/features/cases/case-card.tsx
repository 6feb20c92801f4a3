import { type CSSProperties, useState } from 'react';
import { caseLetter, renameCase } from '#shared/circuit/edit/cases.ts';
import type { CircuitCase } from '#shared/circuit/schema.ts';
import { CaseDash, CaseLetter } from '#src/components/case-letter.tsx';
import { LoadSparkline } from '#src/components/charts/load-sparkline.tsx';
import { LazyMenu } from '#src/components/lazy-menu.tsx';
import { MiddleEllipsis } from '#src/components/middle-ellipsis.tsx';
import { VerdictChip } from '#src/components/verdict.tsx';
import { useDocument } from '#src/stores/document-store.ts';
import { useRuns } from '#src/stores/run-store.ts';
import { caseActions } from './case-actions.ts';

export interface CaseCardProps {
  readonly entry: CircuitCase;
  readonly place: 'drawing' | 'overlaid' | 'aside';
  readonly form: 'cards' | 'phone';
  /** How many cases are on the screen: with three or more the trace's dash stands instead of the sparkline. */
  readonly shown: number;
}

/** One case: pen square, name, where it is shown, its motor load in small, its verdict. Pressing it puts it on the drawing. */
export function CaseCard({ entry, place, form, shown }: CaseCardProps) {
  const run = useRuns((state) => state.byCase[entry.id]);
  const due = useRuns((state) => state.due[entry.id] === true);
  const [renaming, setRenaming] = useState(false);
  const letter = caseLetter(entry);
  const active = place === 'drawing';
  const state = run?.state === 'done' ? (due || run.stale ? 'stale' : 'done') : (run?.state ?? 'waiting');
  const chip = (
    <VerdictChip verdict={run?.assessment?.verdict ?? null} state={state} short={form === 'phone'} bare={form === 'phone' && !active} />
  );

  function finish(name: string) {
    setRenaming(false);
    useDocument.getState().edit((document) => renameCase(document, entry.id, name));
  }

  return (
    <div
      className="case-card"
      data-active={active || undefined}
      data-case={letter}
      style={{ '--case-ink': `var(--case-${entry.ink})` } as CSSProperties}
    >
      <button
        type="button"
        className="case-open"
        aria-pressed={active}
        aria-label={`Case ${letter}, ${entry.name}: ${active ? 'on the drawing' : 'put on the drawing'}`}
        onClick={() => useDocument.getState().setActiveCase(entry.id)}
        onDoubleClick={() => setRenaming(true)}
        onKeyDown={(event) => {
          if (event.key === 'F2') setRenaming(true);
        }}
      />
      <div className="case-head">
        <CaseLetter letter={letter} ink={entry.ink} />
        {renaming ? (
          <input
            className="field case-name"
            aria-label={`Name of case ${letter}`}
            defaultValue={entry.name}
            maxLength={60}
            // biome-ignore lint/a11y/noAutofocus: the person has just asked to rename
            autoFocus
            onFocus={(event) => event.target.select()}
            onBlur={(event) => finish(event.target.value)}
            onKeyDown={(event) => {
              if (event.key === 'Enter') finish(event.currentTarget.value);
              if (event.key === 'Escape') setRenaming(false);
            }}
          />
        ) : (
          (form === 'cards' || active) && (
            <span className="case-name">
              <MiddleEllipsis text={entry.name} most={active ? 14 : 18} />
            </span>
          )
        )}
        {form === 'phone' && chip}
        {form === 'cards' && !renaming && !active && <OverlayWord entry={entry} overlaid={place === 'overlaid'} />}
        {active && !renaming && (
          <LazyMenu
            label={form === 'cards' ? 'on the drawing' : `Case ${letter}`}
            face={form === 'phone' ? 'more' : undefined}
            chevron
            className={form === 'cards' ? 'case-state case-menu' : 'button-icon'}
            entries={caseActions(entry, () => setRenaming(true))}
          />
        )}
      </div>
      {form === 'cards' && (
        <div className="case-foot">
          {shown >= 3 ? (
            <CaseDash ink={entry.ink} />
          ) : (
            <span className="case-sparkline">
              {run?.run && run.assessment && (
                <LoadSparkline run={run.run} yardsticks={run.assessment.yardsticks} ink={entry.ink} stale={run.stale} />
              )}
            </span>
          )}
          {chip}
        </div>
      )}
    </div>
  );
}

function OverlayWord({ entry, overlaid }: { readonly entry: CircuitCase; readonly overlaid: boolean }) {
  return (
    <button
      type="button"
      className="case-state case-overlay"
      aria-pressed={overlaid}
      aria-label={`${overlaid ? 'overlaid' : 'overlay'}: case ${caseLetter(entry)}`}
      onClick={() => useDocument.getState().toggleOverlay(entry.id)}
    >
      {overlaid ? 'overlaid' : 'overlay'}
    </button>
  );
}
