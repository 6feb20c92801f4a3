import { problemOf, summariseRun } from '#shared/api/summarise-run.ts';
import { evaluateCase } from '#shared/findings/evaluate.ts';
import type { SimulateJob, SimulateJobResult } from './simulate-job.ts';

/** One host of the engine: runs a case in a thread of the pool and looks at the clock between steps. */
export default function simulate({ document, caseId, rtol, channels, within }: SimulateJob): SimulateJobResult {
  const end = performance.now() + within;
  const evaluation = evaluateCase(document, caseId, rtol);
  let step = evaluation.next();
  while (!step.done) {
    if (performance.now() > end) return { outcome: 'given-up', time: step.value.time };
    step = evaluation.next();
  }
  const outcome = step.value;
  if (!outcome.ok) return { outcome: 'cannot-run', problems: outcome.problems.map(problemOf) };
  return { outcome: 'run', run: summariseRun(document, outcome.evaluation, { channels }) };
}
