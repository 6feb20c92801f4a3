import { useMemo, useRef } from 'react';
import { valueAt } from '#shared/simulation/result.ts';
import { useFormat } from '#src/components/use-format.ts';
import { laneScale, type TapeGeometry, timeScale } from './tape-geometry.ts';
import type { TapeModel } from './tape-model.ts';
import { useCursorFrame } from './use-cursor-frame.ts';

export interface TapeCursorProps {
  readonly model: TapeModel;
  readonly geometry: TapeGeometry;
  /** Height of the folded rows under the canvas, which the line passes behind. */
  readonly below: number;
}

/** The oxide line and a disc on every trace: a layer of its own that moves without redrawing the traces. */
export function TapeCursor({ model, geometry, below }: TapeCursorProps) {
  const line = useRef<HTMLDivElement>(null);
  const discs = useRef<(HTMLSpanElement | null)[]>([]);
  const marks = useMemo(
    () =>
      geometry.lanes.flatMap((place) => {
        const lane = model.lanes[place.index];
        if (!lane) return [];
        const y = laneScale(lane, place.top, place.height);
        return lane.traces.map((trace) => ({
          key: `${lane.lane.address} ${trace.caseIndex}`,
          y: (time: number) => y(valueAt(trace.times, trace.values, time)),
          shows: (time: number) => trace.stretches.some(([from, to]) => time >= from - 1e-9 && time <= to + 1e-9),
          ink: model.cases[trace.caseIndex]?.ink ?? 0,
          active: trace.caseIndex === model.activeIndex,
        }));
      }),
    [model, geometry],
  );
  const x = useMemo(() => timeScale(geometry), [geometry]);
  useCursorFrame((time) => {
    const at = x(Math.min(time, geometry.to));
    if (line.current) line.current.style.transform = `translateX(${at}px)`;
    marks.forEach((mark, i) => {
      const disc = discs.current[i];
      if (!disc) return;
      disc.style.display = mark.shows(time) ? '' : 'none';
      disc.style.transform = `translate(${at}px, ${mark.y(time)}px)`;
    });
  });
  return (
    <div className="tape-cursor-layer" aria-hidden="true">
      <div ref={line} className="tape-cursor-line" style={{ height: geometry.height + below }} />
      {marks.map((mark, i) => (
        <span
          key={mark.key}
          ref={(node) => {
            discs.current[i] = node;
          }}
          className="tape-cursor-disc"
          data-active={mark.active || undefined}
          style={{ backgroundColor: `var(--case-${mark.ink})` }}
        />
      ))}
    </div>
  );
}

/** The plate with the time, on the time axis. */
export function TapePlate({ geometry }: { readonly geometry: TapeGeometry }) {
  const plate = useRef<HTMLDivElement>(null);
  const words = useRef<HTMLSpanElement>(null);
  const format = useFormat();
  const x = useMemo(() => timeScale(geometry), [geometry]);
  useCursorFrame((time) => {
    if (words.current) words.current.textContent = format.quantity(Math.min(time, geometry.to), 'time', { unit: 's', digits: 2 }).text;
    if (plate.current) plate.current.style.transform = `translateX(${x(Math.min(time, geometry.to))}px)`;
  });
  return (
    <div ref={plate} className="tape-plate" aria-hidden="true">
      <span ref={words} />
    </div>
  );
}
