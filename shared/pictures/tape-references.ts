import { effectiveNumber } from '../circuit/effective.ts';
import type { CircuitDocument } from '../circuit/schema.ts';
import type { Show } from '../duty/duty.ts';
import type { Lane } from '../duty/lanes.ts';
import type { Yardsticks } from '../findings/finding.ts';
import type { LoadCurves } from '../findings/load-curves.ts';
import { channelOf, type RunResult } from '../simulation/result.ts';

/** A dotted line across a lane: a limit or a setting, in SI, with its words. */
export interface LaneReference {
  readonly value: number;
  readonly label: string;
}

/** References of one lane for the case on the drawing. */
export function laneReferences(
  document: CircuitDocument,
  caseId: string,
  lane: Lane,
  curves: LoadCurves | null,
  show: Show,
): LaneReference[] {
  const [component = '', reading = ''] = lane.address.split('.');
  if (curves && lane.address === curves.pressureAddress) {
    return curves.deadHead > 0 ? [{ value: curves.deadHead, label: `cut-off ${show(curves.deadHead, 'pressure')}` }] : [];
  }
  if (lane.role === 'load' || reading === 'torqueRatio') {
    const power = effectiveNumber(document, caseId, component, 'ratedPower');
    const speed = effectiveNumber(document, caseId, component, 'ratedSpeed');
    const torque = power !== null && speed !== null && speed > 0 ? `, ${show(power / speed, 'torque')}` : '';
    return [{ value: 1, label: `rated${torque}` }];
  }
  if (reading === 'current') {
    const rated = effectiveNumber(document, caseId, component, 'ratedCurrent');
    return rated === null ? [] : [{ value: rated, label: `nameplate ${show(rated, 'current')}` }];
  }
  return [];
}

/** A stall as the tape shows it. */
export interface TapeStall {
  readonly motor: string;
  readonly time: number;
  /** Current while stalled [A], null where unknown. */
  readonly current: number | null;
  /** Traces end here in two dashes; the run's end where the motor comes back later. */
  readonly traceEnd: number;
}

/** Traces go on for this share of the duty after a stall, at least the given time [s], so that the fall is seen. */
const AFTER_STALL = 0.12;
const AFTER_STALL_LEAST = 0.6;
/** A motor that reaches this share of its best speed again has come back. */
const BACK = 0.5;

export function tapeStall(run: RunResult, yardsticks: readonly Yardsticks[]): TapeStall | null {
  const yardstick = yardsticks.find((entry) => entry.stalled && entry.stallTime !== undefined);
  if (yardstick?.stallTime === undefined) return null;
  const time = yardstick.stallTime;
  const settled = time + Math.max(AFTER_STALL_LEAST, AFTER_STALL * run.duration);
  const speed = channelOf(run, `${yardstick.motor}.speed`)?.values;
  let best = 0;
  let later = 0;
  if (speed) {
    for (let i = 0; i < run.times.length; i += 1) {
      const at = run.times[i] as number;
      const value = speed[i] as number;
      if (at <= time) best = Math.max(best, value);
      else if (at > time + AFTER_STALL_LEAST) later = Math.max(later, value);
    }
  }
  const comesBack = best > 0 && later > BACK * best;
  return {
    motor: yardstick.motor,
    time,
    current: yardstick.stallCurrent ?? null,
    traceEnd: comesBack ? run.time : Math.min(run.time, settled),
  };
}
