import type { CircuitDocument } from '#shared/circuit/schema.ts';
import { useDocument } from './document-store.ts';
import { useRuns } from './run-store.ts';

/** The circuit to which the run on the screen belongs, for pictures that show both: settings change in them together with the traces,
 *  in one drawing. The circuit in hand itself once a new run keeps us waiting, or when cases come or go. */
export function useShownDocument(): CircuitDocument {
  const document = useDocument((state) => state.document);
  const activeCase = useDocument((state) => state.activeCase);
  const former = useRuns((state) => {
    const entry = state.byCase[activeCase];
    return state.due[activeCase] && entry && !entry.stale ? entry.document : null;
  });
  return former && sameCases(former, document) ? former : document;
}

function sameCases(a: CircuitDocument, b: CircuitDocument): boolean {
  return a.cases.length === b.cases.length && a.cases.every((entry, k) => entry.id === b.cases[k]?.id);
}
