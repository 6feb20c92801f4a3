import { useCallback } from 'react';
import type { Numeral } from '#shared/pictures/tape-pins.ts';
import { useCursor } from '#src/stores/cursor-store.ts';
import { neighbour } from './use-playback.ts';

export interface TapeKeys {
  readonly duration: number;
  readonly moments: readonly number[];
  readonly findings: readonly Numeral[];
  readonly onFinding?: (number: number) => void;
}

/** Steps of the arrow keys [s]. */
const FINE = 0.01;
const COARSE = 0.1;

/** Keys of the tape: Space runs and pauses, arrows move the cursor, brackets go from event to event, digits to findings.
 *  They act only while the tape has the focus and never from a field. */
export function useTapeKeys({ duration, moments, findings, onFinding }: TapeKeys) {
  return useCallback(
    (event: React.KeyboardEvent) => {
      const target = event.target as HTMLElement;
      if (event.ctrlKey || event.metaKey || event.altKey || target.closest('input, select, textarea, [role="dialog"]')) return;
      const cursor = useCursor.getState();
      const to = (time: number) => cursor.setTime(Math.min(duration, Math.max(0, time)));
      const step = event.shiftKey ? COARSE : FINE;
      if (event.key === 'ArrowLeft') to(Math.round((cursor.time - step) * 1000) / 1000);
      else if (event.key === 'ArrowRight') to(Math.round((cursor.time + step) * 1000) / 1000);
      else if (event.key === 'Home') to(0);
      else if (event.key === 'End') to(duration);
      else if (event.key === '[') to(neighbour(moments, cursor.time, -1));
      else if (event.key === ']') to(neighbour(moments, cursor.time, 1));
      else if (event.key === ' ' && target.tagName !== 'BUTTON') cursor.setPlaying(!cursor.playing);
      else if (/^[1-9]$/.test(event.key)) {
        const found = findings.find((entry) => entry.number === Number(event.key));
        if (!found) return;
        to(found.time);
        onFinding?.(found.number);
      } else return;
      event.preventDefault();
      event.stopPropagation();
    },
    [duration, moments, findings, onFinding],
  );
}
