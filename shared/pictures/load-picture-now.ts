import { valueAt } from '../simulation/result.ts';
import type { UnitPreferences } from '../units/convert.ts';
import { formatQuantity } from '../units/format.ts';
import { clipPolyline } from './clip.ts';
import { type LoadCase, type LoadChart, pathPoints } from './load-chart.ts';
import { bandAt, type LoadPath } from './load-path.ts';
import type { Shape } from './shape.ts';

/** What of the load picture moves with the cursor, and the picture in words. */

/** Number of path points at or before a time. */
export function pointsUntil(path: LoadPath, time: number): number {
  let low = 0;
  let high = path.times.length;
  while (low < high) {
    const middle = (low + high) >> 1;
    if ((path.times[middle] as number) <= time + 1e-9) low = middle + 1;
    else high = middle;
  }
  return low;
}

export interface LoadNow {
  readonly pressure: number;
  readonly flow: number;
}

/** Operating point at a time; clamped to the ends of the path. */
export function loadNow(path: LoadPath, time: number): LoadNow {
  return { pressure: valueAt(path.times, path.pressure, time), flow: valueAt(path.times, path.flow, time) };
}

/** When the phase of a moment began: the last of the given times at or before it, else 0 [s]. */
export function phaseStart(starts: readonly number[], time: number): number {
  return starts.reduce((latest, start) => (start <= time + 1e-9 && start > latest ? start : latest), 0);
}

/** Travelled path of every case: thick since the last command, faint before it, so that a long duty stays readable. Drawn under
 *  the words.
 *  @param since when the present phase began [s] */
export function travelledShapes(chart: LoadChart, cases: readonly LoadCase[], time: number, since = 0): Shape[] {
  const { plot } = chart;
  const shapes: Shape[] = [];
  for (const entry of cases) {
    if (!entry.path) continue;
    const now = loadNow(entry.path, time);
    const flat = pathPoints(chart, entry.path);
    const from = pointsUntil(entry.path, since);
    const line = (points: ArrayLike<number>, width: number, opacity: number, role: string) => {
      for (const piece of clipPolyline(points, plot)) {
        shapes.push({
          type: 'polyline',
          points: piece,
          stroke: entry.pen.ink,
          width,
          opacity: entry.stale ? opacity * 0.4 : opacity,
          role,
        });
      }
    };
    if (since > 0) line(flat.subarray(0, 2 * from), 1.4, 0.4, 'before');
    const begun = loadNow(entry.path, since);
    const travelled = flat.subarray(2 * from, 2 * pointsUntil(entry.path, time));
    line(
      [chart.x(begun.pressure), chart.y(begun.flow), ...travelled, chart.x(now.pressure), chart.y(now.flow)],
      entry.active ? 3.6 : 2.6,
      1,
      'travelled',
    );
  }
  return shapes;
}

/** Where every case is now; for the case on the drawing the disc with its drop lines. Drawn over the words. */
export function nowShapes(chart: LoadChart, cases: readonly LoadCase[], time: number): Shape[] {
  const { plot } = chart;
  const shapes: Shape[] = [];
  for (const entry of cases) {
    if (!entry.path) continue;
    const now = loadNow(entry.path, time);
    const x = Math.min(Math.max(chart.x(now.pressure), plot.x), plot.x + plot.w);
    const y = Math.min(Math.max(chart.y(now.flow), plot.y), plot.y + plot.h);
    if (!entry.active) {
      shapes.push({ type: 'circle', x, y, r: 4.5, fill: entry.pen.ink, stroke: 'sheet', width: 1.4, role: 'now-other' });
      continue;
    }
    const dash = [2, 3];
    const left = x - plot.x > plot.w - 60;
    shapes.push(
      { type: 'line', x1: x, y1: y, x2: x, y2: plot.y + plot.h, stroke: entry.pen.ink, width: 1.5, dash, cap: 'butt', role: 'drop' },
      { type: 'line', x1: plot.x, y1: y, x2: x, y2: y, stroke: entry.pen.ink, width: 1.5, dash, cap: 'butt', role: 'drop' },
      { type: 'circle', x, y, r: 8, fill: entry.pen.ink, stroke: 'sheet', width: 2, role: 'now' },
      {
        type: 'text',
        x: left || x - plot.x > 60 ? x - 13 : x + 13,
        y: Math.min(y + 19, plot.y + plot.h - 4),
        text: `${entry.letter} now`,
        size: 14,
        weight: 700,
        anchor: left || x - plot.x > 60 ? 'end' : 'start',
        fill: entry.pen.ink,
        role: 'now-words',
      },
    );
  }
  return shapes;
}

const bandWords = {
  'within-limits': 'within limits',
  over: 'over, if it lasts',
  trips: 'trips, if it lasts',
  'motor-stalls': 'beyond pull-out torque',
} as const;

/** The picture in words, for those who cannot see it. */
export function loadWords(cases: readonly LoadCase[], time: number, preferences: UnitPreferences): string {
  const text = (value: number, quantity: 'pressure' | 'flow' | 'time') => formatQuantity(value, quantity, preferences).text;
  const sentences: string[] = [];
  for (const entry of [...cases].sort((a, b) => Number(b.active) - Number(a.active))) {
    if (!entry.path) continue;
    const now = loadNow(entry.path, time);
    const band = bandAt(entry.curves, now.pressure, now.flow);
    sentences.push(
      `Case ${entry.letter} at ${text(time, 'time')}: ${text(now.pressure, 'pressure')}, ${text(now.flow, 'flow')}${band ? `, ${bandWords[band]}` : ''}.`,
    );
    if (entry.stall) {
      sentences.push(`Case ${entry.letter} stalls at ${text(entry.stall.pressure, 'pressure')} and ${text(entry.stall.flow, 'flow')}.`);
    }
  }
  const active = cases.find((entry) => entry.active);
  if (active) {
    const { deadHead, knee, relief } = active.curves;
    sentences.push(`The pump leaves full stroke at ${text(knee, 'pressure')} and cuts off at ${text(deadHead, 'pressure')}.`);
    if (relief) sentences.push(`The relief cracks at ${text(relief.cracks, 'pressure')} and is set to ${text(relief.set, 'pressure')}.`);
  }
  return sentences.length > 0 ? sentences.join(' ') : 'No run with a pump yet.';
}
