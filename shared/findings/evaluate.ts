import type { CircuitDocument } from '../circuit/schema.ts';
import { compileCircuit } from '../simulation/compile.ts';
import type { Problem, RunResult } from '../simulation/result.ts';
import { runSimulation } from '../simulation/run.ts';
import { assessRun } from './assess.ts';
import type { Assessment } from './finding.ts';
import { type LoadCurves, loadCurves } from './load-curves.ts';

/** One case from document to verdict: what every host (browser worker, server thread, command line) calls. */
export interface CaseEvaluation {
  readonly run: RunResult;
  readonly assessment: Assessment;
  readonly curves: LoadCurves | null;
}
export type EvaluationOutcome =
  | { readonly ok: true; readonly evaluation: CaseEvaluation }
  | { readonly ok: false; readonly problems: readonly Problem[] };

/** Compiles, runs and assesses one case. Yields the time reached [s] every few steps, so that the host can look at its
 *  clock, report progress and cancel by simply not asking for more.
 *  @param rtol relative tolerance of the run (1e-3 draft, 1e-4 normal, 1e-6 fine). */
export function* evaluateCase(document: CircuitDocument, caseId: string, rtol: number): Generator<{ time: number }, EvaluationOutcome> {
  const compiled = compileCircuit(document, caseId);
  if (!compiled.ok) return { ok: false, problems: compiled.problems };
  const run = yield* runSimulation(compiled.circuit, { tolerance: rtol });
  const assessment = assessRun(document, caseId, compiled.circuit, run);
  return {
    ok: true,
    evaluation: {
      run,
      assessment,
      curves: loadCurves(document, caseId, compiled.circuit, run),
    },
  };
}

/** The same without pauses. */
export function evaluateToEnd(document: CircuitDocument, caseId: string, rtol: number): EvaluationOutcome {
  const steps = evaluateCase(document, caseId, rtol);
  for (;;) {
    const next = steps.next();
    if (next.done) return next.value;
  }
}
