import { create } from 'zustand';

/** The moment that every reading on the screen shows, and playback. */
export interface CursorState {
  /** Time on the tape [s]. */
  time: number;
  playing: boolean;
  /** Playback speed: 0.25, 1 or 4. */
  speed: number;
  setTime: (time: number) => void;
  setPlaying: (playing: boolean) => void;
  setSpeed: (speed: number) => void;
}

export const useCursor = create<CursorState>()((set) => ({
  time: 0,
  playing: false,
  speed: 1,
  setTime: (time) => set({ time: Math.max(0, time) }),
  setPlaying: (playing) => set({ playing }),
  setSpeed: (speed) => set({ speed }),
}));
