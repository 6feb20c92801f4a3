import type { Channel, RunEvent, RunResult } from '#shared/simulation/result.ts';
import type { QuantityId } from '#shared/units/quantities.ts';

/** Made-up runs with known shapes, for tests of drawings only. */

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

/** A press run that rises, knees over and is let go, or stalls at `stallTime`. Addresses are those of the demo press. */
export function syntheticPress(caseId: string, stallTime?: number): RunResult {
  const stalled = (t: number) => stallTime !== undefined && t >= stallTime;
  const pressure = (t: number) => {
    if (t < 0.1) return 0;
    if (stalled(t)) return (150 + 10 * Math.exp(-(t - (stallTime as number)) * 9)) * 1e5;
    if (t > 5.4) return 6e5;
    return Math.min(190, 12 + 45 * Math.max(0, t - 1)) * 1e5 + (t > 0.6 && t < 1.2 ? 9e5 * Math.exp(-(t - 0.6) * 8) : 0);
  };
  const flow = (t: number) => (t < 0.1 ? 0 : stalled(t) ? 1e-5 : pressure(t) >= 190e5 ? 2e-5 : 3.4e-4);
  return syntheticRun({
    caseId,
    duration: 8,
    channels: [
      { address: 'P1.outlet.pressure', quantity: 'pressure', value: pressure },
      { address: 'P1.flow', quantity: 'flow', value: flow },
      {
        address: 'M1.torqueRatio',
        quantity: 'ratio',
        value: (t) => (stalled(t) ? 1.6 : Math.min(2, pressure(t) / 120e5)),
      },
      {
        address: 'M1.speed',
        quantity: 'speed',
        value: (t) => (t < 0.1 ? t * 1500 : stalled(t) ? 2 : 152),
      },
      {
        address: 'M1.current',
        quantity: 'current',
        value: (t) => (stalled(t) ? 61 : 9),
      },
      {
        address: 'A1.position',
        quantity: 'length',
        value: (t) => (t < 0.6 ? 0 : Math.min(0.345, (t - 0.6) * 0.11)),
      },
    ],
    events: [
      {
        signal: 'meets-work',
        component: 'A1',
        time: 1.7,
        rising: true,
        label: 'meets the load',
      },
      ...(stallTime === undefined
        ? [
            {
              signal: 'compensates',
              component: 'P1',
              time: 4.95,
              rising: true,
              label: 'starts to compensate',
            },
          ]
        : [
            {
              signal: 'past-pull-out',
              component: 'M1',
              time: stallTime,
              rising: true,
              label: 'stalls',
            },
          ]),
    ],
  });
}
