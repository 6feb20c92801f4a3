import type { Channel, RunEvent, RunResult } from '../simulation/result.ts';
import type { QuantityId } from '../units/quantities.ts';

/** Made-up runs with known shapes: for tests of drawings only, imported by nothing else. */

export interface SyntheticChannel {
  readonly address: string;
  readonly quantity: QuantityId;
  readonly value: (time: number) => number;
}

export function syntheticRun(options: {
  readonly caseId?: string;
  readonly duration?: number;
  readonly reached?: number;
  readonly step?: number;
  readonly channels: readonly SyntheticChannel[];
  readonly events?: readonly RunEvent[];
}): RunResult {
  const duration = options.duration ?? 7;
  const reached = options.reached ?? duration;
  const step = options.step ?? 0.005;
  const n = Math.round(reached / step) + 1;
  const times = Float64Array.from({ length: n }, (_, i) => (i === n - 1 ? reached : i * step));
  const channels: Channel[] = options.channels.map((channel) => ({
    address: channel.address,
    label: channel.address,
    quantity: channel.quantity,
    values: times.map((time) => channel.value(time)),
  }));
  return {
    engineVersion: 1,
    caseId: options.caseId ?? 'A',
    status: reached < duration ? 'failed' : 'finished',
    time: reached,
    duration,
    tolerance: 1e-4,
    times,
    channels,
    events: options.events ?? [],
    phases: [],
    audit: null,
    pressureLeft: [],
    statistics: {
      steps: n,
      rejected: 0,
      evaluations: 0,
      jacobians: 0,
      factorisations: 0,
      states: 0,
      nonzeros: 0,
    },
    notes: [],
    hash: '0',
  };
}
