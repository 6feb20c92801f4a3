import type { CircuitDocument } from '#shared/circuit/schema.ts';
import { inkScale } from '#shared/pictures/pressure-ink.ts';
import type { RunResult } from '#shared/simulation/result.ts';

/** Pressure scale of the drawing's ink [Pa]: one for all cases, not below any run's peak nor the lowest rating entered. */
export function chooseInkScale(document: CircuitDocument, runs: readonly RunResult[]): number {
  let peak = 0;
  for (const run of runs) peak = Math.max(peak, peakOf(run));
  let lowest = Number.POSITIVE_INFINITY;
  for (const component of document.components) {
    const rating = component.parameters.ratedPressure?.value;
    if (typeof rating === 'number' && rating < lowest) lowest = rating;
  }
  return inkScale(peak, Number.isFinite(lowest) ? lowest : 0);
}

const peaks = new WeakMap<RunResult, number>();

/** Highest pressure of any port in a run [Pa]. Ports of one net share their values: they are looked through once. */
function peakOf(run: RunResult): number {
  const before = peaks.get(run);
  if (before !== undefined) return before;
  const seen = new Set<Float64Array>();
  let peak = 0;
  for (const { quantity, address, values } of run.channels) {
    if (quantity !== 'pressure' || !address.endsWith('.pressure') || seen.has(values)) continue;
    seen.add(values);
    for (let r = 0; r < values.length; r += 1) if ((values[r] as number) > peak) peak = values[r] as number;
  }
  peaks.set(run, peak);
  return peak;
}
