import { type KeyboardEvent, useEffect, useRef } from 'react';
import { useDocument } from '#src/stores/document-store.ts';
import { openNameplate } from '#src/stores/nameplate-store.ts';
import {
  chosen,
  copyChosen,
  deleteChosen,
  duplicateChosen,
  mirrorChosen,
  moveChosen,
  pasteClip,
  selectAll,
  turnChosen,
} from './actions.ts';
import { closeStrip, say, useDrawing } from './drawing-store.ts';

const steps: Readonly<Record<string, { x: number; y: number }>> = {
  ArrowLeft: { x: -1, y: 0 },
  ArrowRight: { x: 1, y: 0 },
  ArrowUp: { x: 0, y: -1 },
  ArrowDown: { x: 0, y: 1 },
};
const FAR = 5;

/** Keys of the sheet. They act while the sheet or something on it has the focus, never from a field; a run of arrow keys is one
 *  step to undo. */
export function useDrawKeys(zoom: { in: () => void; out: () => void; fit: () => void }) {
  const moving = useRef(false);

  function onKeyDown(event: KeyboardEvent<HTMLElement>) {
    if (event.defaultPrevented || (event.target as HTMLElement).closest('input, textarea, select, [role="menu"], [role="alertdialog"]'))
      return;
    const focused = (event.target as HTMLElement).dataset.part ?? null;
    const ids = chosen(focused);
    const done = () => event.preventDefault();
    if (event.ctrlKey || event.metaKey) {
      const act = commandOf(event, ids);
      if (act) {
        done();
        act();
      }
      return;
    }
    if (event.altKey) return;
    const step = steps[event.key];
    if (step && ids.length > 0) {
      done();
      if (!moving.current) useDocument.getState().beginGesture();
      moving.current = true;
      const far = event.shiftKey ? FAR : 1;
      if (focused && !useDocument.getState().selection.includes(focused)) useDocument.getState().select([focused]);
      return moveChosen(ids, { x: step.x * far, y: step.y * far });
    }
    const key = event.key.length === 1 ? event.key.toLowerCase() : event.key;
    if (key === 'Escape') return putAway();
    if (key === '+' || key === '=') return zoom.in();
    if (key === '-') return zoom.out();
    if (key === '0') return zoom.fit();
    if (ids.length === 0) return;
    if (key === 'r') turnChosen(ids);
    else if (key === 'x') mirrorChosen(ids);
    else if (key === 'd') duplicateChosen(ids);
    else if (key === 'Delete' || key === 'Backspace') deleteChosen(ids);
    else if (key === 'Enter' && focused) openNameplate(focused);
    else if (key === ' ' && focused) toggle(focused);
    else return;
    done();
  }

  function onKeyUp(event: KeyboardEvent<HTMLElement>) {
    if (moving.current && steps[event.key]) stopMoving();
  }
  function stopMoving() {
    if (!moving.current) return;
    moving.current = false;
    useDocument.getState().endGesture();
  }
  useEffect(() => {
    // Undo and redo also act while nothing on the page has the focus.
    const onWindow = (event: globalThis.KeyboardEvent) => {
      if (event.target !== document.body || !(event.ctrlKey || event.metaKey)) return;
      const act = historyOf(event);
      if (!act) return;
      event.preventDefault();
      act();
    };
    window.addEventListener('keydown', onWindow);
    return () => window.removeEventListener('keydown', onWindow);
  }, []);
  return { onKeyDown, onKeyUp, onBlur: stopMoving };
}

function commandOf(event: KeyboardEvent, ids: readonly string[]): (() => void) | null {
  const history = historyOf(event);
  if (history) return history;
  const key = event.key.toLowerCase();
  if (key === 'a') return selectAll;
  if (key === 'v') return pasteClip;
  if (ids.length === 0) return null;
  if (key === 'c') return () => copyChosen(ids);
  if (key === 'x') {
    return () => {
      copyChosen(ids);
      deleteChosen(ids);
    };
  }
  return null;
}

function historyOf(event: Pick<KeyboardEvent, 'key' | 'shiftKey'>): (() => void) | null {
  const { undo, redo } = useDocument.getState();
  const key = event.key.toLowerCase();
  if (key === 'z') return event.shiftKey ? redo : undo;
  return key === 'y' ? redo : null;
}

function toggle(id: string) {
  const { selection, select } = useDocument.getState();
  select(selection.includes(id) ? selection.filter((entry) => entry !== id) : [...selection, id]);
}

function putAway() {
  const { strip, placing, set } = useDrawing.getState();
  if (strip) return closeStrip();
  if (placing) {
    set({ placing: null });
    return say('Put back');
  }
  set({ deletion: null });
  useDocument.getState().select([]);
}
