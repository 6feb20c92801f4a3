import { checkDocument } from '#shared/circuit/check-document.ts';
import { demoCircuit } from '#shared/circuit/samples/demo.ts';
import { type Draft, holdDraft, readDraft, writeDraft, writeLastMoment } from '#src/lib/draft.ts';
import { useCursor } from '#src/stores/cursor-store.ts';
import { useDocument } from '#src/stores/document-store.ts';
import { useKeeping } from '#src/stores/keeping-store.ts';

/** An edit is on the device this long after it, at the latest. */
const DELAY = 150;

/** Where the cursor stands when the demo opens [s]: the rod is closing on the bale. */
const DEMO_MOMENT = 3.34;

/** Opens the demo as the first visit does: case B on the drawing, A overlaid. */
export function openDemo(): void {
  const { load, setActiveCase, toggleOverlay } = useDocument.getState();
  load(demoCircuit);
  const [first, second] = demoCircuit.cases;
  if (!first || !second) return;
  setActiveCase(second.id);
  toggleOverlay(first.id);
  useCursor.getState().setTime(DEMO_MOMENT);
}

function restore(draft: Draft): boolean {
  const checked = checkDocument(draft.document);
  if (!checked.ok) {
    useKeeping
      .getState()
      .setNotice(
        'The circuit kept on this device could not be read by this version, so the demo is shown. Nothing is overwritten before the first edit.',
      );
    return false;
  }
  useDocument.getState().load(checked.document);
  const { setActiveCase, toggleOverlay, document } = useDocument.getState();
  const ids = document.cases.map((entry) => entry.id);
  if (ids.includes(draft.activeCase)) setActiveCase(draft.activeCase);
  for (const id of draft.overlays) if (ids.includes(id)) toggleOverlay(id);
  return true;
}

function present(): Draft {
  const { document, activeCase, overlays } = useDocument.getState();
  return { document, activeCase, overlays, savedAt: Date.now() };
}

/** Restores the draft of this device (else the demo), then keeps every edit. Returns a function that stops keeping. */
export function keepDraft(): () => void {
  let mine = false;
  let ready = false;
  let pending: ReturnType<typeof setTimeout> | undefined;
  let stopped = false;
  let last = useDocument.getState();

  async function save() {
    pending = undefined;
    if (!mine) return;
    try {
      await writeDraft(present());
      if (!pending) useKeeping.getState().setKeeping('kept');
    } catch (error) {
      useKeeping.getState().setKeeping('not-kept', error instanceof Error ? error.message : String(error));
    }
  }
  function schedule() {
    if (!mine || !ready || pending !== undefined) return;
    useKeeping.getState().setKeeping('saving');
    pending = setTimeout(() => void save(), DELAY);
  }
  const stopListening = useDocument.subscribe((state) => {
    const changed = state.document !== last.document || state.activeCase !== last.activeCase || state.overlays !== last.overlays;
    last = state;
    if (changed) schedule();
  });
  function putAway() {
    if (mine && ready && pending !== undefined) writeLastMoment(present());
  }
  window.addEventListener('pagehide', putAway);

  const lock = holdDraft((has) => {
    mine = has;
    if (!ready) return;
    useKeeping.getState().setTakeOver(has ? null : lock.takeOver);
    if (has) schedule();
    else useKeeping.getState().setKeeping('other-tab');
  });

  void readDraft()
    .then((draft) => (draft && !stopped ? restore(draft) : false))
    .catch((error: unknown) => {
      useKeeping.getState().setKeeping('not-kept', error instanceof Error ? error.message : String(error));
      return false;
    })
    .then((restored) => {
      if (stopped) return;
      if (!restored) openDemo();
      last = useDocument.getState();
      ready = true;
      const { keeping, setKeeping, setTakeOver } = useKeeping.getState();
      if (keeping === 'loading') setKeeping(mine ? 'kept' : 'other-tab');
      setTakeOver(mine ? null : lock.takeOver);
    });

  return () => {
    stopped = true;
    stopListening();
    window.removeEventListener('pagehide', putAway);
    clearTimeout(pending);
    putAway();
    lock.release();
  };
}
