import { useState } from 'react';
import { formatTurns } from '#shared/units/format.ts';
import { useFormat } from '#src/components/use-format.ts';
import { openNameplate } from '#src/stores/nameplate-store.ts';
import { TagEntry } from './tag-entry.tsx';
import { TagRefusal } from './tag-refusal.tsx';
import type { TagSpec } from './tag-specs.ts';
import type { TagState } from './tag-state.ts';
import { spokenValue } from './tag-words.ts';
import { inOneStep, QUARTER, setLock, type TurnRefusal, toAsFound, turnBy } from './turning.ts';
import { useTurnDrag } from './use-turn-drag.ts';
import { useTurnKeys, useTurnWheel } from './use-turn-keys.ts';

export interface TurnWheelProps {
  readonly spec: TagSpec;
  readonly state: TagState;
  /** Under the drawing, as wide as the screen. */
  readonly wide?: boolean;
  /** Lays the screw down, so that the list of parts has the room. */
  readonly onParts?: () => void;
}

export const WHEEL_WIDTH = 404;
export const WHEEL_HEIGHT = 122;
/** Pixels of the knurled bar for one turn. */
const TURN = 120;
const BAR = 290;

/** Places of the knurls of a drum seen from the front, shifted by the turns so far. */
function knurls(turns: number, width: number): { readonly x: number; readonly strong: boolean }[] {
  const places: { x: number; strong: boolean }[] = [];
  const count = 30;
  const shift = (turns * 8) % 1;
  for (let k = -count; k <= count; k += 1) {
    const angle = ((k + shift) / count) * Math.PI * 1.4;
    if (Math.abs(angle) > Math.PI / 2 - 0.04) continue;
    places.push({ x: width / 2 + Math.sin(angle) * (width / 2 - 3), strong: Math.abs(angle) > 1.1 });
  }
  return places;
}

/** The turn wheel for fingers: a knurled bar with a yellow window, a quarter-turn button on either side. */
export function TurnWheel({ spec, state, wide, onParts }: TurnWheelProps) {
  const format = useFormat();
  const [refusal, setRefusal] = useState<TurnRefusal | null>(null);
  const [typing, setTyping] = useState<string | null>(null);
  const start = useTurnDrag({ spec, onRefused: setRefusal, mode: { pixelsPerTurn: () => TURN } });
  const keys = useTurnKeys({ spec, onRefused: setRefusal, onOpen: () => openNameplate(spec.component), onType: setTyping });
  const wheel = useTurnWheel<HTMLDivElement>(spec, setRefusal);
  const value = format.quantity(state.value, spec.quantity);
  const found = format.quantity(state.asFound, spec.quantity);
  return (
    <section className={`turn-wheel${wide ? ' turn-wheel-wide' : ''}`} aria-label={`${spec.label} in hand`}>
      <div className="turn-wheel-head">
        <span className="turn-wheel-name">
          <strong>{spec.label}</strong>
          {!wide && ' in hand'}
        </span>
        {onParts && (
          <button type="button" className="link turn-wheel-parts" onClick={onParts}>
            Parts
          </button>
        )}
        {typing === null ? (
          <button type="button" className="turn-wheel-value" aria-label={`${value.text}. Type a value`} onClick={() => setTyping('')}>
            <span className="reading">{value.value}</span> <span className="unit">{value.unit}</span>
          </button>
        ) : (
          <TagEntry spec={spec} state={state} first={typing} onDone={() => setTyping(null)} />
        )}
      </div>
      <div className="turn-wheel-row" ref={wheel}>
        <button
          type="button"
          className="button turn-quarter"
          aria-label="A quarter turn out"
          onClick={() => setRefusal(turnBy(spec, -QUARTER))}
        >
          −¼
        </button>
        <div
          className="turn-bar"
          role="slider"
          tabIndex={0}
          aria-label={spec.label}
          aria-valuemin={Number(state.min.toPrecision(6))}
          aria-valuemax={Number(state.max.toPrecision(6))}
          aria-valuenow={Number(state.value.toPrecision(6))}
          aria-valuetext={spokenValue(spec, state, format)}
          onPointerDown={start}
          onKeyDown={keys}
        >
          <svg viewBox={`0 0 ${BAR} 58`} preserveAspectRatio="none" aria-hidden="true">
            <rect x="0" y="0" width={BAR} height="58" className="turn-drum" />
            {knurls(state.turns, BAR).map(({ x, strong }) => (
              <path key={x} d={`M${x} 5V53`} className={strong ? 'knurl knurl-edge' : 'knurl'} />
            ))}
            <rect x={BAR / 2 - 29} y="0" width="58" height="58" className="turn-window" />
            <path d={`M${BAR / 2} 9V49`} className="turn-mark" />
            <path d={`M${BAR / 2 - 12} 23V35L${BAR / 2 - 20} 29ZM${BAR / 2 + 12} 23V35L${BAR / 2 + 20} 29Z`} className="turn-arrows" />
          </svg>
        </div>
        <button
          type="button"
          className="button turn-quarter"
          aria-label="A quarter turn in"
          onClick={() => setRefusal(turnBy(spec, QUARTER))}
        >
          +¼
        </button>
      </div>
      <div className="turn-wheel-foot">
        <span>{spec.screw ? formatTurns(state.turns) : `as found ${found.text}`}</span>
        {spec.screw && (
          <button
            type="button"
            className="link"
            onClick={() => {
              setLock(spec, !state.locked);
              setRefusal(null);
            }}
          >
            {state.locked ? 'Loosen the nut' : 'Tighten the nut'}
          </button>
        )}
        <button
          type="button"
          className="link"
          disabled={state.value === state.asFound}
          onClick={() => setRefusal(inOneStep(() => toAsFound(spec)))}
        >
          As found {found.text}
        </button>
      </div>
      {refusal && <TagRefusal spec={spec} refusal={refusal} onDone={() => setRefusal(null)} />}
    </section>
  );
}
