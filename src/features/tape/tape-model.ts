import type { CircuitDocument } from '#shared/circuit/schema.ts';
import type { Show } from '#shared/duty/duty.ts';
import type { Lane } from '#shared/duty/lanes.ts';
import { type CasePen, tracePen } from '#shared/pictures/case-pens.ts';
import { extent } from '#shared/pictures/envelope.ts';
import { laneDomain } from '#shared/pictures/scale.ts';
import { type LaneReference, laneReferences, type TapeStall, tapeStall, traceStretches } from '#shared/pictures/tape-references.ts';
import { channelOf, type RunResult } from '#shared/simulation/result.ts';
import { fromSi, preferredUnit, type UnitPreferences } from '#shared/units/convert.ts';
import { formatQuantity } from '#shared/units/format.ts';
import type { Unit } from '#shared/units/quantities.ts';
import type { CaseRun } from '#src/stores/run-store.ts';

/** Everything the tape draws, from document, runs and unit choice. Values of traces stay SI; lanes carry their unit. */

export interface TapeCase {
  readonly id: string;
  readonly name: string;
  readonly ink: number;
  readonly active: boolean;
  readonly stale: boolean;
  readonly running: boolean;
  /** The drawing cannot be run, or the run broke. */
  readonly refused: boolean;
  /** Time reached while running [s]. */
  readonly reached: number;
  readonly run: RunResult | null;
  readonly pen: CasePen;
  readonly stall: TapeStall | null;
}

export interface TapeTrace {
  readonly caseIndex: number;
  readonly times: Float64Array;
  readonly values: Float64Array;
  /** Stretches over which it is drawn [s]. */
  readonly stretches: readonly (readonly [from: number, to: number])[];
  /** True when the first stretch ends at a stall: two dashes, in the load lane a bar and words. */
  readonly stalled: boolean;
}

export interface TapeLane {
  readonly lane: Lane;
  readonly unit: Unit;
  /** Ends of the lane [SI]. */
  readonly low: number;
  readonly high: number;
  readonly references: readonly LaneReference[];
  readonly traces: readonly TapeTrace[];
}

export interface TapeModel {
  readonly cases: readonly TapeCase[];
  readonly activeIndex: number;
  readonly lanes: readonly TapeLane[];
  /** Length of the duty shown [s]. */
  readonly duration: number;
}

export function showIn(preferences: UnitPreferences): Show {
  return (value, quantity) =>
    formatQuantity(value, quantity, preferences, { style: 'plate', ...(quantity === 'torque' ? { digits: 1 } : {}) }).text;
}

/** Cases on the tape: overlays in the order of the document, each with its pen; the active one is marked. */
export function tapeCases(
  document: CircuitDocument,
  activeCase: string,
  overlays: readonly string[],
  byCase: Readonly<Record<string, CaseRun>>,
): TapeCase[] {
  const shown = document.cases.filter((entry) => entry.id === activeCase || overlays.includes(entry.id));
  return shown.map((entry) => {
    const state = byCase[entry.id];
    const run = state?.run ?? null;
    const active = entry.id === activeCase;
    return {
      id: entry.id,
      name: entry.name,
      ink: entry.ink,
      active,
      stale: state?.stale ?? false,
      running: state?.state === 'running',
      refused: state?.state === 'refused' || state?.state === 'broken',
      reached: state?.reached ?? 0,
      run,
      pen: tracePen(entry.ink, active, shown.length),
      stall: run ? tapeStall(run, state?.assessment?.yardsticks ?? []) : null,
    };
  });
}

export function tapeModel(
  document: CircuitDocument,
  cases: readonly TapeCase[],
  byCase: Readonly<Record<string, CaseRun>>,
  lanes: readonly Lane[],
  preferences: UnitPreferences,
): TapeModel {
  const activeIndex = Math.max(
    0,
    cases.findIndex((entry) => entry.active),
  );
  const active = cases[activeIndex];
  const curves = active ? (byCase[active.id]?.curves ?? null) : null;
  const duration = cases.reduce((most, entry) => Math.max(most, entry.run?.duration ?? 0), 0) || document.duty.duration;
  const show = showIn(preferences);
  return {
    cases,
    activeIndex,
    duration,
    lanes: lanes.map((lane) => {
      const references = active ? laneReferences(document, active.id, lane, curves, show) : [];
      const traces = cases.flatMap((entry, caseIndex) => laneTrace(entry, caseIndex, lane));
      const [low, high] = laneEnds(traces, references, preferredUnit(lane.quantity, preferences));
      return { lane, unit: preferredUnit(lane.quantity, preferences), low, high, references, traces };
    }),
  };
}

function laneTrace(entry: TapeCase, caseIndex: number, lane: Lane): TapeTrace[] {
  const { run, stall } = entry;
  const channel = run && channelOf(run, lane.address);
  if (!run || !channel) return [];
  const stretches = traceStretches(run, stall, lane.role === 'load');
  return [{ caseIndex, times: run.times, values: channel.values, stretches, stalled: stall !== null }];
}

function laneEnds(traces: readonly TapeTrace[], references: readonly LaneReference[], unit: Unit): readonly [number, number] {
  let low = Number.POSITIVE_INFINITY;
  let high = Number.NEGATIVE_INFINITY;
  for (const trace of traces) {
    for (const [from, to] of trace.stretches) {
      const span = extent(trace.times, trace.values, from, to);
      if (!span) continue;
      low = Math.min(low, span[0]);
      high = Math.max(high, span[1]);
    }
  }
  for (const reference of references) {
    low = Math.min(low, reference.value);
    high = Math.max(high, reference.value * 1.04);
  }
  if (low > high) return [0, unit.factor];
  const [bottom, top] = laneDomain(fromSi(low, unit), fromSi(high, unit));
  return [bottom * unit.factor + unit.offset, top * unit.factor + unit.offset];
}
