import { create } from 'zustand';
import type { CircuitDocument } from '#shared/circuit/schema.ts';
import type { Assessment, Finding, SeekResult } from '#shared/findings/finding.ts';
import type { LoadCurves } from '#shared/findings/load-curves.ts';
import type { Problem, RunResult } from '#shared/simulation/result.ts';

/** The latest run of each case. Only features/run writes here; everything else reads. */
export interface CaseRun {
  readonly state: 'waiting' | 'running' | 'done' | 'refused' | 'broken';
  /** True while the run shown is of a former circuit and the new one keeps us waiting: the old traces stay at 40 %. A new run that is
   *  in before anyone could see the change replaces the old one without it. */
  readonly stale: boolean;
  readonly run: RunResult | null;
  /** The circuit that was run. */
  readonly document: CircuitDocument | null;
  readonly assessment: Assessment | null;
  readonly curves: LoadCurves | null;
  readonly problems: readonly Problem[];
  /** Time reached while running [s]. */
  readonly reached: number;
  readonly message?: string;
}

export interface RunState {
  readonly byCase: Readonly<Record<string, CaseRun>>;
  /** Cases whose run is of a former circuit: from the edit on, until the new run is in. */
  readonly due: Readonly<Record<string, true>>;
  /** Remedies sought by running, by `remedyKey(finding)`. 'seeking' = "finding the setting". */
  readonly remedies: Readonly<Record<string, SeekResult | 'seeking'>>;
  /** Pressure scale of the ink [Pa], the same for all cases, frozen while a screw is in hand. */
  readonly inkScale: number;
  put: (caseId: string, patch: Partial<CaseRun>) => void;
  /** Several cases in one change. */
  putAll: (patches: readonly (readonly [caseId: string, patch: Partial<CaseRun>])[]) => void;
  markDue: (caseIds: readonly string[], due: boolean) => void;
  drop: (caseIds: readonly string[]) => void;
  putRemedy: (key: string, result: SeekResult | 'seeking' | null) => void;
  /** Forgets the remedies of these cases. */
  dropRemedies: (caseIds: readonly string[]) => void;
  setInkScale: (pascal: number) => void;
}

/** Key of a finding's remedy: findings of two cases may have the same id. */
export function remedyKey(finding: Finding): string {
  return `${finding.caseId}/${finding.id}`;
}

const fresh: CaseRun = {
  state: 'waiting',
  stale: false,
  run: null,
  document: null,
  assessment: null,
  curves: null,
  problems: [],
  reached: 0,
};

export const useRuns = create<RunState>()((set, get) => ({
  byCase: {},
  due: {},
  remedies: {},
  inkScale: 250e5,
  put: (caseId, patch) => get().putAll([[caseId, patch]]),
  putAll: (patches) =>
    set((state) => {
      const byCase = { ...state.byCase };
      for (const [caseId, patch] of patches) byCase[caseId] = { ...(byCase[caseId] ?? fresh), ...patch };
      return { byCase };
    }),
  markDue: (caseIds, due) =>
    set((state) => {
      if (caseIds.every((caseId) => (state.due[caseId] ?? false) === due)) return state;
      const next = { ...state.due };
      for (const caseId of caseIds) {
        if (due) next[caseId] = true;
        else delete next[caseId];
      }
      return { due: next };
    }),
  drop: (caseIds) =>
    set((state) => {
      const byCase = { ...state.byCase };
      const due = { ...state.due };
      for (const caseId of caseIds) {
        delete byCase[caseId];
        delete due[caseId];
      }
      return { byCase, due };
    }),
  putRemedy: (key, result) =>
    set((state) => {
      const remedies = { ...state.remedies };
      if (result === null) delete remedies[key];
      else remedies[key] = result;
      return { remedies };
    }),
  dropRemedies: (caseIds) =>
    set((state) => {
      const all = Object.entries(state.remedies);
      const kept = all.filter(([key]) => !caseIds.some((caseId) => key.startsWith(`${caseId}/`)));
      return kept.length === all.length ? state : { remedies: Object.fromEntries(kept) };
    }),
  setInkScale: (inkScale) => set({ inkScale }),
}));
