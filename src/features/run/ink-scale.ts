import type { CircuitDocument } from '#shared/circuit/schema.ts';
import { inkScale } from '#shared/pictures/pressure-ink.ts';
import type { RunResult } from '#shared/simulation/result.ts';

/** Pressure scale of the drawing's ink [Pa]: one for all cases, not below any run's peak nor the lowest rating entered. */
export function chooseInkScale(document: CircuitDocument, runs: readonly RunResult[]): number {
  let peak = 0;
  for (const run of runs) {
    for (const channel of run.channels) {
      if (channel.quantity !== 'pressure' || !channel.address.endsWith('.pressure')) continue;
      for (const value of channel.values) if (value > peak) peak = value;
    }
  }
  let lowest = Number.POSITIVE_INFINITY;
  for (const component of document.components) {
    const rating = component.parameters.ratedPressure?.value;
    if (typeof rating === 'number' && rating < lowest) lowest = rating;
  }
  return inkScale(peak, Number.isFinite(lowest) ? lowest : 0);
}
