import { useEffect } from 'react';
import { addCase } from '#shared/circuit/edit/cases.ts';
import { showMoment } from '#src/features/findings/show-moment.ts';
import { takeCase } from '#src/stores/apply-value.ts';
import { useCursor } from '#src/stores/cursor-store.ts';
import { showDialog } from '#src/stores/dialog-store.ts';
import { useDocument } from '#src/stores/document-store.ts';
import { numberFindings } from '#src/stores/findings-numbering.ts';
import { useRuns } from '#src/stores/run-store.ts';

const FIELD = 'input, select, textarea, [contenteditable], [role="dialog"], [role="menu"]';
/** Steps of the arrow keys [s]. */
const FINE = 0.01;
const COARSE = 0.1;

function moveCursor(by: number): void {
  const { time, setTime } = useCursor.getState();
  setTime(Math.min(useDocument.getState().document.duty.duration, Math.max(0, Math.round((time + by) * 1000) / 1000)));
}

function toEvent(step: 1 | -1): void {
  const { activeCase } = useDocument.getState();
  const { time, setTime } = useCursor.getState();
  const moments = (useRuns.getState().byCase[activeCase]?.run?.events ?? [])
    .filter((event) => event.label !== '')
    .map((event) => event.time);
  const beyond = moments.filter((moment) => (step > 0 ? moment > time + 1e-6 : moment < time - 1e-6));
  if (beyond.length > 0) setTime(step > 0 ? Math.min(...beyond) : Math.max(...beyond));
}

function toCase(step: 1 | -1): void {
  const { document, activeCase, setActiveCase } = useDocument.getState();
  const at = document.cases.findIndex((entry) => entry.id === activeCase);
  const next = document.cases[at + step];
  if (next) setActiveCase(next.id);
}

function toFinding(number: number): void {
  const { document, activeCase, overlays } = useDocument.getState();
  const found = numberFindings(document, [activeCase, ...overlays], useRuns.getState().byCase).find((entry) => entry.number === number);
  if (found) showMoment(found.finding);
}

function newCase(): void {
  const { document, activeCase } = useDocument.getState();
  takeCase(addCase(document, activeCase));
}

/** Keys that act on the cursor; the tape has them too and takes them first. */
function cursorKey(event: KeyboardEvent, target: HTMLElement): boolean {
  const step = event.shiftKey ? COARSE : FINE;
  if (event.key === 'ArrowLeft') moveCursor(-step);
  else if (event.key === 'ArrowRight') moveCursor(step);
  else if (event.key === '[') toEvent(-1);
  else if (event.key === ']') toEvent(1);
  else if (event.key === ' ' && target.tagName !== 'BUTTON') useCursor.getState().setPlaying(!useCursor.getState().playing);
  else if (/^[1-9]$/.test(event.key)) toFinding(Number(event.key));
  else return false;
  return true;
}

/** Letters and digits act only while the drawing or the tape has the focus, never from a field; undo and redo everywhere else
 *  on the bench. */
export function useBenchKeys(): void {
  useEffect(() => {
    let former: string | null = null;
    const stopFollowing = useDocument.subscribe((state, before) => {
      if (state.activeCase !== before.activeCase) former = before.activeCase;
    });
    function overlayFormer() {
      const { document, activeCase, toggleOverlay } = useDocument.getState();
      const other =
        document.cases.find((entry) => entry.id === former && entry.id !== activeCase) ??
        document.cases.find((entry) => entry.id !== activeCase);
      if (other) toggleOverlay(other.id);
    }
    function caseKey(event: KeyboardEvent): boolean {
      if (event.key === ',') toCase(-1);
      else if (event.key === '.') toCase(1);
      else if (event.key === 'o' || event.key === 'O') overlayFormer();
      else if (event.key === 'n' || event.key === 'N') newCase();
      else if (event.key === '?') showDialog({ id: 'keys' });
      else return false;
      return true;
    }
    function handle(event: KeyboardEvent) {
      const target = event.target instanceof HTMLElement ? event.target : document.body;
      if (event.defaultPrevented || target.closest(FIELD)) return;
      if (event.ctrlKey || event.metaKey) {
        const key = event.key.toLowerCase();
        if (key === 'z' && !event.shiftKey) useDocument.getState().undo();
        else if (key === 'y' || (key === 'z' && event.shiftKey)) useDocument.getState().redo();
        else return;
        event.preventDefault();
        return;
      }
      if (event.altKey || !target.closest('.region-drawing, .region-tape')) return;
      if (caseKey(event) || (target.closest('.region-drawing') && cursorKey(event, target))) event.preventDefault();
    }
    window.addEventListener('keydown', handle);
    return () => {
      stopFollowing();
      window.removeEventListener('keydown', handle);
    };
  }, []);
}
