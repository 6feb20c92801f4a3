import type { CircuitDocument } from '#shared/circuit/schema.ts';
import { evaluateToEnd } from '#shared/findings/evaluate.ts';
import type { Finding, SeekResult } from '#shared/findings/finding.ts';
import { seekRemedy } from '#shared/findings/seek.ts';
import { tolerances } from '#shared/simulation/result.ts';

/** The second worker: finds a remedy's setting by running, one finding after another. The page ends it by terminating it. */
export interface SeekRequest {
  readonly document: CircuitDocument;
  readonly caseId: string;
  readonly finding: Finding;
}
export interface SeekReply {
  readonly findingId: string;
  readonly caseId: string;
  readonly result: SeekResult;
}

self.onmessage = (event: MessageEvent<SeekRequest>) => {
  const { document, caseId, finding } = event.data;
  let result: SeekResult;
  try {
    result = seekRemedy(document, caseId, finding, (trial, id) => {
      const outcome = evaluateToEnd(trial, id, tolerances.normal);
      return outcome.ok ? outcome.evaluation.assessment : null;
    });
  } catch (error) {
    result = {
      found: false,
      words: [`The setting could not be sought: ${error instanceof Error ? error.message : String(error)}`],
      runs: 0,
    };
  }
  const reply: SeekReply = { findingId: finding.id, caseId, result };
  self.postMessage(reply);
};
