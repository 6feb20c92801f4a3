import { useDocument } from '#src/stores/document-store.ts';
import { remedyKey, useRuns } from '#src/stores/run-store.ts';
import type { SeekReply, SeekRequest } from './seek.worker.ts';

/** Finds the figures of remedies in a second worker once nothing moves any more; any edit of the case stops it. */
export interface Seeker {
  start: () => void;
  /** Forgets what was found for these cases and stops the search in hand (null: everything). */
  stop: (caseIds: readonly string[] | null) => void;
}

export function createSeeker(): Seeker {
  let worker: Worker | null = null;
  let current: SeekRequest | null = null;

  function next() {
    const { document, activeCase, overlays } = useDocument.getState();
    const { byCase, due, remedies, putRemedy } = useRuns.getState();
    for (const caseId of [activeCase, ...overlays]) {
      const entry = byCase[caseId];
      if (!entry?.assessment || entry.stale || due[caseId]) continue;
      for (const finding of entry.assessment.findings) {
        const key = remedyKey(finding);
        if (!finding.remedy?.seek || remedies[key] !== undefined) continue;
        putRemedy(key, 'seeking');
        current = { document, caseId, finding };
        if (!worker) worker = open();
        worker.postMessage(current);
        return;
      }
    }
  }

  function open(): Worker {
    const made = new Worker(new URL('./seek.worker.ts', import.meta.url), {
      type: 'module',
    });
    made.onmessage = (event: MessageEvent<SeekReply>) => {
      const asked = current;
      current = null;
      if (asked && asked.finding.id === event.data.findingId && asked.caseId === event.data.caseId)
        useRuns.getState().putRemedy(remedyKey(asked.finding), event.data.result);
      next();
    };
    made.onerror = (event) => {
      if (current)
        useRuns.getState().putRemedy(remedyKey(current.finding), {
          found: false,
          words: [`The setting could not be sought: ${event.message}`],
          runs: 0,
        });
      current = null;
    };
    return made;
  }

  return {
    start: () => {
      if (!current) next();
    },
    stop: (caseIds) => {
      if (caseIds === null || (current && caseIds.includes(current.caseId))) {
        worker?.terminate();
        worker = null;
        if (current) useRuns.getState().putRemedy(remedyKey(current.finding), null);
        current = null;
      }
      if (caseIds) useRuns.getState().dropRemedies(caseIds);
    },
  };
}
