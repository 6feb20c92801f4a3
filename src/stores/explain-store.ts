import { create } from 'zustand';

/** "How is this computed?": what is being explained. Addresses:
 *  'component.reading', 'component.port.pressure', 'component.port.flow', 'line.<id>.flow', 'component.parameter',
 *  'supply.voltage' (and fluid, reservoir, site), 'verdict', 'finding.<finding id>', 'yardstick.<motor>.<name>'
 *  with name 'stall-margin' | 'rms-current' | 'peak-torque'. */
export interface ExplainState {
  readonly address: string | null;
  /** Case it belongs to; null = the case on the drawing. */
  readonly caseId: string | null;
  explain: (address: string, caseId?: string) => void;
  close: () => void;
}

export const useExplain = create<ExplainState>()((set) => ({
  address: null,
  caseId: null,
  explain: (address, caseId) => set({ address, caseId: caseId ?? null }),
  close: () => set({ address: null, caseId: null }),
}));

/** Opens the explanation from anywhere, without subscribing. */
export function explain(address: string, caseId?: string): void {
  useExplain.getState().explain(address, caseId);
}
