import { memo } from 'react';
import type { TagState } from './tag-state.ts';

export interface TurnRulerProps {
  readonly state: TagState;
  readonly width: number;
  /** Index of the ink of the case on the drawing. */
  readonly ink: number;
  /** Doubles the end at which a turn was refused. */
  readonly refusedEnd: 'low' | 'high' | null;
}

/** Value → pixel on a ruler. */
export function rulerPlace(state: TagState, value: number, width: number): number {
  const span = state.max - state.min;
  return span > 0 ? 2 + (width - 4) * Math.min(1, Math.max(0, (value - state.min) / span)) : width / 2;
}

function tickPlaces(state: TagState, width: number): readonly number[] {
  const step = Math.abs(state.perTurn);
  const count = (state.max - state.min) / step;
  if (!(count > 0) || count > 40) return [];
  const first = Math.ceil((state.min - state.asFound) / step);
  const places: number[] = [];
  for (let turn = first; state.asFound + turn * step <= state.max + step * 1e-6; turn += 1) {
    places.push(rulerPlace(state, state.asFound + turn * step, width));
  }
  return places;
}

/** A ruler in turns: a tick for each, the as-found mark as a ring on a stem, a bar for every other case, the present value. */
export const TurnRuler = memo(function TurnRuler({ state, width, ink, refusedEnd }: TurnRulerProps) {
  const at = (value: number) => rulerPlace(state, value, width);
  const found = at(state.asFound);
  const now = at(state.value);
  return (
    <svg className="turn-ruler" width={width} height="22" viewBox={`0 0 ${width} 22`} aria-hidden="true">
      <path d={`M2 3V12H${width - 2}V3`} className="ruler-line" />
      {refusedEnd && <path d={refusedEnd === 'high' ? `M${width - 6} 3V12` : 'M6 3V12'} className="ruler-line" />}
      {tickPlaces(state, width).map((x) => (
        <path key={x} d={`M${x} 7V12`} className="ruler-tick" />
      ))}
      {state.others.map((other) => (
        <path
          key={`${other.ink}:${other.value}`}
          d={`M${at(other.value)} 5V17`}
          stroke={`var(--case-${other.ink})`}
          className="ruler-other"
        />
      ))}
      {state.rating !== null && state.rating >= state.min && state.rating < state.max && (
        <path d={`M${at(state.rating)} 4h${width - 2 - at(state.rating)}`} className="ruler-rating" />
      )}
      <path d={`M${found} 2V14`} className="ruler-found" />
      <circle cx={found} cy="17" r="2.9" className="ruler-ring" />
      <path d={`M${now} 12.5L${now + 5.2} 21.5H${now - 5.2}Z`} fill={`var(--case-${ink})`} />
    </svg>
  );
});
