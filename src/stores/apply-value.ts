import { setValue, type ValueEdit } from '#shared/circuit/edit/values.ts';
import type { CircuitDocument } from '#shared/circuit/schema.ts';
import { useDocument } from './document-store.ts';

/** Takes an edit that may have made a case of its own: the new case goes on the drawing, the former one is overlaid. */
export function takeEdit(result: ValueEdit): ValueEdit['refused'] {
  if (result.refused) return result.refused;
  const { activeCase, edit, setActiveCase, toggleOverlay } = useDocument.getState();
  edit(() => result.document);
  if (result.caseId !== activeCase) {
    setActiveCase(result.caseId);
    if (!useDocument.getState().overlays.includes(activeCase)) toggleOverlay(activeCase);
  }
  return undefined;
}

/** Sets one value in the case on the drawing. @returns why it was refused, or undefined. */
export function applyValue(target: string, field: string, value: number | string, typed?: string): ValueEdit['refused'] {
  const { document, activeCase } = useDocument.getState();
  return takeEdit(setValue(document, activeCase, target, field, value, typed));
}

/** Adds a case and puts it on the drawing with the former one overlaid. */
export function takeCase(made: { readonly document: CircuitDocument; readonly caseId: string | null }): boolean {
  if (!made.caseId) return false;
  takeEdit({ document: made.document, caseId: made.caseId });
  return true;
}
