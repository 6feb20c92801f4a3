import { create } from 'zustand';

/** Which nameplate is open: a component id, a line id, or one of the plates that belong to the whole circuit. One at a time. */
export type CircuitPlate = 'fluid' | 'supply' | 'duty' | 'requirements';

export interface NameplateState {
  readonly target: string | null;
  open: (target: string) => void;
  close: () => void;
}

export const useNameplate = create<NameplateState>()((set) => ({
  target: null,
  open: (target) => set({ target }),
  close: () => set({ target: null }),
}));

/** Opens a nameplate from anywhere, without subscribing. */
export function openNameplate(target: string | CircuitPlate): void {
  useNameplate.getState().open(target);
}
