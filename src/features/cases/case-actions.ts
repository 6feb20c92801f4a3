import { duplicateCase } from '#shared/circuit/edit/cases.ts';
import { asFoundTaken, takeAsFound } from '#shared/circuit/edit/values.ts';
import type { CircuitCase } from '#shared/circuit/schema.ts';
import type { MenuEntry } from '#src/components/lazy-menu.tsx';
import { takeCase } from '#src/stores/apply-value.ts';
import { showDialog } from '#src/stores/dialog-store.ts';
import { useDocument } from '#src/stores/document-store.ts';

/** What may be done with the case on the drawing. */
export function caseActions(entry: CircuitCase, onRename: () => void): readonly MenuEntry[] {
  const { document, edit } = useDocument.getState();
  const first = document.cases[0]?.id === entry.id;
  const full = document.cases.length >= 10;
  return [
    { id: 'rename', label: 'Rename', hint: 'F2', onAction: onRename },
    {
      id: 'duplicate',
      label: 'Duplicate',
      disabled: full,
      onAction: () => void takeCase(duplicateCase(useDocument.getState().document, entry.id)),
    },
    {
      id: 'difference',
      label: 'Difference in words',
      disabled: document.cases.length < 2,
      onAction: () => showDialog({ id: 'difference', caseId: entry.id }),
    },
    { rule: 'one' },
    first
      ? {
          id: 'as-found',
          label: asFoundTaken(document) ? 'Take as found again' : 'Take as found',
          hint: 'marks every screw',
          onAction: () => edit(takeAsFound),
        }
      : { id: 'delete', label: 'Delete\u2026', onAction: () => showDialog({ id: 'delete-case', caseId: entry.id }) },
  ];
}
