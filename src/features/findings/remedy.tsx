import { addCase, caseLetter } from '#shared/circuit/edit/cases.ts';
import { setValue } from '#shared/circuit/edit/values.ts';
import { effectiveValue } from '#shared/circuit/effective.ts';
import type { CaseChange, CircuitDocument } from '#shared/circuit/schema.ts';
import type { Finding } from '#shared/findings/finding.ts';
import { PhraseText } from '#src/components/quantity.tsx';
import { takeCase } from '#src/stores/apply-value.ts';
import { useDocument } from '#src/stores/document-store.ts';
import { remedyKey, useRuns } from '#src/stores/run-store.ts';

/** What would change it: words, then the setting found by running. */
export function RemedyWords({ finding }: { readonly finding: Finding }) {
  const result = useRuns((state) => state.remedies[remedyKey(finding)]);
  const { remedy } = finding;
  if (!remedy) return null;
  return (
    <>
      {' '}
      <PhraseText phrase={remedy.words} caseId={finding.caseId} />
      {remedy.seek && (result === undefined || result === 'seeking') && <span className="seeking"> Finding the setting</span>}
      {result !== undefined && result !== 'seeking' && (
        <>
          {' '}
          <PhraseText phrase={result.words} caseId={finding.caseId} />
        </>
      )}
    </>
  );
}

/** Case that already holds what the remedy asks for, other than the finding's own: "Tried as case B". A value counts as tried
 *  when it lies on the found one or beyond it, on the side away from the finding's own. */
function triedAs(document: CircuitDocument, finding: Finding, change: CaseChange) {
  const own = effectiveValue(document, finding.caseId, change.target, change.field);
  return document.cases.find((entry) => {
    if (entry.id === finding.caseId) return false;
    const value = effectiveValue(document, entry.id, change.target, change.field);
    if (typeof value !== 'number' || typeof change.value !== 'number' || typeof own !== 'number') return value === change.value;
    const reach = 1e-6 * Math.abs(change.value);
    return change.value < own ? value <= change.value + reach : value >= change.value - reach;
  });
}

/** One primary action: the found setting as a new case, or the word that it has been tried. */
export function RemedyAction({ finding }: { readonly finding: Finding }) {
  const result = useRuns((state) => state.remedies[remedyKey(finding)]);
  const document = useDocument((state) => state.document);
  if (!result || result === 'seeking' || !result.found || !result.change) return null;
  const { change } = result;
  const tried = triedAs(document, finding, change);
  if (tried) {
    return (
      <button type="button" className="tried" onClick={() => useDocument.getState().setActiveCase(tried.id)}>
        Tried as case {caseLetter(tried)}
      </button>
    );
  }
  const full = document.cases.length >= 10;
  return (
    <button
      type="button"
      className="button-primary"
      disabled={full}
      title={full ? 'Ten cases at most' : undefined}
      onClick={() => {
        const made = addCase(useDocument.getState().document, finding.caseId);
        if (!made.caseId) return;
        const set = setValue(made.document, made.caseId, change.target, change.field, change.value, change.typed);
        if (!set.refused) takeCase({ document: set.document, caseId: made.caseId });
      }}
    >
      Try it as a new case
    </button>
  );
}
