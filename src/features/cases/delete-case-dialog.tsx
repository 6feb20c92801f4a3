import { caseLetter, deleteCase } from '#shared/circuit/edit/cases.ts';
import { SheetDialog } from '#src/components/dialog.tsx';
import { useDocument } from '#src/stores/document-store.ts';
import { ChangeWords } from './change-words.tsx';

export interface CaseDialogProps {
  readonly caseId: string;
  readonly onClose: () => void;
}

/** Names what goes with a case before it goes; undo brings it back. */
export function DeleteCaseDialog({ caseId, onClose }: CaseDialogProps) {
  const document = useDocument((state) => state.document);
  const entry = document.cases.find((candidate) => candidate.id === caseId);
  if (!entry) return null;
  return (
    <SheetDialog
      title={`Delete case ${caseLetter(entry)}, ${entry.name}?`}
      onClose={onClose}
      foot={
        <>
          <button type="button" className="button" onClick={onClose}>
            Keep it
          </button>
          <button
            type="button"
            className="button-primary"
            onClick={() => {
              useDocument.getState().edit((present) => deleteCase(present, caseId));
              onClose();
            }}
          >
            Delete case {caseLetter(entry)}
          </button>
        </>
      }
    >
      {entry.changes.length === 0 ? (
        <p>It changes nothing against case A. Undo brings it back.</p>
      ) : (
        <>
          <p>
            {entry.changes.length === 1 ? 'This change goes with it' : `These ${entry.changes.length} changes go with it`}. Undo brings it
            back.
          </p>
          <ul className="word-list">
            {entry.changes.map((change) => (
              <li key={`${change.target}.${change.field}`}>
                <ChangeWords document={document} change={change} />
              </li>
            ))}
          </ul>
        </>
      )}
    </SheetDialog>
  );
}
