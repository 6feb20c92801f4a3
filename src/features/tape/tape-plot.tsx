import { type Ref, useEffect, useRef } from 'react';
import { useFormat } from '#src/components/use-format.ts';
import { useCursor } from '#src/stores/cursor-store.ts';
import { laneReading } from './lane-reading.ts';
import { FoldedRow, LaneName } from './lane-readings.tsx';
import { useLaneChoice } from './lane-store.ts';
import { TapeCanvas } from './tape-canvas.tsx';
import { TapeCursor } from './tape-cursor.tsx';
import { timeScale, type Vertical } from './tape-geometry.ts';
import { FOLDED_ROW, type TapePlan } from './tape-layout.ts';
import type { TapeModel } from './tape-model.ts';

export interface TapePlotProps {
  readonly ref: Ref<HTMLDivElement>;
  readonly model: TapeModel;
  readonly plan: TapePlan;
  readonly verticals: readonly Vertical[];
  readonly hidden: boolean;
  /** Readings of the overlaid cases beside that of the case on the drawing. */
  readonly overlayReadings: boolean;
}

/** The lanes: readings on the left, traces, cursor; dragging anywhere in the lanes moves the cursor. */
export function TapePlot({ ref, model, plan, verticals, hidden, overlayReadings }: TapePlotProps) {
  const { geometry } = plan;
  const setFocus = useLaneChoice((state) => state.setFocus);
  const dragging = useRef(false);
  const toTime = (event: React.PointerEvent) => {
    const box = event.currentTarget.getBoundingClientRect();
    useCursor.getState().setTime(Math.min(geometry.to, Math.max(0, timeScale(geometry).invert(event.clientX - box.left))));
  };
  const empty = model.cases.every((entry) => !entry.run) && model.cases.some((entry) => entry.refused);
  const below = plan.folded.length * FOLDED_ROW;
  return (
    <div className="tape-lanes" data-hidden={hidden || undefined}>
      <div className="tape-names">
        {geometry.lanes.map((place) => {
          const lane = model.lanes[place.index];
          if (!lane) return null;
          return (
            <LaneName
              key={lane.lane.address}
              model={model}
              lane={lane}
              top={place.top}
              height={place.height}
              big={plan.folded.length > 0}
              others={overlayReadings}
            />
          );
        })}
      </div>
      <div className="tape-plot" ref={ref}>
        <div
          className="tape-sheet-area"
          style={{ height: geometry.height }}
          onPointerDown={(event) => {
            if (event.button !== 0) return;
            event.currentTarget.setPointerCapture(event.pointerId);
            dragging.current = true;
            useCursor.getState().setPlaying(false);
            toTime(event);
          }}
          onPointerMove={(event) => dragging.current && toTime(event)}
          onPointerUp={() => {
            dragging.current = false;
          }}
          onPointerCancel={() => {
            dragging.current = false;
          }}
        >
          <TapeCanvas model={model} geometry={geometry} verticals={verticals} />
          <CursorSlider model={model} />
        </div>
        <TapeCursor model={model} geometry={geometry} below={below} />
        {empty && <p className="tape-empty">No run yet. What is missing is said on the drawing.</p>}
      </div>
      {plan.folded.length > 0 && (
        <div className="tape-folds">
          {plan.folded.map((index) => {
            const lane = model.lanes[index];
            return lane ? (
              <FoldedRow key={lane.lane.address} model={model} lane={lane} onUnfold={() => setFocus(lane.lane.address)} />
            ) : null;
          })}
        </div>
      )}
    </div>
  );
}

/** What takes the focus for the keyboard and tells a reader the time and the readings there. */
function CursorSlider({ model }: { readonly model: TapeModel }) {
  const ref = useRef<HTMLDivElement>(null);
  const { preferences, quantity } = useFormat();
  useEffect(() => {
    const tell = () => {
      const slider = ref.current;
      if (!slider) return;
      const { time, playing } = useCursor.getState();
      if (playing) return;
      const active = model.cases[model.activeIndex];
      const readings = active
        ? model.lanes.map((lane) => {
            const reading = laneReading(active, lane, time, preferences);
            return `${lane.lane.title} ${reading.value} ${reading.unit}`;
          })
        : [];
      slider.setAttribute('aria-valuenow', String(Math.round(time * 1000) / 1000));
      slider.setAttribute('aria-valuetext', [quantity(time, 'time', { unit: 's', digits: 2 }).text, ...readings].join(', '));
    };
    tell();
    return useCursor.subscribe(tell);
  }, [model, preferences, quantity]);
  return (
    <div
      ref={ref}
      role="slider"
      tabIndex={0}
      className="tape-slider"
      aria-label="Moment on the tape"
      aria-orientation="horizontal"
      aria-valuemin={0}
      aria-valuemax={model.duration}
      aria-valuenow={0}
    />
  );
}
