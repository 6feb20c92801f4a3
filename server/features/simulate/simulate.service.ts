import type { Actor } from '#server/access/actor.ts';
import { AppError } from '#server/errors.ts';
import { badInputMessage, withValue } from '#server/http/validate.ts';
import type { SimulationPool } from '#server/jobs/simulation-pool.ts';
import type { SimulateRequest, SimulateResponse } from '#shared/api/simulate.ts';
import { checkDocument } from '#shared/circuit/check-document.ts';
import { tolerances } from '#shared/simulation/result.ts';
import { maySimulate } from './simulate.policy.ts';

export interface SimulateService {
  /** @param signal the caller has gone: the run is given up */
  simulate(actor: Actor, request: SimulateRequest, signal: AbortSignal): Promise<SimulateResponse>;
}

/** Checks the document, then runs one case in the thread pool. Nothing is kept. */
export function createSimulateService(pool: SimulationPool): SimulateService {
  return {
    simulate: async (actor, request, signal) => {
      if (!maySimulate(actor))
        throw new AppError('not-allowed', {
          message: 'You may not run circuits here.',
        });
      const checked = checkDocument(request.document);
      if (!checked.ok) {
        const details = checked.issues.map((issue) => ({
          path: inDocument(issue.path),
          message: withValue(issue.value, issue.message),
        }));
        throw new AppError('bad-input', {
          message: badInputMessage(details.length),
          details,
        });
      }
      const { document } = checked;
      const ids = document.cases.map((entry) => entry.id);
      const caseId = request.case ?? (ids[0] as string);
      if (!ids.includes(caseId)) {
        const message = withValue(caseId, `must be one of ${ids.join(', ')}`);
        throw new AppError('bad-input', {
          message: badInputMessage(1),
          details: [{ path: 'case', message }],
        });
      }
      const rtol = tolerances[request.tolerance ?? 'normal'];
      return pool.run({ document, caseId, rtol, channels: request.channels ?? false }, signal);
    },
  };
}

function inDocument(path: string): string {
  return path === 'document' ? path : `document.${path}`;
}
