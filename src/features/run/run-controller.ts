import type { CircuitDocument } from '#shared/circuit/schema.ts';
import { useDocument } from '#src/stores/document-store.ts';
import { useRuns } from '#src/stores/run-store.ts';
import { chooseInkScale } from './ink-scale.ts';
import { sameCase, samePhysics } from './physics-key.ts';
import { createSeeker } from './seeker.ts';
import { createSimulationClient } from './simulation-client.ts';
import type { SimulationReply } from './worker-messages.ts';

/** Keeps every case's run up to date with the document: the case on the drawing first, then overlaid ones, then the rest.
 *  While a screw is in hand runs are drafts; when it has rested they are repeated at normal tolerance. Traces of the former run stay
 *  (marked stale) until the new one is in. */

const REST = 250;

export function startRunController(): () => void {
  const requests = new Map<string, number>();
  let settled: ReturnType<typeof setTimeout> | undefined;
  const seeker = createSeeker();

  const client = createSimulationClient(receive, (message) => {
    for (const entry of useDocument.getState().document.cases) useRuns.getState().put(entry.id, { state: 'broken', message });
  });

  function receive(reply: SimulationReply) {
    if (reply.type === 'ready') return;
    if (requests.get(reply.caseId) !== reply.request) return;
    const { put } = useRuns.getState();
    switch (reply.type) {
      case 'progress':
        put(reply.caseId, { state: 'running', reached: reply.time });
        return;
      case 'result':
        put(reply.caseId, {
          state: 'done',
          stale: false,
          run: reply.run,
          assessment: reply.extra.assessment,
          curves: reply.extra.curves,
          problems: reply.run.notes,
          reached: reply.run.time,
          message: undefined,
        });
        requests.delete(reply.caseId);
        updateInkScale();
        if (requests.size === 0 && !isTurning()) seeker.start();
        return;
      case 'refused':
        put(reply.caseId, {
          state: 'refused',
          stale: false,
          run: null,
          assessment: null,
          curves: null,
          problems: reply.problems,
        });
        requests.delete(reply.caseId);
        return;
      case 'broken':
        put(reply.caseId, {
          state: 'broken',
          stale: true,
          message: reply.message,
        });
        requests.delete(reply.caseId);
        return;
      case 'cancelled':
        return;
    }
  }

  function isTurning(): boolean {
    return useDocument.getState().gesture !== null;
  }

  function updateInkScale() {
    if (isTurning()) return;
    const { document } = useDocument.getState();
    const { byCase, inkScale, setInkScale } = useRuns.getState();
    const runs = document.cases.map((entry) => byCase[entry.id]?.run).filter((run) => run != null);
    const next = chooseInkScale(document, runs);
    if (next !== inkScale) setInkScale(next);
  }

  function ask(caseIds: readonly string[], draft: boolean) {
    const { document, activeCase, overlays } = useDocument.getState();
    seeker.stop(caseIds);
    const rank = (id: string) => (id === activeCase ? 0 : overlays.includes(id) ? 1 : 2);
    // While a screw is turned only what is on the screen runs; the other cards follow when it rests.
    const order = [...caseIds].filter((id) => !draft || rank(id) < 2).sort((a, b) => rank(a) - rank(b));
    for (const id of caseIds) useRuns.getState().put(id, { stale: true });
    for (const id of order) {
      useRuns.getState().put(id, { state: 'running', reached: 0 });
      requests.set(id, client.run(document, id, draft ? 'draft' : 'normal', false));
    }
  }

  function settle() {
    clearTimeout(settled);
    settled = setTimeout(() => {
      const { document } = useDocument.getState();
      const { byCase } = useRuns.getState();
      const due = document.cases
        .map((entry) => entry.id)
        .filter((id) => (byCase[id]?.stale ?? true) || (byCase[id]?.run?.tolerance ?? 1) > 1.01e-4);
      const open = due.filter((id) => !requests.has(id));
      if (isTurning()) settle();
      else if (open.length > 0) ask(open, false);
      else seeker.start();
    }, REST);
  }

  function changedCases(before: CircuitDocument, after: CircuitDocument): string[] {
    const all = after.cases.map((entry) => entry.id);
    if (!samePhysics(before, after)) return all;
    return after.cases
      .filter(
        (entry) =>
          !sameCase(
            before.cases.find((old) => old.id === entry.id),
            entry,
          ),
      )
      .map((entry) => entry.id);
  }

  const unsubscribe = useDocument.subscribe((state, before) => {
    if (state.document !== before.document) {
      const ids = state.document.cases.map((entry) => entry.id);
      const gone = before.document.cases.map((entry) => entry.id).filter((id) => !ids.includes(id));
      if (gone.length > 0) useRuns.getState().drop(gone);
      const changed = changedCases(before.document, state.document);
      if (changed.length > 0) {
        ask(changed, state.gesture !== null);
        if (state.gesture !== null) settle();
      }
    }
    if (before.gesture !== null && state.gesture === null) settle();
    if (state.activeCase !== before.activeCase || state.overlays !== before.overlays) {
      const { byCase } = useRuns.getState();
      const missing = [state.activeCase, ...state.overlays].filter((id) => (byCase[id]?.stale ?? true) && !requests.has(id));
      if (missing.length > 0) ask(missing, state.gesture !== null);
    }
  });

  ask(
    useDocument.getState().document.cases.map((entry) => entry.id),
    false,
  );

  return () => {
    unsubscribe();
    clearTimeout(settled);
    seeker.stop(null);
    client.close();
  };
}
