import { useMemo, useState } from 'react';
import { caseLetter } from '#shared/circuit/edit/cases.ts';
import type { CircuitDocument } from '#shared/circuit/schema.ts';
import { differenceInWords } from '#shared/findings/difference.ts';
import { CaseLetter } from '#src/components/case-letter.tsx';
import { SheetDialog } from '#src/components/dialog.tsx';
import { PhraseText } from '#src/components/quantity.tsx';
import { VerdictChip } from '#src/components/verdict.tsx';
import { useDocument } from '#src/stores/document-store.ts';
import { useRuns } from '#src/stores/run-store.ts';
import type { CaseDialogProps } from './delete-case-dialog.tsx';

/** The difference between two cases in words: what was set differently, and what came of it. */
export function DifferenceDialog({ caseId, onClose }: CaseDialogProps) {
  const document = useDocument((state) => state.document);
  const byCase = useRuns((state) => state.byCase);
  const others = document.cases.filter((entry) => entry.id !== caseId);
  const [from, setFrom] = useState(others[0]?.id ?? caseId);
  const [to, setTo] = useState(caseId);
  const before = byCase[from];
  const after = byCase[to];
  const words = useMemo(
    () =>
      before?.run && before.assessment && after?.run && after.assessment
        ? differenceInWords(document, from, to, before.run, after.run, before.assessment, after.assessment)
        : null,
    [document, from, to, before, after],
  );
  return (
    <SheetDialog title="Difference in words" onClose={onClose}>
      <div className="difference-pair">
        <CaseChoice document={document} label="From case" value={from} onChange={setFrom} />
        <VerdictChip verdict={byCase[from]?.assessment?.verdict ?? null} />
        <CaseChoice document={document} label="to case" value={to} onChange={setTo} />
        <VerdictChip verdict={byCase[to]?.assessment?.verdict ?? null} />
      </div>
      {from === to && <p>Choose two different cases.</p>}
      {from !== to && !words && <p role="status">Both cases must have been run first.</p>}
      {from !== to && words && (
        <ul className="word-list">
          {words.map((phrase, index) => (
            <li key={`${String(index)}`}>
              <PhraseText phrase={phrase} />
            </li>
          ))}
        </ul>
      )}
    </SheetDialog>
  );
}

interface CaseChoiceProps {
  readonly document: CircuitDocument;
  readonly label: string;
  readonly value: string;
  readonly onChange: (caseId: string) => void;
}

function CaseChoice({ document, label, value, onChange }: CaseChoiceProps) {
  const chosen = document.cases.find((entry) => entry.id === value);
  return (
    <label className="setting-row">
      <span>{label}</span>
      {chosen && <CaseLetter letter={caseLetter(chosen)} ink={chosen.ink} />}
      <select className="select" value={value} onChange={(event) => onChange(event.target.value)}>
        {document.cases.map((entry) => (
          <option key={entry.id} value={entry.id}>
            {caseLetter(entry)}, {entry.name}
          </option>
        ))}
      </select>
    </label>
  );
}
