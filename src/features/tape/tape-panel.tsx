import { Suspense, useCallback, useMemo, useRef, useState } from 'react';
import { addCommand, moveCommand, removeCommand } from '#shared/circuit/edit/duty.ts';
import { commandWords, shortWords } from '#shared/duty/command-words.ts';
import { kindOf } from '#shared/kinds/registry.ts';
import { tapeBand } from '#shared/pictures/tape-band.ts';
import { pinsOf } from '#shared/pictures/tape-pins.ts';
import { later } from '#src/components/later.ts';
import { useFormat } from '#src/components/use-format.ts';
import { useLayout } from '#src/lib/layout.ts';
import { useSize } from '#src/lib/use-size.ts';
import { useCursor } from '#src/stores/cursor-store.ts';
import { useDocument } from '#src/stores/document-store.ts';
import { EventTable } from './event-table.tsx';
import { useLaneChoice } from './lane-store.ts';
import { RunControls } from './run-controls.tsx';
import { TapeAxis } from './tape-axis.tsx';
import { TapeFlags } from './tape-flags.tsx';
import { TapeFoot, type TapeSheet } from './tape-foot.tsx';
import { timeScale, type Vertical } from './tape-geometry.ts';
import { planTape, tapeMeasures } from './tape-layout.ts';
import { TapeMarks } from './tape-marks.tsx';
import { showIn } from './tape-model.ts';
import { TapePlot } from './tape-plot.tsx';
import { usePlayback } from './use-playback.ts';
import { useTape } from './use-tape.ts';
import { useTapeKeys } from './use-tape-keys.ts';
import './tape.css';
import './tape-band.css';
import './tape-lanes.css';
import './tape-sheets.css';

const AddFlagMenu = later(async () => (await import('./tape-menus.tsx')).AddFlagMenu);
const FlagEditor = later(async () => (await import('./flag-editor.tsx')).FlagEditor);

/** Gives the focus back to a flag once its sheet is gone. */
function focusFlag(id: string) {
  requestAnimationFrame(() => window.document.querySelector<HTMLElement>(`[data-command="${id}"]`)?.focus());
}

/** The former list as long as nothing in it changes, so that the canvas is not drawn for nothing. */
function useSteady(list: readonly Vertical[]): readonly Vertical[] {
  const kept = useRef(list);
  const same =
    kept.current.length === list.length && list.every(({ time, ink }, k) => kept.current[k]?.time === time && kept.current[k]?.ink === ink);
  if (!same) kept.current = list;
  return kept.current;
}

/** A numbered finding as the tape shows it. */
export interface TapeFinding {
  readonly number: number;
  readonly caseId: string;
  /** [s]; findings without a moment have no place on the tape. */
  readonly time?: number;
  readonly words: string;
}

export interface TapePanelProps {
  /** Room for lanes: 5 on a desk, 3 beside a rail, 1 on a phone. */
  readonly lanes?: 5 | 3 | 1;
  readonly findings?: readonly TapeFinding[];
  /** A numeral on the tape was picked, or its digit pressed. */
  readonly onFinding?: (number: number) => void;
  /** False: flags can be read and opened by nobody (a locked lesson, a link). */
  readonly canEdit?: boolean;
}

/** The chart-recorder band: commands as flags, what the runs did as pins, lanes of traces, and the cursor that sets the moment of
 *  every reading on the screen. */
export function TapePanel({ lanes = 5, findings = [], onFinding, canEdit = true }: TapePanelProps) {
  const document = useDocument((state) => state.document);
  const edit = useDocument((state) => state.edit);
  const model = useTape(lanes);
  const format = useFormat();
  const focusAddress = useLaneChoice((state) => state.focus);
  const [sheet, setSheet] = useState<TapeSheet>(null);
  const [editing, setEditing] = useState<string | null>(null);
  const [plotRef, size] = useSize<HTMLDivElement>();
  const isNarrow = useLayout() === 'phone';
  const measures = useMemo(() => tapeMeasures(lanes, isNarrow), [lanes, isNarrow]);
  const plan = useMemo(() => planTape(model, size, measures.right, focusAddress), [model, size, measures.right, focusAddress]);
  const { geometry } = plan;

  const pins = useMemo(
    () =>
      pinsOf(
        model.cases.flatMap((entry) =>
          entry.run
            ? [
                {
                  id: entry.id,
                  letter: entry.pen.letter,
                  ink: entry.ink,
                  run: entry.run,
                  stall: entry.stall,
                },
              ]
            : [],
        ),
      ),
    [model.cases],
  );
  const numerals = useMemo(
    () =>
      findings.flatMap((finding) =>
        finding.time !== undefined && model.cases.some((entry) => entry.id === finding.caseId)
          ? [{ number: finding.number, caseId: finding.caseId, time: finding.time }]
          : [],
      ),
    [findings, model.cases],
  );
  const show = useMemo(() => showIn(format.preferences), [format.preferences]);
  // biome-ignore lint/correctness/useExhaustiveDependencies: of the circuit a flag's words hold the command and the component's name only
  const flags = useMemo(
    () =>
      document.duty.commands.map((command) => {
        const words = commandWords(document, kindOf, command, show);
        return { id: command.id, time: command.time, words, short: shortWords(words) };
      }),
    [document.duty, document.components, show],
  );
  const x = useMemo(() => timeScale(geometry), [geometry]);
  const band = useMemo(
    () =>
      tapeBand(flags, pins, numerals, {
        x,
        width: geometry.plotWidth,
        size: 13,
        rowHeight: measures.rowHeight,
        short: measures.shortFlags,
        bare: measures.bareMarks,
        mostRows: lanes === 1 ? 2 : 3,
      }),
    [flags, pins, numerals, x, geometry.plotWidth, measures.rowHeight, measures.shortFlags, measures.bareMarks, lanes],
  );
  const verticals = useSteady(
    band.marks.flatMap((mark) => {
      const pin = mark.group?.pins.length === 1 ? mark.group.pins[0] : undefined;
      return pin && (mark.words !== '' || pin.verdict || mark.numerals.length > 0) ? [{ time: pin.time, ink: pin.ink }] : [];
    }),
  );
  const moments = useMemo(
    () =>
      [...new Set([...flags.map((flag) => flag.time), ...pins.map((pin) => pin.time), ...numerals.map((entry) => entry.time)])].sort(
        (a, b) => a - b,
      ),
    [flags, pins, numerals],
  );
  usePlayback({ duration: model.duration, repeat: document.duty.repeat, moments });
  const seconds = useCallback((time: number) => format.quantity(time, 'time', { unit: 's', digits: 2 }).text, [format]);
  const pick = useCallback((time: number) => useCursor.getState().setTime(time), []);
  const handleKey = useTapeKeys({ duration: model.duration, moments, findings: numerals, onFinding });
  const command = document.duty.commands.find((entry) => entry.id === editing);
  const anyStale = model.cases.some((entry) => entry.stale);

  return (
    <section
      className="tape"
      aria-label="Tape"
      data-lanes={lanes}
      data-narrow={isNarrow || undefined}
      data-stale={anyStale || undefined}
      data-run-hash={model.cases[model.activeIndex]?.run?.hash}
      style={
        { '--tape-left': `${measures.left}px`, '--tape-band': `${Math.max(band.height, 2 * measures.rowHeight)}px` } as React.CSSProperties
      }
      onKeyDown={handleKey}
    >
      <RunControls compact={lanes < 5 || isNarrow} words={lanes === 5 && !isNarrow} duration={model.duration} />
      <div className="tape-band">
        <TapeMarks marks={band.marks} rowHeight={band.rowHeight} top={0} showTime={seconds} onPick={pick} onFinding={onFinding} />
        <TapeFlags
          flags={band.flags}
          rowHeight={band.rowHeight}
          height={band.height}
          perPixel={geometry.plotWidth > 0 ? model.duration / geometry.plotWidth : 0}
          canEdit={canEdit}
          spoken={(flag) => `Command ${flag.words} at ${seconds(flag.time)}`}
          onGrab={useDocument.getState().beginGesture}
          onLetGo={useDocument.getState().endGesture}
          onMove={(id, time) => edit((now) => moveCommand(now, id, time))}
          onDelete={(id) => edit((now) => removeCommand(now, id))}
          onOpen={(id) => canEdit && setEditing(id)}
        />
        {canEdit && (
          <button
            type="button"
            className="tape-add"
            aria-expanded={sheet === 'flag'}
            aria-label="Add a flag"
            title="Add a flag at the cursor"
            onClick={() => setSheet(sheet === 'flag' ? null : 'flag')}
          >
            <span aria-hidden="true">+</span>
          </button>
        )}
      </div>
      <TapePlot
        ref={plotRef}
        model={model}
        plan={plan}
        overlayReadings={lanes === 5 && !isNarrow}
        verticals={verticals}
        hidden={sheet === 'table'}
      />
      <TapeAxis model={model} geometry={geometry} />
      <TapeFoot document={document} model={model} sheet={sheet} onSheet={setSheet} room={lanes} isNarrow={lanes === 1 || isNarrow} />
      <EventTable document={document} model={model} findings={findings} visible={sheet === 'table'} />
      {sheet === 'flag' && (
        <section className="tape-sheet tape-sheet-right" aria-label="Add a flag">
          <Suspense fallback={null}>
            <AddFlagMenu
              document={document}
              onAdd={(offer) => {
                const time = Math.min(useCursor.getState().time, document.duty.duration);
                const added = addCommand(document, { ...offer, time: Math.round(time * 100) / 100, label: '' });
                if (added.id) {
                  edit((now) => addCommand(now, { ...offer, time: Math.round(time * 100) / 100, label: '' }).document);
                  setEditing(added.id);
                }
                setSheet(null);
              }}
            />
          </Suspense>
        </section>
      )}
      {command && (
        <Suspense fallback={null}>
          <FlagEditor
            key={command.id}
            document={document}
            command={command}
            left={Math.min(Math.max(measures.left + x(command.time) - 20, 4), Math.max(4, size.width + measures.left - 330))}
            onEdit={edit}
            onClose={() => {
              setEditing(null);
              focusFlag(command.id);
            }}
          />
        </Suspense>
      )}
    </section>
  );
}
