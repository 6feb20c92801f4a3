import { problemOf, summariseRun } from '#shared/api/summarise-run.ts';
import { evaluateCase } from '#shared/findings/evaluate.ts';
import type { SimulateJob, SimulateJobResult } from './simulate-job.ts';

/** One host of the engine: runs a case from start to end in a thread of the pool. Time limit and cancelling are the pool's. */
export default function simulate({ document, caseId, rtol, channels }: SimulateJob): SimulateJobResult {
  const evaluation = evaluateCase(document, caseId, rtol);
  let step = evaluation.next();
  while (!step.done) step = evaluation.next();
  const outcome = step.value;
  if (!outcome.ok) return { outcome: 'cannot-run', problems: outcome.problems.map(problemOf) };
  return {
    outcome: 'run',
    run: summariseRun(document, outcome.evaluation, { channels }),
  };
}
