import { z } from 'zod';
import { runSummary } from './run-summary.ts';

/** Most channels one answer carries, and the longest computing time before a run is given up. */
export const MAX_CHANNELS = 40;
export const MAX_COMPUTE_SECONDS = 10;

/** POST /api/simulate: one run of one case. `document` is checked against the circuit document's own contract, all issues at once. */
export const simulateRequest = z.strictObject({
  document: z.record(z.string(), z.unknown()).describe('A circuit document; its schema is CircuitDocument'),
  /** Id of the case; the first case (as found) without it. */
  case: z.string().max(40).optional(),
  tolerance: z.enum(['draft', 'normal', 'fine']).optional(),
  /** Addresses of channels whose columns are wanted. */
  channels: z.array(z.string().max(120)).max(MAX_CHANNELS).optional(),
});
export type SimulateRequest = z.infer<typeof simulateRequest>;

/** A circuit that cannot run yet, or that fails on the way, is an answer, not an error. */
export const simulateResponse = z.discriminatedUnion('outcome', [
  z.object({ outcome: z.literal('run'), run: runSummary }),
  z.object({
    outcome: z.literal('cannot-run'),
    /** What is missing on the drawing, in words. */
    problems: z.array(runSummary.shape.notes.element),
  }),
]);
export type SimulateResponse = z.infer<typeof simulateResponse>;
