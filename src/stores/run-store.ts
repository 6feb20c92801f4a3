import { create } from 'zustand';
import type { Assessment, Finding, SeekResult } from '#shared/findings/finding.ts';
import type { LoadCurves } from '#shared/findings/load-curves.ts';
import type { Problem, RunResult } from '#shared/simulation/result.ts';

/** The latest run of each case. Only features/run writes here; everything else reads. */
export interface CaseRun {
  readonly state: 'waiting' | 'running' | 'done' | 'refused' | 'broken';
  /** True from an edit until the new run is in: the old traces stay at 40 %. */
  readonly stale: boolean;
  readonly run: RunResult | null;
  readonly assessment: Assessment | null;
  readonly curves: LoadCurves | null;
  readonly problems: readonly Problem[];
  /** Time reached while running [s]. */
  readonly reached: number;
  readonly message?: string;
}

export interface RunState {
  readonly byCase: Readonly<Record<string, CaseRun>>;
  /** Remedies sought by running, by `remedyKey(finding)`. 'seeking' = "finding the setting". */
  readonly remedies: Readonly<Record<string, SeekResult | 'seeking'>>;
  /** Pressure scale of the ink [Pa], the same for all cases, frozen while a screw is in hand. */
  readonly inkScale: number;
  put: (caseId: string, patch: Partial<CaseRun>) => void;
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
  assessment: null,
  curves: null,
  problems: [],
  reached: 0,
};

export const useRuns = create<RunState>()((set) => ({
  byCase: {},
  remedies: {},
  inkScale: 250e5,
  put: (caseId, patch) =>
    set((state) => ({
      byCase: {
        ...state.byCase,
        [caseId]: { ...(state.byCase[caseId] ?? fresh), ...patch },
      },
    })),
  drop: (caseIds) =>
    set((state) => {
      const byCase = { ...state.byCase };
      for (const caseId of caseIds) delete byCase[caseId];
      return { byCase };
    }),
  putRemedy: (key, result) =>
    set((state) => {
      const remedies = { ...state.remedies };
      if (result === null) delete remedies[key];
      else remedies[key] = result;
      return { remedies };
    }),
  dropRemedies: (caseIds) =>
    set((state) => ({
      remedies: Object.fromEntries(
        Object.entries(state.remedies).filter(([key]) => !caseIds.some((caseId) => key.startsWith(`${caseId}/`))),
      ),
    })),
  setInkScale: (inkScale) => set({ inkScale }),
}));
