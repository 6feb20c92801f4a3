import { type PointerEvent as ReactPointerEvent, useEffect, useRef } from 'react';
import { useDocument } from '#src/stores/document-store.ts';
import type { TagSpec } from './tag-specs.ts';
import { presentState, setTo, type TurnRefusal } from './turning.ts';

/** Dragging a screw: round it, or along a ruler or wheel. Everything between press and release is one step of the history. */

interface Drag {
  readonly pointer: number;
  /** Value [SI] at the press, and turns since. */
  readonly start: number;
  readonly perTurn: number;
  turns: number;
  lastAngle: number;
  lastX: number;
  frame: number;
}

export interface TurnDragOptions {
  readonly spec: TagSpec;
  readonly onRefused: (refusal: TurnRefusal | null) => void;
  /** Dragging round the middle of the element, or along it: pixels for one turn. */
  readonly mode: 'around' | { readonly pixelsPerTurn: (perTurn: number) => number };
  readonly onTurns?: (turns: number) => void;
}

/** Turns are felt in this share while Shift is held. */
const FINE_SHARE = 0.125;
/** Smallest step while dragging [turns]. */
const GRAIN = 1 / 48;

function angleOf(event: { clientX: number; clientY: number }, box: DOMRect): number {
  return Math.atan2(event.clientY - (box.top + box.height / 2), event.clientX - (box.left + box.width / 2));
}

/** Pointer handler for the element to be dragged. */
export function useTurnDrag(options: TurnDragOptions): (event: ReactPointerEvent<Element>) => void {
  const drag = useRef<Drag | null>(null);
  const latest = useRef(options);
  latest.current = options;
  const stop = useRef<() => void>(() => undefined);
  useEffect(() => () => stop.current(), []);

  return (event) => {
    if (event.button !== 0 || drag.current) return;
    const state = presentState(options.spec);
    if (!state) return;
    event.preventDefault();
    event.stopPropagation();
    const element = event.currentTarget as HTMLElement;
    element.focus({ preventScroll: true });
    useDocument.getState().takeInHand(options.spec.address);
    const box = element.getBoundingClientRect();
    const now: Drag = {
      pointer: event.pointerId,
      start: state.value,
      perTurn: state.perTurn,
      turns: 0,
      lastAngle: angleOf(event, box),
      lastX: event.clientX,
      frame: 0,
    };
    drag.current = now;
    let begun = false;

    const apply = () => {
      now.frame = 0;
      const turns = Math.round(now.turns / GRAIN) * GRAIN;
      if (!begun) {
        begun = true;
        useDocument.getState().beginGesture();
      }
      latest.current.onTurns?.(turns);
      latest.current.onRefused(setTo(latest.current.spec, now.start + turns * now.perTurn));
    };
    const move = (moved: PointerEvent) => {
      if (moved.pointerId !== now.pointer) return;
      const { mode } = latest.current;
      let by: number;
      if (mode === 'around') {
        const angle = angleOf(moved, box);
        let turned = angle - now.lastAngle;
        if (turned > Math.PI) turned -= 2 * Math.PI;
        if (turned < -Math.PI) turned += 2 * Math.PI;
        now.lastAngle = angle;
        by = turned / (2 * Math.PI);
      } else {
        by = (moved.clientX - now.lastX) / mode.pixelsPerTurn(now.perTurn);
        now.lastX = moved.clientX;
      }
      now.turns += moved.shiftKey ? by * FINE_SHARE : by;
      if (now.frame === 0) now.frame = requestAnimationFrame(apply);
    };
    const end = (ended: PointerEvent) => {
      if (ended.pointerId !== now.pointer) return;
      if (now.frame !== 0) {
        cancelAnimationFrame(now.frame);
        apply();
      }
      stop.current();
    };
    stop.current = () => {
      window.removeEventListener('pointermove', move);
      window.removeEventListener('pointerup', end);
      window.removeEventListener('pointercancel', end);
      if (now.frame !== 0) cancelAnimationFrame(now.frame);
      drag.current = null;
      latest.current.onTurns?.(0);
      if (begun) useDocument.getState().endGesture();
      stop.current = () => undefined;
    };
    window.addEventListener('pointermove', move);
    window.addEventListener('pointerup', end);
    window.addEventListener('pointercancel', end);
  };
}
