import { create } from 'zustand';

/** What a person chose to watch on this tape, for as long as the page is open. */
interface LaneChoice {
  /** Addresses of chosen lanes; null = the default lanes of the circuit. */
  readonly chosen: readonly string[] | null;
  /** Address of the lane in focus where several cases share one big lane. */
  readonly focus: string | null;
  setChosen: (chosen: readonly string[] | null) => void;
  setFocus: (focus: string) => void;
}

export const useLaneChoice = create<LaneChoice>()((set) => ({
  chosen: null,
  focus: null,
  setChosen: (chosen) => set({ chosen }),
  setFocus: (focus) => set({ focus }),
}));
