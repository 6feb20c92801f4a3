import type { CircuitDocument } from '#shared/circuit/schema.ts';
import { useDocument } from '#src/stores/document-store.ts';
import { type CaseRun, useRuns } from '#src/stores/run-store.ts';
import { chooseInkScale } from './ink-scale.ts';
import { sameCase, samePhysics } from './physics-key.ts';
import { createSeeker } from './seeker.ts';
import { createSimulationClient } from './simulation-client.ts';
import type { SimulationReply } from './worker-messages.ts';

/** Keeps every case's run up to date with the document: the case on the drawing first, then overlaid ones, then the rest.
 *  While a screw is in hand runs are drafts; when it has rested they are repeated at normal tolerance. Traces of the former run stay
 *  until the new one is in, and are marked stale when that takes long enough to be seen. */

const REST = 250;
/** A run that takes longer than this is shown as running, and its former traces as stale. */
const SEEN = 80;
/** A draft in progress is let finish for so long before a newer one takes its place: while a screw is dragged, something must come. */
const PATIENCE = 60;
/** Cases that run together are shown together when they come within so long of each other. */
const TOGETHER = 8;

export function startRunController(): () => void {
  const requests = new Map<string, { readonly request: number; readonly document: CircuitDocument }>();
  /** Drafts in progress: when they were asked for, and whether the circuit has changed since. */
  const drafts = new Map<string, { readonly at: number; outdated: boolean }>();
  const results = new Map<string, Partial<CaseRun>>();
  /** Since when a case has waited for a run. */
  const waiting = new Map<string, number>();
  let settled: ReturnType<typeof setTimeout> | undefined;
  let together: ReturnType<typeof setTimeout> | undefined;
  let seen: ReturnType<typeof setTimeout> | undefined;
  const seeker = createSeeker();

  const client = createSimulationClient(receive, (message) => {
    for (const entry of useDocument.getState().document.cases) useRuns.getState().put(entry.id, { state: 'broken', message });
  });

  function receive(reply: SimulationReply) {
    if (reply.type === 'ready') return;
    const asked = requests.get(reply.caseId);
    if (asked?.request !== reply.request) return;
    const { put } = useRuns.getState();
    switch (reply.type) {
      case 'progress':
        put(reply.caseId, { state: 'running', stale: true, reached: reply.time });
        return;
      case 'result':
        results.set(reply.caseId, {
          state: 'done',
          stale: false,
          run: reply.run,
          document: asked.document,
          assessment: reply.extra.assessment,
          curves: reply.extra.curves,
          problems: reply.run.notes,
          reached: reply.run.time,
          message: undefined,
        });
        requests.delete(reply.caseId);
        askAgain(reply.caseId);
        if ([...drafts.keys()].every((id) => results.has(id))) show();
        else together ??= setTimeout(show, TOGETHER);
        return;
      case 'refused':
        forget(reply.caseId);
        put(reply.caseId, {
          state: 'refused',
          stale: false,
          run: null,
          assessment: null,
          curves: null,
          problems: reply.problems,
        });
        return;
      case 'broken':
        forget(reply.caseId);
        put(reply.caseId, {
          state: 'broken',
          stale: true,
          message: reply.message,
        });
        return;
      case 'cancelled':
        return;
    }
  }

  /** Puts what has come in on the screen, in one change. */
  function show() {
    clearTimeout(together);
    together = undefined;
    const { putAll, markDue } = useRuns.getState();
    const ids = useDocument.getState().document.cases.map((entry) => entry.id);
    const shown = [...results].filter(([caseId]) => ids.includes(caseId));
    results.clear();
    putAll(shown);
    for (const [caseId] of shown) waiting.set(caseId, performance.now());
    const done = shown.map(([caseId]) => caseId).filter((caseId) => !requests.has(caseId));
    for (const caseId of done) waiting.delete(caseId);
    markDue(done, false);
    updateInkScale();
    if (requests.size === 0 && !isTurning()) seeker.start();
  }

  /** Nothing more is to be expected of a case. */
  function forget(caseId: string) {
    for (const list of [requests, drafts, results, waiting]) list.delete(caseId);
    useRuns.getState().markDue([caseId], false);
  }

  /** Asks for the next draft of a case whose screw was turned on while the last one ran. */
  function askAgain(caseId: string) {
    const draft = drafts.get(caseId);
    drafts.delete(caseId);
    if (draft?.outdated) send(caseId, true);
  }

  function send(caseId: string, draft: boolean) {
    const { document } = useDocument.getState();
    if (draft) drafts.set(caseId, { at: performance.now(), outdated: false });
    else drafts.delete(caseId);
    requests.set(caseId, { request: client.run(document, caseId, draft ? 'draft' : 'normal', false), document });
  }

  /** What still runs after a while is shown as running. */
  function showWaiting() {
    seen = undefined;
    const { byCase, putAll } = useRuns.getState();
    const open = [...waiting].filter(([id]) => byCase[id]?.run && !byCase[id]?.stale);
    const before = performance.now() - SEEN + 1;
    const late = open.filter(([, since]) => since <= before);
    if (late.length < open.length) seen = setTimeout(showWaiting, SEEN);
    if (late.length === 0) return;
    putAll(late.map(([id]) => [id, { stale: true, ...(requests.has(id) ? { state: 'running' as const, reached: 0 } : {}) }]));
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
    const { activeCase, overlays } = useDocument.getState();
    seeker.stop(caseIds);
    const rank = (id: string) => (id === activeCase ? 0 : overlays.includes(id) ? 1 : 2);
    // While a screw is turned only what is on the screen runs; the other cards follow when it rests.
    const order = [...caseIds].filter((id) => !draft || rank(id) < 2).sort((a, b) => rank(a) - rank(b));
    const { byCase, markDue, putAll } = useRuns.getState();
    markDue(caseIds, true);
    const first = order.filter((id) => !byCase[id]?.run);
    if (first.length > 0) putAll(first.map((id) => [id, { state: 'running', stale: true, reached: 0 }]));
    for (const id of caseIds) if (!waiting.has(id)) waiting.set(id, performance.now());
    seen ??= setTimeout(showWaiting, SEEN);
    for (const id of order) {
      const running = drafts.get(id);
      if (draft && running && performance.now() - running.at < PATIENCE) running.outdated = true;
      else send(id, draft);
    }
  }

  function settle() {
    clearTimeout(settled);
    settled = setTimeout(() => {
      const { document } = useDocument.getState();
      const { byCase, due } = useRuns.getState();
      const open = document.cases
        .map((entry) => entry.id)
        .filter((id) => !byCase[id] || due[id] || (byCase[id]?.run?.tolerance ?? 1) > 1.01e-4)
        .filter((id) => !requests.has(id));
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
      for (const id of gone) forget(id);
      if (gone.length > 0) useRuns.getState().drop(gone);
      const changed = changedCases(before.document, state.document);
      if (changed.length > 0) {
        ask(changed, state.gesture !== null);
        if (state.gesture !== null) settle();
      }
    }
    if (before.gesture !== null && state.gesture === null) settle();
    if (state.activeCase !== before.activeCase || state.overlays !== before.overlays) {
      const { byCase, due } = useRuns.getState();
      const missing = [state.activeCase, ...state.overlays].filter((id) => (!byCase[id] || due[id]) && !requests.has(id));
      if (missing.length > 0) ask(missing, state.gesture !== null);
    }
  });

  ask(
    useDocument.getState().document.cases.map((entry) => entry.id),
    false,
  );

  return () => {
    unsubscribe();
    for (const timer of [settled, together, seen]) clearTimeout(timer);
    seeker.stop(null);
    client.close();
  };
}
