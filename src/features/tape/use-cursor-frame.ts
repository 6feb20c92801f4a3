import { useEffect, useLayoutEffect, useRef } from 'react';
import { useCursor } from '#src/stores/cursor-store.ts';

/** Calls `update` with the cursor's time after every render and on every movement of the cursor, without rendering: what
 *  follows the cursor sets its own text and place. */
export function useCursorFrame(update: (time: number) => void): void {
  const latest = useRef(update);
  useLayoutEffect(() => {
    latest.current = update;
    update(useCursor.getState().time);
  });
  useEffect(
    () =>
      useCursor.subscribe((state, before) => {
        if (state.time !== before.time) latest.current(state.time);
      }),
    [],
  );
}
