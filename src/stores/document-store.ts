import { create } from 'zustand';
import { emptyCircuit } from '#shared/circuit/edit/empty-circuit.ts';
import type { CircuitDocument } from '#shared/circuit/schema.ts';

/** The circuit in hand and its history. Documents are immutable: every edit makes a new one through a pure function of
 *  shared/circuit. One edit = one undo step; `beginGesture` … `endGesture` makes everything between them one step. */
export interface DocumentState {
  readonly document: CircuitDocument;
  /** Case on the drawing. */
  readonly activeCase: string;
  /** Overlaid cases, without the active one; at most three. */
  readonly overlays: readonly string[];
  /** Ids of selected components, lines, notes, labels. */
  readonly selection: readonly string[];
  /** Address 'component.screw' or 'supply.voltage' of the tag in hand. */
  readonly inHand: string | null;
  readonly past: readonly CircuitDocument[];
  readonly future: readonly CircuitDocument[];
  /** Document before the gesture in progress. */
  readonly gesture: CircuitDocument | null;
  load: (document: CircuitDocument) => void;
  edit: (change: (document: CircuitDocument) => CircuitDocument) => void;
  beginGesture: () => void;
  endGesture: () => void;
  undo: () => void;
  redo: () => void;
  setActiveCase: (caseId: string) => void;
  toggleOverlay: (caseId: string) => void;
  select: (ids: readonly string[]) => void;
  takeInHand: (address: string | null) => void;
}

const HISTORY = 200;

/** What of the view still exists in a document: the case on the drawing, the overlays, the selection, the tag in hand. */
function keepView(document: CircuitDocument, state: Pick<DocumentState, 'activeCase' | 'overlays' | 'selection' | 'inHand'>) {
  const ids = document.cases.map((entry) => entry.id);
  const active = ids.includes(state.activeCase) ? state.activeCase : (ids[0] as string);
  const lists = [document.components, document.lines, document.notes, document.labels];
  const gone = state.selection.some((id) => lists.every((list) => list.every((entry) => entry.id !== id)));
  const held = state.inHand?.split('.')[0];
  const holds = held === undefined || held === 'supply' || document.components.some((entry) => entry.id === held);
  return {
    inHand: holds ? state.inHand : null,
    activeCase: active,
    overlays: state.overlays.filter((id) => ids.includes(id) && id !== active),
    selection: gone ? state.selection.filter((id) => lists.some((list) => list.some((entry) => entry.id === id))) : state.selection,
  };
}

export const useDocument = create<DocumentState>()((set) => ({
  document: emptyCircuit(),
  activeCase: 'a',
  overlays: [],
  selection: [],
  inHand: null,
  past: [],
  future: [],
  gesture: null,
  load: (document) =>
    set({
      document,
      activeCase: (document.cases[0] as { id: string }).id,
      overlays: [],
      selection: [],
      inHand: null,
      past: [],
      future: [],
      gesture: null,
    }),
  edit: (change) =>
    set((state) => {
      const document = change(state.document);
      if (document === state.document) return {};
      const past = state.gesture ? state.past : [...state.past, state.document].slice(-HISTORY);
      return {
        document,
        past,
        future: [],
        ...keepView(document, state),
      };
    }),
  beginGesture: () => set((state) => (state.gesture ? {} : { gesture: state.document })),
  endGesture: () =>
    set((state) => {
      if (!state.gesture) return {};
      const changed = state.gesture !== state.document;
      return {
        gesture: null,
        past: changed ? [...state.past, state.gesture].slice(-HISTORY) : state.past,
      };
    }),
  undo: () =>
    set((state) => {
      // A gesture in progress is a step of its own: undoing it goes back to where it began.
      const begun = state.gesture !== null && state.gesture !== state.document ? state.gesture : null;
      const document = begun ?? state.past[state.past.length - 1];
      if (!document) return {};
      return {
        document,
        past: begun ? state.past : state.past.slice(0, -1),
        future: [state.document, ...state.future],
        gesture: null,
        ...keepView(document, state),
      };
    }),
  redo: () =>
    set((state) => {
      const document = state.future[0];
      if (!document) return {};
      return {
        document,
        past: [...state.past, state.document],
        future: state.future.slice(1),
        gesture: null,
        ...keepView(document, state),
      };
    }),
  setActiveCase: (caseId) =>
    set((state) => {
      if (caseId === state.activeCase) return {};
      const overlays = state.overlays.filter((id) => id !== caseId);
      return { activeCase: caseId, overlays };
    }),
  toggleOverlay: (caseId) =>
    set((state) => {
      if (caseId === state.activeCase) return {};
      if (state.overlays.includes(caseId)) return { overlays: state.overlays.filter((id) => id !== caseId) };
      return { overlays: [...state.overlays, caseId].slice(-3) };
    }),
  select: (selection) => set({ selection }),
  takeInHand: (inHand) => set({ inHand }),
}));
