import { type KeyboardEvent, useEffect, useRef } from 'react';
import { useDocument } from '#src/stores/document-store.ts';
import type { TagSpec } from './tag-specs.ts';
import { FINE, inOneStep, presentState, QUARTER, setLock, setTo, type TurnRefusal, toAsFound, turnBy } from './turning.ts';

export interface TurnKeyOptions {
  readonly spec: TagSpec;
  readonly onRefused: (refusal: TurnRefusal | null) => void;
  readonly onOpen: () => void;
  readonly onType: (first: string) => void;
}

/** Keys of a tag in hand: Up and Down a quarter turn, Shift fine, Home as found, L lock nut, Enter nameplate; a digit or a
 *  sign begins typing a value. */
export function useTurnKeys({ spec, onRefused, onOpen, onType }: TurnKeyOptions): (event: KeyboardEvent) => void {
  return (event) => {
    if (event.altKey || event.ctrlKey || event.metaKey) return;
    const take = () => {
      event.preventDefault();
      event.stopPropagation();
    };
    const step = event.shiftKey ? FINE : QUARTER;
    if (event.key === 'ArrowUp' || event.key === 'ArrowDown') {
      take();
      onRefused(turnBy(spec, event.key === 'ArrowUp' ? step : -step));
    } else if (event.key === 'Home') {
      take();
      onRefused(inOneStep(() => toAsFound(spec)));
    } else if (event.key === 'l' || event.key === 'L') {
      take();
      setLock(spec, !(presentState(spec)?.locked ?? false));
      onRefused(null);
    } else if (event.key === 'Enter') {
      take();
      onOpen();
    } else if (event.key === 'Escape') {
      take();
      useDocument.getState().takeInHand(null);
      onRefused(null);
    } else if (/^[0-9+.,-]$/.test(event.key)) {
      take();
      onType(event.key);
    }
  };
}

/** Notches that follow each other within this are one run [ms]; long enough for a slow machine. */
const RUN_OF_NOTCHES = 600;

/** Turning with the wheel over the element: one notch is a quarter turn, Shift fine. A run of notches is one step of the
 *  history. */
export function useTurnWheel<E extends HTMLElement>(spec: TagSpec, onRefused: (refusal: TurnRefusal | null) => void) {
  const element = useRef<E>(null);
  const latest = useRef({ spec, onRefused });
  latest.current = { spec, onRefused };
  useEffect(() => {
    const target = element.current;
    if (!target) return;
    let rest: ReturnType<typeof setTimeout> | undefined;
    let gathered = 0;
    const finish = () => {
      rest = undefined;
      gathered = 0;
      window.removeEventListener('wheel', turn, { capture: true });
      useDocument.getState().endGesture();
    };
    const turn = (event: WheelEvent) => {
      if (event.ctrlKey) return;
      event.preventDefault();
      event.stopPropagation();
      const { spec: turned, onRefused: tell } = latest.current;
      const amount = event.deltaY === 0 ? event.deltaX : event.deltaY;
      gathered += event.deltaMode === 0 ? amount / 100 : amount / 3;
      const notches = Math.trunc(gathered);
      if (notches === 0) return;
      gathered -= notches;
      const state = presentState(turned);
      if (!state) return;
      if (rest === undefined) {
        useDocument.getState().takeInHand(turned.address);
        useDocument.getState().beginGesture();
        // Until the run of notches ends they all turn this screw, even where the tag has moved from under the pointer.
        window.addEventListener('wheel', turn, { capture: true, passive: false });
      }
      clearTimeout(rest);
      rest = setTimeout(finish, RUN_OF_NOTCHES);
      tell(setTo(turned, state.value - notches * (event.shiftKey ? FINE : QUARTER) * state.perTurn));
    };
    target.addEventListener('wheel', turn, { passive: false });
    return () => {
      target.removeEventListener('wheel', turn);
      if (rest !== undefined) {
        clearTimeout(rest);
        finish();
      }
    };
  }, []);
  return element;
}
