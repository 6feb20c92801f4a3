import { create } from 'zustand';
import type { Issue } from '#shared/circuit/issue.ts';

/** The one dialog that is open, if any. */
export type OpenDialog =
  | { readonly id: 'units' | 'keys' | 'about' | 'new' }
  | { readonly id: 'difference'; readonly caseId: string }
  | { readonly id: 'delete-case'; readonly caseId: string }
  | { readonly id: 'refused-file'; readonly file: string; readonly issues: readonly Issue[] };

export interface DialogState {
  readonly dialog: OpenDialog | null;
  show: (dialog: OpenDialog) => void;
  close: () => void;
}

export const useDialog = create<DialogState>()((set) => ({
  dialog: null,
  show: (dialog) => set({ dialog }),
  close: () => set({ dialog: null }),
}));

export function showDialog(dialog: OpenDialog): void {
  useDialog.getState().show(dialog);
}
