import { Suspense, useEffect } from 'react';
import type { CircuitDocument } from '#shared/circuit/schema.ts';
import { tracesToCsv } from '#shared/pictures/traces-csv.ts';
import { later } from '#src/components/later.ts';
import { useFormat } from '#src/components/use-format.ts';
import { fileName, saveFile } from '#src/lib/save-file.ts';
import { useLaneChoice } from './lane-store.ts';
import { tapeSvg } from './tape-export.ts';
import type { TapeModel } from './tape-model.ts';

const LaneMenu = later(async () => (await import('./tape-menus.tsx')).LaneMenu);

/** Which sheet of the tape is open. */
export type TapeSheet = 'lanes' | 'table' | 'save' | 'flag' | null;

export interface TapeFootProps {
  readonly document: CircuitDocument;
  readonly model: TapeModel;
  readonly sheet: TapeSheet;
  readonly onSheet: (sheet: TapeSheet) => void;
  readonly room: number;
  /** Two buttons only; saving is in the sheet of lanes. */
  readonly isNarrow: boolean;
}

/** Buttons under the readings: choose lanes, show the table, save traces. */
export function TapeFoot({ document, model, sheet, onSheet, room, isNarrow }: TapeFootProps) {
  const setChosen = useLaneChoice((state) => state.setChosen);
  const { preferences } = useFormat();
  const run = model.cases[model.activeIndex]?.run ?? null;
  const runs = model.cases.flatMap((entry) => (entry.run ? [{ letter: entry.pen.letter, name: entry.name, run: entry.run }] : []));
  const toggle = (wanted: TapeSheet) => onSheet(sheet === wanted ? null : wanted);
  useEffect(() => {
    if (sheet === null || sheet === 'table') return;
    const away = (event: PointerEvent) => {
      if (!(event.target as HTMLElement).closest('.tape-sheet, .tape-foot, .tape-add')) onSheet(null);
    };
    const leave = (event: KeyboardEvent) => event.key === 'Escape' && onSheet(null);
    window.addEventListener('pointerdown', away);
    window.addEventListener('keydown', leave);
    return () => {
      window.removeEventListener('pointerdown', away);
      window.removeEventListener('keydown', leave);
    };
  }, [sheet, onSheet]);
  const saving = (
    <>
      <button
        type="button"
        className="tape-menu-item"
        disabled={runs.length === 0}
        onClick={() => {
          saveFile(fileName(document.title, 'csv'), tracesToCsv(runs, preferences), 'text/csv;charset=utf-8');
          onSheet(null);
        }}
      >
        Traces as CSV
      </button>
      <button
        type="button"
        className="tape-menu-item"
        disabled={runs.length === 0}
        onClick={() => {
          saveFile(fileName(`${document.title} tape`, 'svg'), tapeSvg(document, model, preferences), 'image/svg+xml');
          onSheet(null);
        }}
      >
        Tape as SVG
      </button>
    </>
  );
  return (
    <>
      <div className="tape-foot">
        <button type="button" aria-expanded={sheet === 'lanes'} onClick={() => toggle('lanes')}>
          Lanes
        </button>
        <button type="button" aria-pressed={sheet === 'table'} onClick={() => toggle('table')}>
          Table
        </button>
        {!isNarrow && (
          <button type="button" aria-expanded={sheet === 'save'} onClick={() => toggle('save')}>
            Save
          </button>
        )}
      </div>
      {sheet === 'lanes' && (
        <section className="tape-sheet" aria-label="Lanes">
          <Suspense fallback={null}>
            <LaneMenu document={document} run={run} shown={model.lanes.map((lane) => lane.lane.address)} most={room} onChoose={setChosen} />
          </Suspense>
          {isNarrow && saving}
        </section>
      )}
      {sheet === 'save' && (
        <section className="tape-sheet" aria-label="Save">
          {saving}
        </section>
      )}
    </>
  );
}
