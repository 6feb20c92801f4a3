import type { QuantityId } from '../units/quantities.ts';

/** What a run returns. All numbers SI, pressures gauge. Shared by worker, server, command line and screens. */

export type Tolerance = 'draft' | 'normal' | 'fine';
/** rtol of each named tolerance. */
export const tolerances: Record<Tolerance, number> = { draft: 1e-3, normal: 1e-4, fine: 1e-6 };

export interface Problem {
  /** 'problem' stops the run; 'assumption' is a note about what was taken for granted; 'caution' runs but is said. */
  readonly severity: 'problem' | 'assumption' | 'caution';
  readonly code: string;
  /** In words, naming the component as drawn. */
  readonly message: string;
  readonly component?: string;
  readonly port?: string;
  readonly line?: string;
  /** Field path in the document where there is one. */
  readonly path?: string;
  /** One action that cures it on the drawing. */
  readonly cure?: {
    readonly label: string;
    readonly action: 'add-tank' | 'join' | 'delete-line' | 'open-nameplate' | 'add-relief' | 'add-drive';
    readonly component?: string;
    readonly port?: string;
    readonly line?: string;
  };
}

export interface Channel {
  /** 'component.port.pressure', 'component.port.flow' (positive into the component), 'component.reading', 'line.<id>.flow' (positive from → to). */
  readonly address: string;
  readonly label: string;
  readonly quantity: QuantityId;
  readonly values: Float64Array;
}

export interface RunEvent {
  /** Signal id of the kind, or a simulation event. */
  readonly signal: string;
  readonly component: string;
  readonly time: number;
  readonly rising: boolean;
  /** Words from the kind ('relief cracks'); '' = not pinned. */
  readonly label: string;
}

export interface RunStatistics {
  readonly steps: number;
  readonly rejected: number;
  readonly evaluations: number;
  readonly jacobians: number;
  readonly factorisations: number;
  /** States in all, and nonzeros of the factors. */
  readonly states: number;
  readonly nonzeros: number;
}

export interface EnergyAudit {
  /** Integrals over the run [J]. */
  readonly supplied: number;
  readonly delivered: number;
  readonly heat: number;
  readonly storedChange: number;
  /** |supplied − delivered − heat − stored| ÷ (work supplied by prime movers and loads). */
  readonly residual: number;
  /** Volume residual ÷ volume moved by the pumps. */
  readonly volumeResidual: number;
  /** Heat by component [J]. */
  readonly heatBy: Readonly<Record<string, number>>;
}

/** One stretch of the duty between two commands. */
export interface PhaseSummary {
  readonly label: string;
  readonly from: number;
  readonly to: number;
  /** By channel address: least, most, time average and end value. */
  readonly channels: Readonly<Record<string, { readonly min: number; readonly max: number; readonly mean: number; readonly end: number }>>;
}

export interface RunResult {
  readonly engineVersion: number;
  readonly caseId: string;
  readonly status: 'finished' | 'stopped' | 'failed';
  /** In words when not finished. */
  readonly reason?: string;
  /** Where it stuck. */
  readonly stuck?: { readonly component?: string; readonly state?: string };
  /** Time reached [s]. */
  readonly time: number;
  readonly duration: number;
  readonly tolerance: number;
  /** Common time base of all channels [s]; ascending; no peak of any channel is lost by thinning. */
  readonly times: Float64Array;
  readonly channels: readonly Channel[];
  readonly events: readonly RunEvent[];
  readonly phases: readonly PhaseSummary[];
  readonly audit: EnergyAudit | null;
  /** Nets shut off at the end above 5 bar: smallest port address, pressure. */
  readonly pressureLeft: readonly { readonly net: string; readonly label: string; readonly pressure: number }[];
  readonly statistics: RunStatistics;
  readonly notes: readonly Problem[];
  /** Hash of the accepted steps, hexadecimal: equal bits give equal hashes in every host. */
  readonly hash: string;
}

export function channelOf(run: RunResult, address: string): Channel | undefined {
  return run.channels.find((channel) => channel.address === address);
}

/** Linear interpolation of a channel at a time; clamped to the ends. Returns 0 for an empty run. */
export function valueAt(times: Float64Array, values: Float64Array, time: number): number {
  const n = times.length;
  if (n === 0) return 0;
  let low = 0;
  let high = n - 1;
  if (time <= (times[0] as number)) return values[0] as number;
  if (time >= (times[high] as number)) return values[high] as number;
  while (high - low > 1) {
    const middle = (low + high) >> 1;
    if ((times[middle] as number) <= time) low = middle;
    else high = middle;
  }
  const t0 = times[low] as number;
  const t1 = times[high] as number;
  const v0 = values[low] as number;
  const v1 = values[high] as number;
  return t1 > t0 ? v0 + ((v1 - v0) * (time - t0)) / (t1 - t0) : v1;
}
