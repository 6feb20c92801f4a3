import type { CircuitDocument } from '../circuit/schema.ts';
import type { Problem, RunResult, Tolerance } from './result.ts';

/** Messages between a host and its simulation worker. `extra` carries what the host wants computed beside the run
 *  (assessment, load-picture data); simulation knows nothing of it. */
export type ToWorker =
  | {
      readonly type: 'run';
      readonly request: number;
      readonly document: CircuitDocument;
      readonly caseId: string;
      readonly tolerance: Tolerance;
    }
  | { readonly type: 'cancel'; readonly request: number };

export type FromWorker<Extra = unknown> =
  | { readonly type: 'ready' }
  | { readonly type: 'progress'; readonly request: number; readonly caseId: string; readonly time: number; readonly duration: number }
  | { readonly type: 'result'; readonly request: number; readonly caseId: string; readonly run: RunResult; readonly extra: Extra }
  | { readonly type: 'refused'; readonly request: number; readonly caseId: string; readonly problems: readonly Problem[] }
  | { readonly type: 'cancelled'; readonly request: number; readonly caseId: string }
  | { readonly type: 'broken'; readonly request: number; readonly caseId: string; readonly message: string };
