import { valueAt } from '../simulation/result.ts';
import { fromSi, type UnitPreferences } from '../units/convert.ts';
import { formatNumber } from '../units/format.ts';
import type { Unit } from '../units/quantities.ts';
import type { CasePen } from './case-pens.ts';
import { envelope } from './envelope.ts';
import { pushApart } from './placement.ts';
import { linearScale, roundTicks, tickDigits } from './scale.ts';
import type { Picture, Shape } from './shape.ts';
import type { LaneReference } from './tape-references.ts';

/** The tape as a drawing list, for printing and export: commands, lanes, traces, time axis. Pixels. */

export interface TapePictureLane {
  readonly title: string;
  readonly unit: Unit;
  /** [SI] */
  readonly low: number;
  readonly high: number;
  readonly references: readonly LaneReference[];
  readonly traces: readonly {
    readonly pen: CasePen;
    readonly times: Float64Array;
    readonly values: Float64Array;
    readonly stretches: readonly (readonly [from: number, to: number])[];
    /** Words where the load lane ends at a stall. */
    readonly words?: string;
  }[];
}

export interface TapePictureInput {
  readonly title: string;
  readonly duration: number;
  readonly commands: readonly { readonly time: number; readonly words: string }[];
  readonly cases: readonly { readonly letter: string; readonly name: string; readonly pen: CasePen }[];
  readonly lanes: readonly TapePictureLane[];
  readonly preferences: UnitPreferences;
  readonly width?: number;
  readonly laneHeight?: number;
}

const LEFT = 132;
const RIGHT = 34;
const HEAD = 64;
const FOOT = 30;

export function tapePicture(input: TapePictureInput): Picture {
  const width = input.width ?? 1000;
  const laneHeight = input.laneHeight ?? 74;
  const bottom = HEAD + input.lanes.length * laneHeight;
  const x = linearScale(0, input.duration, LEFT, width - RIGHT);
  const shapes: Shape[] = [{ type: 'rect', x: LEFT, y: HEAD, w: width - RIGHT - LEFT, h: bottom - HEAD, fill: 'sheet', role: 'ground' }];
  shapes.push(...legend(input), ...axis(input, x, bottom));
  input.lanes.forEach((lane, k) => {
    shapes.push(...laneShapes(lane, HEAD + k * laneHeight, laneHeight, x, width, input));
  });
  for (const command of input.commands) {
    shapes.push(
      { type: 'line', x1: x(command.time), y1: HEAD - 26, x2: x(command.time), y2: bottom, stroke: 'ink', width: 1.4, role: 'flag' },
      { type: 'text', x: x(command.time) + 4, y: HEAD - 14, text: command.words, size: 12, weight: 650 },
    );
  }
  return { width, height: bottom + FOOT, title: input.title, shapes };
}

function legend(input: TapePictureInput): Shape[] {
  const shapes: Shape[] = [{ type: 'text', x: 8, y: 18, text: input.title, size: 14, weight: 700 }];
  let at = LEFT;
  for (const entry of input.cases) {
    shapes.push(
      {
        type: 'line',
        x1: at,
        y1: 29,
        x2: at + 30,
        y2: 29,
        stroke: entry.pen.ink,
        width: entry.pen.width,
        dash: entry.pen.dash,
        cap: 'butt',
      },
      { type: 'text', x: at + 36, y: 33, text: `${entry.letter} ${entry.name}`, size: 12, weight: 600 },
    );
    at += 56 + (entry.name.length + 2) * 6.6;
  }
  return shapes;
}

function axis(input: TapePictureInput, x: (time: number) => number, bottom: number): Shape[] {
  const ticks = roundTicks(0, input.duration, 8);
  const digits = tickDigits(ticks);
  return ticks.flatMap((tick, k): Shape[] => [
    { type: 'line', x1: x(tick), y1: HEAD, x2: x(tick), y2: bottom, stroke: 'rule', width: 1 },
    {
      type: 'text',
      x: x(tick),
      y: bottom + 18,
      text: `${formatNumber(tick, digits, input.preferences)}${k === ticks.length - 1 ? ' s' : ''}`,
      size: 12,
      anchor: 'middle',
      font: 'reading',
    },
  ]);
}

function laneShapes(
  lane: TapePictureLane,
  top: number,
  height: number,
  x: (time: number) => number,
  width: number,
  input: TapePictureInput,
): Shape[] {
  const bottom = top + height;
  const y = linearScale(lane.low, lane.high, bottom - 6, top + 7);
  const shapes: Shape[] = [
    { type: 'line', x1: 0, y1: bottom, x2: width, y2: bottom, stroke: 'edge', width: 1 },
    { type: 'text', x: 8, y: top + 18, text: lane.title, size: 13, weight: 700 },
    { type: 'text', x: 8, y: top + 34, text: lane.unit.symbol, size: 12, font: 'reading', fill: 'ink2' },
  ];
  const low = fromSi(lane.low, lane.unit);
  const high = fromSi(lane.high, lane.unit);
  const ticks = roundTicks(low, high, Math.max(2, Math.floor(height / 30)));
  const digits = tickDigits(ticks);
  for (const tick of ticks) {
    const at = y(tick * lane.unit.factor + lane.unit.offset);
    const text = formatNumber(tick, digits, input.preferences);
    shapes.push({
      type: 'text',
      x: LEFT - 6,
      y: Math.min(Math.max(at + 4, top + 11), bottom - 2),
      text,
      size: 11,
      anchor: 'end',
      font: 'reading',
      fill: 'ink2',
    });
  }
  for (const reference of lane.references) {
    const at = y(reference.value);
    shapes.push(
      {
        type: 'line',
        x1: LEFT,
        y1: at,
        x2: width - RIGHT,
        y2: at,
        stroke: 'ink',
        width: 1.2,
        dash: [2, 3],
        cap: 'butt',
        role: 'reference',
      },
      {
        type: 'text',
        x: width - RIGHT - 4,
        y: at < top + 18 ? at + 13 : at - 4,
        text: reference.label,
        size: 12,
        anchor: 'end',
        fill: 'ink2',
      },
    );
  }
  const ends = pushApart(
    lane.traces.map((trace) => y(valueAt(trace.times, trace.values, endOf(trace.stretches)))),
    12,
    top + 8,
    bottom - 6,
  );
  lane.traces.forEach((trace, k) => {
    for (const [from, to] of trace.stretches) {
      const points = envelope(trace.times, trace.values, from, to, 1200);
      const drawn = points.map((value, i) => (i % 2 === 0 ? x(value) : y(value)));
      shapes.push({
        type: 'polyline',
        points: drawn,
        stroke: trace.pen.ink,
        width: trace.pen.width,
        dash: trace.pen.dash,
        cap: 'butt',
        role: 'trace',
      });
    }
    const at = x(endOf(trace.stretches));
    const own = (ends[k] as number) + 4;
    shapes.push({ type: 'text', x: at + 6, y: own, text: trace.pen.letter, size: 12, weight: 700, fill: trace.pen.ink });
    const fall = trace.stretches[0]?.[1];
    if (trace.words && fall !== undefined) {
      const words: Shape = {
        type: 'text',
        x: x(fall) + 6,
        y: y(valueAt(trace.times, trace.values, fall)) + 4,
        text: trace.words,
        size: 12,
        weight: 600,
        role: 'stall',
      };
      shapes.push(words);
    }
  });
  return shapes;
}

function endOf(stretches: readonly (readonly [from: number, to: number])[]): number {
  return stretches[stretches.length - 1]?.[1] ?? 0;
}
