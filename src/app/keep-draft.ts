import { checkDocument } from '#shared/circuit/check-document.ts';
import { demoCircuit } from '#shared/circuit/samples/demo.ts';
import type { CircuitDocument } from '#shared/circuit/schema.ts';
import { type Draft, holdDraft, putAside, readDraft, writeDraft, writeLastMoment } from '#src/lib/draft.ts';
import { saveFile } from '#src/lib/save-file.ts';
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
    void putAside(draft).catch(() => undefined);
    useKeeping
      .getState()
      .setNotice('The circuit kept on this device could not be read by this version, so the demo is shown. It is put aside, not deleted.', {
        label: 'Save it as a file',
        act: () => saveFile('unreadable-circuit.json', JSON.stringify(draft.document, null, 2), 'application/json'),
      });
    return false;
  }
  useDocument.getState().load(checked.document);
  const { setActiveCase, toggleOverlay, document } = useDocument.getState();
  const ids = document.cases.map((entry) => entry.id);
  if (ids.includes(draft.activeCase)) setActiveCase(draft.activeCase);
  for (const id of draft.overlays) if (ids.includes(id)) toggleOverlay(id);
  return true;
}

function present(): Draft & { readonly document: CircuitDocument } {
  const { document, activeCase, overlays } = useDocument.getState();
  return { document, activeCase, overlays, savedAt: Date.now() };
}

/** Restores the draft of this device (else the demo), then keeps every edit. Returns a function that stops keeping. */
export function keepDraft(): () => void {
  let mine = false;
  let ready = false;
  let stopped = false;
  let pending: ReturnType<typeof setTimeout> | undefined;
  /** What this tab last kept or opened, and when. */
  let keptDocument: CircuitDocument | null = null;
  let keptAt = 0;
  let last = useDocument.getState();
  const { setKeeping, setTakeOver, setOpenOther, setNotice } = useKeeping.getState();

  function refused(error: unknown) {
    setKeeping('not-kept', error instanceof Error ? error.message : String(error));
  }
  async function save() {
    pending = undefined;
    if (!mine || stopped) return;
    const draft = present();
    try {
      await writeDraft(draft);
      keptDocument = draft.document;
      keptAt = draft.savedAt;
      if (!pending) setKeeping('kept');
    } catch (error) {
      refused(error);
    }
  }
  function schedule() {
    if (!mine || !ready || pending !== undefined) return;
    setKeeping('saving');
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

  function take(draft: Draft) {
    ready = false;
    restore(draft);
    last = useDocument.getState();
    keptDocument = last.document;
    keptAt = draft.savedAt;
    ready = true;
  }
  function settle() {
    setTakeOver(null);
    setOpenOther(null);
    schedule();
  }
  /** This tab may keep again. What another tab has kept meanwhile is never overwritten in silence: it is opened here when
   *  nothing was changed here, else the person chooses. */
  async function regain() {
    const draft = await readDraft().catch(() => null);
    if (!mine || stopped) return;
    if (!draft || draft.savedAt <= keptAt) return settle();
    if (useDocument.getState().document === keptDocument) {
      take(draft);
      setNotice('The circuit as the other tab kept it is in hand now.');
      return settle();
    }
    mine = false;
    setKeeping('other-tab');
    setTakeOver(() => {
      mine = true;
      settle();
    });
    setOpenOther(() => {
      mine = true;
      take(draft);
      settle();
    });
  }
  const lock = holdDraft((has) => {
    const before = mine;
    mine = has;
    if (!ready) return;
    if (has && !before) void regain();
    else if (!has) {
      setKeeping('other-tab');
      setTakeOver(() => {
        keptAt = Number.POSITIVE_INFINITY;
        lock.takeOver();
      });
    }
  });

  /** What a quick hand has begun before the draft was read; it goes on top of the draft, so that undo leads back to that. */
  const blank = last.document;
  let begun: Pick<typeof last, 'document' | 'activeCase' | 'overlays'> | null = null;
  function goOn() {
    if (!begun) return;
    const { document, activeCase, overlays } = begun;
    const { edit, setActiveCase, toggleOverlay } = useDocument.getState();
    edit(() => document);
    setActiveCase(activeCase);
    for (const id of useDocument.getState().overlays.filter((entry) => !overlays.includes(entry))) toggleOverlay(id);
    for (const id of overlays) if (!useDocument.getState().overlays.includes(id)) toggleOverlay(id);
  }

  void readDraft()
    .then((draft) => {
      const state = useDocument.getState();
      if (state.document !== blank) begun = state;
      if (!draft || stopped || !restore(draft)) return false;
      keptAt = draft.savedAt;
      return true;
    })
    .catch((error: unknown) => {
      refused(error);
      return false;
    })
    .then((restored) => {
      if (stopped) return;
      if (!restored) openDemo();
      last = useDocument.getState();
      keptDocument = last.document;
      ready = true;
      if (useKeeping.getState().keeping === 'loading') setKeeping(mine ? 'kept' : 'other-tab');
      setTakeOver(mine ? null : lock.takeOver);
      goOn();
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
