import type { CompiledCircuit } from './circuit.ts';
import { type Channel, type RunResult, valueAt } from './result.ts';
import { runToEnd } from './run.ts';

/** What repeating a run at a tenth of its tolerance changes. */
export interface RunCheck {
  readonly coarse: RunResult;
  readonly fine: RunResult;
  /** Largest difference of any channel at one time, relative to that channel's range in the finer run, with where it is. */
  readonly largest: { readonly address: string; readonly label: string; readonly time: number; readonly share: number };
  /** Root mean square over time of the same, of the worst channel: not moved by a steep front that comes a moment later. */
  readonly rms: { readonly address: string; readonly label: string; readonly share: number };
}

/** "Check this run": repeats it at a tenth of the tolerance and compares every channel at the times of both runs. */
export function checkRun(circuit: CompiledCircuit, tolerance: number): RunCheck {
  const coarse = runToEnd(circuit, tolerance);
  const fine = runToEnd(circuit, tolerance / 10);
  let largest = { address: '', label: '', time: 0, share: 0 };
  let rms = { address: '', label: '', share: 0 };
  coarse.channels.forEach((channel, k) => {
    const other = fine.channels[k] as Channel;
    const range = rangeOf(other.values);
    if (range === 0) return;
    let area = 0;
    for (let i = 0; i < coarse.times.length; i++) {
      const time = coarse.times[i]!;
      const share = Math.abs(channel.values[i]! - valueAt(fine.times, other.values, time)) / range;
      if (share > largest.share) largest = { address: channel.address, label: channel.label, time, share };
      if (i > 0) area += share * share * (time - coarse.times[i - 1]!);
    }
    const span = coarse.times[coarse.times.length - 1]! - coarse.times[0]!;
    const mean = span > 0 ? Math.sqrt(area / span) : 0;
    if (mean > rms.share) rms = { address: channel.address, label: channel.label, share: mean };
  });
  return { coarse, fine, largest, rms };
}

function rangeOf(values: Float64Array): number {
  let least = Number.POSITIVE_INFINITY;
  let most = Number.NEGATIVE_INFINITY;
  for (const value of values) {
    if (value < least) least = value;
    if (value > most) most = value;
  }
  return most > least ? most - least : 0;
}
