import type { Curve, LoadCurves } from '../findings/load-curves.ts';
import type { UnitPreferences } from '../units/convert.ts';
import type { CasePen } from './case-pens.ts';
import type { LoadPath } from './load-path.ts';
import { type Box, freePlace, textWidth } from './placement.ts';
import { linearScale, type Scale } from './scale.ts';
import type { Ink, Picture, Shape } from './shape.ts';

/** What the parts of the load picture share: its input, its frame and its words. */

export interface LoadCase {
  readonly id: string;
  readonly letter: string;
  readonly pen: CasePen;
  readonly active: boolean;
  readonly stale: boolean;
  readonly curves: LoadCurves;
  readonly path: LoadPath | null;
  /** Where the motor stalled [Pa, m³/s]. */
  readonly stall: { readonly pressure: number; readonly flow: number } | null;
  /** Words at its pump line: 'stop turned in, 16.0 cm³/rev'. */
  readonly words: string;
  /** Flow at which the relief was set [m³/s]; null where it is not known. */
  readonly reliefFlow: number | null;
}

export interface LoadNumeral {
  readonly number: number;
  readonly caseId: string;
  readonly pressure: number;
  readonly flow: number;
}

export interface LoadPictureInput {
  readonly title: string;
  readonly cases: readonly LoadCase[];
  readonly numerals: readonly LoadNumeral[];
  readonly preferences: UnitPreferences;
  readonly width: number;
  readonly height: number;
}

export interface LoadChart {
  /** Everything but what moves with the cursor. */
  readonly picture: Picture;
  /** The picture in two layers: what moves is drawn between them. */
  readonly below: readonly Shape[];
  readonly above: readonly Shape[];
  readonly plot: Box;
  /** Pressure [Pa] → x, flow [m³/s] → y. */
  readonly x: Scale;
  readonly y: Scale;
}

const LEFT = 48;
const RIGHT = 16;
const TOP = 16;
const BOTTOM = 24;
export const SMALL = 12.5;

export interface Frame extends Pick<LoadChart, 'plot' | 'x' | 'y'> {
  readonly input: LoadPictureInput;
  readonly active: LoadCase | undefined;
  /** Ends of the axes [Pa, m³/s]. */
  readonly ends: { readonly pressure: number; readonly flow: number };
  /** Boxes that words must not cover. */
  readonly taken: Box[];
}

export function loadFrame(input: LoadPictureInput): Frame {
  const plot = { x: LEFT, y: TOP, w: Math.max(10, input.width - LEFT - RIGHT), h: Math.max(10, input.height - TOP - BOTTOM) };
  const ends = chartEnds(input);
  return {
    input,
    plot,
    ends,
    x: linearScale(0, ends.pressure, plot.x, plot.x + plot.w),
    y: linearScale(0, ends.flow, plot.y + plot.h, plot.y),
    active: input.cases.find((entry) => entry.active) ?? input.cases[0],
    taken: [],
  };
}

/** Ends of the axes [Pa, m³/s]: everything that is drawn, with a margin, never an empty axis. */
export function chartEnds(input: Pick<LoadPictureInput, 'cases'>): { readonly pressure: number; readonly flow: number } {
  let pressure = 0;
  let flow = 0;
  for (const { curves, path } of input.cases) {
    pressure = Math.max(pressure, curves.deadHead, curves.relief?.set ?? 0);
    for (const line of curves.pumpLine) for (const value of line.flow) flow = Math.max(flow, value);
    for (const value of path?.pressure ?? []) pressure = Math.max(pressure, value);
    if (curves.pumpLine.length === 0) for (const value of path?.flow ?? []) flow = Math.max(flow, value);
  }
  return { pressure: pressure > 0 ? pressure * 1.1 : 1e7, flow: flow > 0 ? flow * 1.14 : 1e-3 };
}

/** Points of a curve on the chart, by rising pressure. */
export function curvePoints(frame: Frame, curve: Curve): number[] {
  const flat: number[] = [];
  const order = Array.from(curve.pressure, (_, i) => i).sort((a, b) => (curve.pressure[a] as number) - (curve.pressure[b] as number));
  for (const i of order) flat.push(frame.x(curve.pressure[i] as number), frame.y(curve.flow[i] as number));
  return flat;
}

export function pathPoints(chart: Pick<LoadChart, 'x' | 'y'>, path: LoadPath): Float64Array {
  const flat = new Float64Array(2 * path.times.length);
  for (let i = 0; i < path.times.length; i += 1) {
    flat[2 * i] = chart.x(path.pressure[i] as number);
    flat[2 * i + 1] = chart.y(path.flow[i] as number);
  }
  return flat;
}

/** Words with a ground behind them, so that textures do not hide them. */
export function label(box: Box, text: string, options: { ink?: Ink; weight?: number; ground?: Ink } = {}): Shape[] {
  const shapes: Shape[] = [];
  if (options.ground) shapes.push({ type: 'rect', x: box.x - 1, y: box.y, w: box.w + 2, h: box.h, fill: options.ground, opacity: 0.85 });
  shapes.push({
    type: 'text',
    x: box.x,
    y: box.y + box.h - 3.5,
    text,
    size: SMALL,
    weight: options.weight ?? 640,
    fill: options.ink ?? 'ink',
    role: 'label',
  });
  return shapes;
}

export function wordsBox(text: string, x: number, y: number): Box {
  return { x, y, w: textWidth(text, SMALL, 640), h: 16 };
}

/** Words at the first of the places that is free, kept free from then on; nothing where there is none. */
export function placeWords(
  frame: Frame,
  words: string,
  candidates: readonly Box[],
  options: { ink?: Ink; weight?: number; ground?: Ink } = {},
): Shape[] {
  const box = freePlace(candidates, frame.taken, frame.plot);
  if (!box) return [];
  frame.taken.push(box);
  return label(box, words, options);
}
