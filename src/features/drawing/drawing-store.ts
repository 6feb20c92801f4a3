import { create } from 'zustand';
import type { Clip } from '#shared/circuit/edit/copy.ts';
import type { PortRef } from '#shared/circuit/schema.ts';

/** What is open, in hand or said on the Draw stage; nothing of it is part of the circuit. */
export interface DrawingState {
  /** Port whose strip is open, and which list it shows. */
  readonly strip: { readonly ref: PortRef; readonly list: 'next' | 'all' | 'join' } | null;
  /** Kind that the strip highlights: drawn pale at its place. */
  readonly preview: string | null;
  /** Port from which a line is being dragged. */
  readonly joinFrom: PortRef | null;
  /** Kind pressed in the drawer, waiting for a press on the sheet. */
  readonly placing: string | null;
  /** What a deletion would take along, waiting for a yes. */
  readonly deletion: { readonly ids: readonly string[]; readonly what: string; readonly along: readonly string[] } | null;
  /** Note or label being written. */
  readonly writing: string | null;
  readonly clip: Clip | null;
  /** Number of pastes of the present clip, so that copies do not cover each other. */
  readonly pasted: number;
  /** Last thing done, for the line above the sheet and for screen readers. */
  readonly said: string;
  /** What shall take the focus once it is on the sheet: 'part <id>' or 'port <component>.<port>'. */
  readonly focus: string | null;
  set: (patch: Partial<Omit<DrawingState, 'set'>>) => void;
}

export const useDrawing = create<DrawingState>()((set) => ({
  strip: null,
  preview: null,
  joinFrom: null,
  placing: null,
  deletion: null,
  writing: null,
  clip: null,
  pasted: 0,
  said: '',
  focus: null,
  set: (patch) => set(patch),
}));

export function say(said: string): void {
  useDrawing.getState().set({ said });
}

export function partFocus(id: string): string {
  return `part ${id}`;
}

export function portFocus(ref: PortRef): string {
  return `port ${ref.component}.${ref.port}`;
}

/** Opens the strip at a port; the preview begins with the likeliest part once the strip is drawn. */
export function openStrip(ref: PortRef, list: 'next' | 'all' | 'join' = 'next'): void {
  const plain = { component: ref.component, port: ref.port };
  useDrawing.getState().set({ strip: { ref: plain, list }, preview: null, placing: null, deletion: null });
}

/** Closes the strip and, unless something else takes it, gives the focus back to its ring. */
export function closeStrip(refocus = true): void {
  const { strip, set } = useDrawing.getState();
  if (strip) set({ strip: null, preview: null, focus: refocus ? portFocus(strip.ref) : null });
}
