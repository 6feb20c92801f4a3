import { effectiveNumber } from '../circuit/effective.ts';
import type { CircuitDocument } from '../circuit/schema.ts';
import type { Show } from '../duty/duty.ts';
import type { Lane } from '../duty/lanes.ts';
import type { Yardsticks } from '../findings/finding.ts';
import type { LoadCurves } from '../findings/load-curves.ts';
import type { RunResult } from '../simulation/result.ts';

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
  /** Traces end here in two dashes [s]. */
  readonly traceEnd: number;
  /** The motor passes pull-out speed again here [s]: traces go on. Null = it stays stalled. */
  readonly resumes: number | null;
}

/** Traces go on for this share of the duty after a stall, at least the given time [s], so that the fall is seen. */
const AFTER_STALL = 0.12;
const AFTER_STALL_LEAST = 0.6;

export function tapeStall(run: RunResult, yardsticks: readonly Yardsticks[]): TapeStall | null {
  const yardstick = yardsticks.find((entry) => entry.stalled && entry.stallTime !== undefined);
  if (yardstick?.stallTime === undefined) return null;
  const { motor, stallTime: time } = yardstick;
  const back = run.events.find((event) => event.component === motor && event.signal === 'up-to-speed' && event.rising && event.time > time);
  const settled = time + Math.max(AFTER_STALL_LEAST, AFTER_STALL * run.duration);
  return {
    motor,
    time,
    current: yardstick.stallCurrent ?? null,
    traceEnd: Math.min(settled, back?.time ?? run.time, run.time),
    resumes: back?.time ?? null,
  };
}

/** Stretches over which a trace is drawn [s]: up to the stall's end, and again from where the motor is back. The load is not
 *  drawn below pull-out speed. */
export function traceStretches(run: RunResult, stall: TapeStall | null, isLoad: boolean): (readonly [from: number, to: number])[] {
  if (!stall) return [[0, run.time]];
  const first = [0, isLoad ? stall.time : stall.traceEnd] as const;
  return stall.resumes === null ? [first] : [first, [stall.resumes, run.time]];
}

/** True between a stall and the motor's return. */
export function isStalledAt(stall: TapeStall | null, time: number): boolean {
  return stall !== null && time >= stall.time && (stall.resumes === null || time < stall.resumes);
}
