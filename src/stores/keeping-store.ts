import { create } from 'zustand';

/** Where the circuit in hand is kept, for the word beside the title. */
export type Keeping = 'loading' | 'kept' | 'saving' | 'other-tab' | 'not-kept';

export interface KeepingState {
  readonly keeping: Keeping;
  /** Why it is not kept, in words. */
  readonly reason: string | null;
  /** One sentence above the sheet that can be put away: an unreadable draft, a refused file. */
  readonly notice: string | null;
  /** What can be done about the notice, as a button beside it. */
  readonly cure: { readonly label: string; readonly act: () => void } | null;
  /** Takes the keeping over from another tab; null while this tab has it. */
  readonly takeOver: (() => void) | null;
  /** Opens what another tab kept, when both tabs have changed the circuit. */
  readonly openOther: (() => void) | null;
  setKeeping: (keeping: Keeping, reason?: string) => void;
  setNotice: (notice: string | null, cure?: KeepingState['cure']) => void;
  setTakeOver: (takeOver: (() => void) | null) => void;
  setOpenOther: (openOther: (() => void) | null) => void;
}

export const useKeeping = create<KeepingState>()((set) => ({
  keeping: 'loading',
  reason: null,
  notice: null,
  cure: null,
  takeOver: null,
  openOther: null,
  setKeeping: (keeping, reason) => set({ keeping, reason: reason ?? null }),
  setNotice: (notice, cure) => set({ notice, cure: cure ?? null }),
  setTakeOver: (takeOver) => set({ takeOver }),
  setOpenOther: (openOther) => set({ openOther }),
}));

export const keepingWords: Record<Keeping, string> = {
  loading: 'opening\u2026',
  kept: 'kept on this device',
  saving: 'kept on this device',
  'other-tab': 'not kept here',
  'not-kept': 'not kept: this device offers no storage',
};
