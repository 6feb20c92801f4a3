import type { SimulateResponse } from '#shared/api/simulate.ts';
import type { CircuitDocument } from '#shared/circuit/schema.ts';

/** What goes to a simulation thread, and what comes back. */
export interface SimulateJob {
  readonly document: CircuitDocument;
  readonly caseId: string;
  readonly rtol: number;
  readonly channels: boolean | readonly string[];
  /** Longest computing time [ms]; the run is given up when it is over. */
  readonly within: number;
}
export type SimulateJobResult = SimulateResponse | { readonly outcome: 'given-up'; readonly time: number };
