import type { Curve, LoadCurves } from '../findings/load-curves.ts';
import { channelOf, type RunResult } from '../simulation/result.ts';

/** The way of the operating point over a run, thin enough to be drawn at every frame. */
export interface LoadPath {
  readonly times: Float64Array;
  /** [Pa], [m³/s] */
  readonly pressure: Float64Array;
  readonly flow: Float64Array;
}

export const PATH_POINTS = 300;

/** Path of a run with at most `most` points. The points kept are those without which the line would leave its course the
 *  most, measured in shares of the largest pressure and flow. Null when the run lacks the channels. */
export function loadPath(run: RunResult, curves: Pick<LoadCurves, 'pressureAddress' | 'flowAddress'>, most = PATH_POINTS): LoadPath | null {
  const pressure = channelOf(run, curves.pressureAddress)?.values;
  const flow = channelOf(run, curves.flowAddress)?.values;
  if (!pressure || !flow || run.times.length === 0) return null;
  const kept = thinPath(pressure, flow, most);
  const pick = (values: Float64Array) => {
    const picked = new Float64Array(kept.length);
    for (let k = 0; k < kept.length; k += 1) picked[k] = values[kept[k] as number] as number;
    return picked;
  };
  return { times: pick(run.times), pressure: pick(pressure), flow: pick(flow) };
}

/** Indices kept: the ends, then again and again the point farthest from the line drawn so far. */
export function thinPath(xs: Float64Array, ys: Float64Array, most: number): number[] {
  const n = xs.length;
  if (n <= most) return Array.from({ length: n }, (_, i) => i);
  const sx = 1 / (largest(xs) || 1);
  const sy = 1 / (largest(ys) || 1);
  const keep = new Set([0, n - 1]);
  const spans = [farthest(xs, ys, sx, sy, 0, n - 1)];
  while (keep.size < most && spans.length > 0) {
    let best = 0;
    for (let i = 1; i < spans.length; i += 1) if ((spans[i] as Span).away > (spans[best] as Span).away) best = i;
    const span = spans[best] as Span;
    if (span.at < 0 || span.away < 1e-5) break;
    keep.add(span.at);
    spans[best] = farthest(xs, ys, sx, sy, span.from, span.at);
    spans.push(farthest(xs, ys, sx, sy, span.at, span.to));
  }
  return [...keep].sort((a, b) => a - b);
}

interface Span {
  readonly from: number;
  readonly to: number;
  readonly at: number;
  readonly away: number;
}

function farthest(xs: Float64Array, ys: Float64Array, sx: number, sy: number, from: number, to: number): Span {
  const x1 = (xs[from] as number) * sx;
  const y1 = (ys[from] as number) * sy;
  const dx = (xs[to] as number) * sx - x1;
  const dy = (ys[to] as number) * sy - y1;
  const length2 = dx * dx + dy * dy;
  let at = -1;
  let away = -1;
  for (let i = from + 1; i < to; i += 1) {
    const px = (xs[i] as number) * sx - x1;
    const py = (ys[i] as number) * sy - y1;
    const along = length2 > 0 ? Math.min(1, Math.max(0, (px * dx + py * dy) / length2)) : 0;
    const ex = px - along * dx;
    const ey = py - along * dy;
    const distance = ex * ex + ey * ey;
    if (distance > away) {
      away = distance;
      at = i;
    }
  }
  return { from, to, at, away: Math.sqrt(Math.max(0, away)) };
}

function largest(values: Float64Array): number {
  let most = 0;
  for (let i = 0; i < values.length; i += 1) most = Math.max(most, Math.abs(values[i] as number));
  return most;
}

/** Flow of a curve at a pressure [m³/s]; null outside it. */
export function flowAt(curve: Curve, pressure: number): number | null {
  const n = curve.pressure.length;
  for (let i = 1; i < n; i += 1) {
    const p0 = curve.pressure[i - 1] as number;
    const p1 = curve.pressure[i] as number;
    if ((pressure - p0) * (pressure - p1) > 0 || p0 === p1) continue;
    const q0 = curve.flow[i - 1] as number;
    return q0 + (((curve.flow[i] as number) - q0) * (pressure - p0)) / (p1 - p0);
  }
  return null;
}

export type LoadBand = 'within-limits' | 'over' | 'trips' | 'motor-stalls';

/** In which band a point lies. Over and Trips are verdicts only if the load lasts. Null without a motor. */
export function bandAt(curves: LoadCurves, pressure: number, flow: number): LoadBand | null {
  if (curves.pullOut.pressure.length === 0) return null;
  const beyond = (curve: Curve) => {
    const limit = flowAt(curve, pressure);
    if (limit !== null) return flow > limit;
    const n = curve.pressure.length;
    // Past the curve's right end every flow is beyond it; left of it none.
    return n > 0 && pressure > Math.max(curve.pressure[0] as number, curve.pressure[n - 1] as number) && flow > 0;
  };
  if (beyond(curves.pullOut)) return 'motor-stalls';
  if (beyond(curves.trips)) return 'trips';
  return beyond(curves.rated) ? 'over' : 'within-limits';
}
