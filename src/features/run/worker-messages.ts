import type { Assessment } from '#shared/findings/finding.ts';
import type { LoadCurves } from '#shared/findings/load-curves.ts';
import type { FromWorker, ToWorker } from '#shared/simulation/messages.ts';
import type { RunResult } from '#shared/simulation/result.ts';

/** What the browser's worker adds to the engine's own messages. */
export interface RunExtra {
  readonly assessment: Assessment;
  readonly curves: LoadCurves | null;
}
export type SimulationRequest = Extract<ToWorker, { type: 'cancel' }> | (Extract<ToWorker, { type: 'run' }> & { readonly urgent: boolean });
export type SimulationReply = FromWorker<RunExtra>;

/** Every buffer of a result once, to be moved instead of copied. Empty ones stay: several results may share one. */
export function transferables(run: RunResult, curves: LoadCurves | null): Transferable[] {
  const buffers = new Set<ArrayBuffer>();
  const add = (values: Float64Array) => values.byteLength > 0 && buffers.add(values.buffer as ArrayBuffer);
  add(run.times);
  for (const channel of run.channels) add(channel.values);
  if (curves) {
    for (const curve of [curves.rated, curves.trips, curves.pullOut, ...curves.pumpLine]) {
      add(curve.pressure);
      add(curve.flow);
    }
  }
  return [...buffers];
}
