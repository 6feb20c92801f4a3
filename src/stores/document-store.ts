import { create } from 'zustand';
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

const empty: CircuitDocument = {
  format: 'swashbench-circuit',
  version: 1,
  title: 'Untitled circuit',
  fluid: {
    grade: 'VG 46',
    temperature: 313.15,
    airFraction: 0.005,
    bulkModulus: 1.7e9,
    density: 870,
  },
  reservoir: { volume: 0.12, temperature: 313.15, coolingArea: 1.2 },
  supply: { voltage: 400, frequency: 50, impedance: 0 },
  site: { altitude: 0 },
  components: [],
  lines: [],
  shafts: [],
  duty: { duration: 5, repeat: true, commands: [] },
  requirements: [],
  cases: [{ id: 'a', name: 'As found', ink: 0, changes: [] }],
  tagPlaces: {},
  labels: [],
  notes: [],
};

function keepCases(document: CircuitDocument, activeCase: string, overlays: readonly string[]) {
  const ids = document.cases.map((entry) => entry.id);
  const active = ids.includes(activeCase) ? activeCase : (ids[0] as string);
  return {
    activeCase: active,
    overlays: overlays.filter((id) => ids.includes(id) && id !== active),
  };
}

export const useDocument = create<DocumentState>()((set) => ({
  document: empty,
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
        ...keepCases(document, state.activeCase, state.overlays),
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
      const document = state.past[state.past.length - 1];
      if (!document) return {};
      return {
        document,
        past: state.past.slice(0, -1),
        future: [state.document, ...state.future],
        gesture: null,
        ...keepCases(document, state.activeCase, state.overlays),
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
        ...keepCases(document, state.activeCase, state.overlays),
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
