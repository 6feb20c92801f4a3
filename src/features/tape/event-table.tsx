import { useEffect, useMemo, useState } from 'react';
import type { CircuitDocument } from '#shared/circuit/schema.ts';
import { useFormat } from '#src/components/use-format.ts';
import { useCursor } from '#src/stores/cursor-store.ts';
import { eventRows } from './event-rows.ts';
import { laneReading } from './lane-reading.ts';
import type { TapeModel } from './tape-model.ts';
import type { TapeFinding } from './tape-panel.tsx';

export interface EventTableProps {
  readonly document: CircuitDocument;
  readonly model: TapeModel;
  readonly findings: readonly TapeFinding[];
  /** False: only a screen reader meets it, and nothing in it takes the focus. */
  readonly visible: boolean;
}

/** The tape in words: events and findings by time, readings at the cursor, and each lane's range in every phase. */
export function EventTable({ document, model, findings, visible }: EventTableProps) {
  const { preferences, quantity } = useFormat();
  const [down, setDown] = useState(false);
  const rows = useMemo(() => eventRows(document, model, findings, preferences), [document, model, findings, preferences]);
  const sorted = down ? [...rows].reverse() : rows;
  const seconds = (time: number) => quantity(time, 'time', { unit: 's', digits: 2 }).text;
  return (
    <section className={visible ? 'tape-table' : 'visually-hidden'} aria-label="The tape as a table" tabIndex={visible ? 0 : undefined}>
      <table className="table">
        <caption>Events and findings</caption>
        <thead>
          <tr>
            <th scope="col" aria-sort={down ? 'descending' : 'ascending'}>
              {visible ? (
                <button type="button" className="link" onClick={() => setDown(!down)}>
                  Time {down ? '↓' : '↑'}
                </button>
              ) : (
                'Time'
              )}
            </th>
            <th scope="col">Case</th>
            <th scope="col">What happens</th>
          </tr>
        </thead>
        <tbody>
          {sorted.map((row) => (
            <tr key={`${row.sort} ${row.letter} ${row.time} ${row.words}`}>
              <td className="reading">
                {visible ? (
                  <button type="button" className="link" onClick={() => useCursor.getState().setTime(row.time)}>
                    {seconds(row.time)}
                  </button>
                ) : (
                  seconds(row.time)
                )}
              </td>
              <td>{row.letter || 'all'}</td>
              <td>{row.words}</td>
            </tr>
          ))}
        </tbody>
      </table>
      <CursorReadings model={model} />
      <PhaseTable model={model} />
    </section>
  );
}

/** Readings of every lane and case at the cursor; while the tape plays they follow only twice a second. */
function CursorReadings({ model }: { readonly model: TapeModel }) {
  const { preferences, quantity } = useFormat();
  const time = useSlowCursor();
  return (
    <table className="table">
      <caption>Readings at {quantity(time, 'time', { unit: 's', digits: 2 }).text}</caption>
      <thead>
        <tr>
          <th scope="col">Lane</th>
          {model.cases.map((entry) => (
            <th key={entry.id} scope="col" className="number">
              {entry.pen.letter} {entry.name}
            </th>
          ))}
        </tr>
      </thead>
      <tbody>
        {model.lanes.map((lane) => (
          <tr key={lane.lane.address}>
            <th scope="row">{lane.lane.title}</th>
            {model.cases.map((entry) => {
              const reading = laneReading(entry, lane, time, preferences);
              return (
                <td key={entry.id} className="number reading">
                  {reading.value} {reading.unit}
                </td>
              );
            })}
          </tr>
        ))}
      </tbody>
    </table>
  );
}

/** Least, greatest and end value of each lane in each phase of the duty, for the case on the drawing. */
function PhaseTable({ model }: { readonly model: TapeModel }) {
  const { quantity } = useFormat();
  const active = model.cases[model.activeIndex];
  const phases = active?.run?.phases ?? [];
  if (!active || phases.length === 0) return null;
  return (
    <table className="table">
      <caption>By phase, case {active.pen.letter}: least to greatest, then at the end of the phase</caption>
      <thead>
        <tr>
          <th scope="col">Phase</th>
          {model.lanes.map((lane) => (
            <th key={lane.lane.address} scope="col" className="number">
              {lane.lane.title}
            </th>
          ))}
        </tr>
      </thead>
      <tbody>
        {phases.map((phase) => (
          <tr key={`${phase.from} ${phase.label}`}>
            <th scope="row">
              {phase.label}, from {quantity(phase.from, 'time', { unit: 's', digits: 2 }).text}
            </th>
            {model.lanes.map((lane) => {
              const figures = phase.channels[lane.lane.address];
              const value = (v: number) => quantity(v, lane.lane.quantity).value;
              return (
                <td key={lane.lane.address} className="number reading">
                  {figures ? `${value(figures.min)} to ${quantity(figures.max, lane.lane.quantity).text}, ${value(figures.end)}` : '–'}
                </td>
              );
            })}
          </tr>
        ))}
      </tbody>
    </table>
  );
}

const SLOW = 500;

function useSlowCursor(): number {
  const [time, setTime] = useState(() => useCursor.getState().time);
  useEffect(() => {
    let timer: ReturnType<typeof setTimeout> | undefined;
    const stop = useCursor.subscribe((state) => {
      timer ??= setTimeout(
        () => {
          timer = undefined;
          setTime(useCursor.getState().time);
        },
        state.playing ? SLOW : 80,
      );
    });
    return () => {
      stop();
      clearTimeout(timer);
    };
  }, []);
  return time;
}
