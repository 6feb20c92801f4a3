import { useRef } from 'react';
import { THIN_SPACE } from '#shared/units/format.ts';
import { CaseLetter } from '#src/components/case-letter.tsx';
import { Sparkline } from '#src/components/charts/sparkline.tsx';
import { useFormat } from '#src/components/use-format.ts';
import { laneReading } from './lane-reading.ts';
import { FOLDED_ROW } from './tape-layout.ts';
import type { TapeCase, TapeLane, TapeModel } from './tape-model.ts';
import { useCursorFrame } from './use-cursor-frame.ts';

/** One reading that follows the cursor without rendering. */
function Reading({
  entry,
  lane,
  unit: form,
}: {
  readonly entry: TapeCase;
  readonly lane: TapeLane;
  readonly unit: 'whole' | 'short' | 'none';
}) {
  const value = useRef<HTMLSpanElement>(null);
  const unit = useRef<HTMLSpanElement>(null);
  const { preferences } = useFormat();
  useCursorFrame((time) => {
    const reading = laneReading(entry, lane, time, preferences);
    if (value.current) value.current.textContent = reading.value;
    const words = form === 'short' ? reading.unit.replace('× rated', '×') : reading.unit;
    if (unit.current) unit.current.textContent = words === '' ? '' : THIN_SPACE + words;
  });
  return (
    <>
      <span ref={value} className="tape-value" style={{ '--case-ink': `var(--case-${entry.ink})` } as React.CSSProperties} />
      {form !== 'none' && <span ref={unit} className="tape-unit" />}
    </>
  );
}

export interface LaneNameProps {
  readonly model: TapeModel;
  readonly lane: TapeLane;
  readonly top: number;
  readonly height: number;
  /** Readings of the overlaid cases stand in boxes below (big lane) or on the right (small lanes). */
  readonly big: boolean;
  /** Show readings of the overlaid cases. */
  readonly others: boolean;
}

/** Left column of one lane: its title, the reading of the case on the drawing, small ones for the overlays. */
export function LaneName({ model, lane, top, height, big, others: withOthers }: LaneNameProps) {
  const active = model.cases[model.activeIndex];
  const others = withOthers ? model.cases.filter((entry) => !entry.active) : [];
  return (
    <div className="tape-name" style={{ top, height }} data-big={big || undefined}>
      <div className="tape-title">{lane.lane.title}</div>
      {active && (
        <div className="tape-reading">
          <span className="tape-main">
            <Reading entry={active} lane={lane} unit={others.length > 0 && !big ? 'short' : 'whole'} />
          </span>
          {!big &&
            others.map((entry) => (
              <span key={entry.id} className="tape-other">
                {entry.pen.letter} <Reading entry={entry} lane={lane} unit="none" />
              </span>
            ))}
        </div>
      )}
      {big && (
        <div className="tape-boxes">
          {others.map((entry) => (
            <span key={entry.id} className="tape-box">
              <CaseLetter letter={entry.pen.letter} ink={entry.ink} size={17} />
              <Reading entry={entry} lane={lane} unit="none" />
            </span>
          ))}
        </div>
      )}
    </div>
  );
}

export interface FoldedRowProps {
  readonly model: TapeModel;
  readonly lane: TapeLane;
  readonly onUnfold: () => void;
}

/** A folded lane: cursor table, one column per case, and a sparkline of the case on the drawing. */
export function FoldedRow({ model, lane, onUnfold }: FoldedRowProps) {
  const active = model.cases[model.activeIndex];
  const trace = lane.traces.find((entry) => entry.caseIndex === model.activeIndex);
  return (
    <div className="tape-folded" style={{ height: FOLDED_ROW }}>
      <button type="button" className="tape-folded-name" aria-expanded={false} onClick={onUnfold} title={`Show ${lane.lane.title} large`}>
        <span aria-hidden="true" className="tape-folded-mark" />
        {lane.lane.title}
      </button>
      <div className="tape-folded-values">
        {model.cases.map((entry) => (
          <span key={entry.id} className="tape-folded-value" data-active={entry.active || undefined}>
            <span className="tape-folded-bar" style={{ backgroundColor: `var(--case-${entry.ink})` }} />
            <span className="visually-hidden">{entry.pen.letter}</span>
            <Reading entry={entry} lane={lane} unit="none" />
          </span>
        ))}
        <span className="tape-folded-unit">{lane.lane.role === 'load' ? '× rated' : lane.unit.symbol}</span>
        <span className="tape-folded-spark">
          {active && trace && (
            <Sparkline
              times={trace.times}
              values={trace.values}
              stretches={trace.stretches}
              duration={model.duration}
              ink={active.ink}
              stroke={1.8}
              stretch
              height={FOLDED_ROW - 6}
            />
          )}
        </span>
      </div>
    </div>
  );
}
