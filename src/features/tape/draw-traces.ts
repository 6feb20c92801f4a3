import { scaleLinear } from 'd3-scale';
import { envelope } from '#shared/pictures/envelope.ts';
import { pushApart } from '#shared/pictures/placement.ts';
import { valueAt } from '#shared/simulation/result.ts';
import type { TapeLane, TapeModel, TapeTrace } from './tape-model.ts';
import type { Tokens } from './tokens.ts';

/** Where things lie on the canvas [CSS px]. The plot is `plotWidth` wide; `width` adds the margin for letters at trace ends. */
export interface TapeGeometry {
  readonly width: number;
  readonly height: number;
  readonly plotWidth: number;
  readonly from: number;
  readonly to: number;
  readonly lanes: readonly { readonly index: number; readonly top: number; readonly height: number }[];
  /** Letters in boxes at the ends of traces, where three or more cases share the focus lane. */
  readonly letters: boolean;
}

const PAD_TOP = 5;
const PAD_BOTTOM = 4;
const LETTER_GAP = 16;

export type Context = Pick<
  CanvasRenderingContext2D,
  | 'save'
  | 'restore'
  | 'beginPath'
  | 'moveTo'
  | 'lineTo'
  | 'stroke'
  | 'fillRect'
  | 'clearRect'
  | 'setLineDash'
  | 'fillText'
  | 'rect'
  | 'clip'
  | 'measureText'
  | 'strokeRect'
> & {
  lineWidth: number;
  strokeStyle: unknown;
  fillStyle: unknown;
  globalAlpha: number;
  font: string;
  textAlign: CanvasTextAlign;
  textBaseline: CanvasTextBaseline;
  lineJoin: CanvasLineJoin;
  lineCap: CanvasLineCap;
};

export function timeScale(geometry: TapeGeometry) {
  return scaleLinear([geometry.from, geometry.to], [0, geometry.plotWidth]);
}

/** Value [SI] → y on the canvas. */
export function laneScale(lane: TapeLane, top: number, height: number) {
  return scaleLinear([lane.low, lane.high], [top + height - PAD_BOTTOM, top + PAD_TOP]);
}

export interface Vertical {
  readonly time: number;
  readonly ink: number;
}

export function drawTraces(
  context: Context,
  model: TapeModel,
  geometry: TapeGeometry,
  tokens: Tokens,
  verticals: readonly Vertical[] = [],
): void {
  context.clearRect(0, 0, geometry.width, geometry.height);
  context.lineJoin = 'round';
  drawGrid(context, geometry, tokens);
  drawVerticals(context, geometry, tokens, verticals);
  for (const place of geometry.lanes) {
    const lane = model.lanes[place.index];
    if (!lane) continue;
    drawReferences(context, lane, place, geometry, tokens);
    const order = [...lane.traces].sort((a, b) => Number(a.caseIndex === model.activeIndex) - Number(b.caseIndex === model.activeIndex));
    context.save();
    context.beginPath();
    context.rect(0, place.top, geometry.width, place.height);
    context.clip();
    for (const trace of order) drawTrace(context, model, lane, trace, place, geometry, tokens);
    context.restore();
    if (geometry.letters) drawLetters(context, model, lane, place, geometry, tokens);
  }
}

function drawGrid(context: Context, geometry: TapeGeometry, tokens: Tokens): void {
  const x = timeScale(geometry);
  context.save();
  context.fillStyle = tokens.sheet;
  context.fillRect(0, 0, geometry.plotWidth, geometry.height);
  const ticks = x.ticks(Math.max(4, Math.round(geometry.plotWidth / 60)));
  context.lineWidth = 1;
  context.strokeStyle = tokens.rule;
  context.beginPath();
  for (const tick of ticks) {
    const at = Math.round(x(tick)) + 0.5;
    context.moveTo(at, 0);
    context.lineTo(at, geometry.height);
  }
  context.stroke();
  context.strokeStyle = tokens.ink3;
  context.globalAlpha = 0.55;
  context.beginPath();
  for (const place of geometry.lanes) {
    const at = Math.round(place.top + place.height) - 0.5;
    context.moveTo(0, at);
    context.lineTo(geometry.width, at);
  }
  context.stroke();
  context.restore();
}

function drawVerticals(context: Context, geometry: TapeGeometry, tokens: Tokens, verticals: readonly Vertical[]): void {
  const x = timeScale(geometry);
  context.save();
  context.lineWidth = 1.3;
  context.setLineDash([1.5, 3]);
  for (const vertical of verticals) {
    context.strokeStyle = tokens.cases[vertical.ink] ?? tokens.ink;
    context.beginPath();
    context.moveTo(x(vertical.time), 0);
    context.lineTo(x(vertical.time), geometry.height);
    context.stroke();
  }
  context.restore();
}

function drawReferences(
  context: Context,
  lane: TapeLane,
  place: { top: number; height: number },
  geometry: TapeGeometry,
  tokens: Tokens,
): void {
  const y = laneScale(lane, place.top, place.height);
  context.save();
  context.font = `600 ${12 * tokens.step}px ${tokens.body}`;
  context.textAlign = 'right';
  for (const reference of lane.references) {
    const at = y(reference.value);
    if (!(at >= place.top && at <= place.top + place.height)) continue;
    context.strokeStyle = tokens.ink;
    context.lineWidth = 1.3;
    context.setLineDash([2, 3]);
    context.beginPath();
    context.moveTo(0, at);
    context.lineTo(geometry.plotWidth, at);
    context.stroke();
    context.setLineDash([]);
    const below = at - place.top < 16;
    const base = below ? at + 13 * tokens.step : at - 4;
    const width = context.measureText(reference.label).width;
    context.globalAlpha = 0.8;
    context.fillStyle = tokens.sheet;
    context.fillRect(geometry.plotWidth - width - 8, base - 11 * tokens.step, width + 6, 14 * tokens.step);
    context.globalAlpha = 1;
    context.fillStyle = tokens.ink2;
    context.textBaseline = 'alphabetic';
    context.fillText(reference.label, geometry.plotWidth - 5, base);
  }
  context.restore();
}

function drawTrace(
  context: Context,
  model: TapeModel,
  lane: TapeLane,
  trace: TapeTrace,
  place: { top: number; height: number },
  geometry: TapeGeometry,
  tokens: Tokens,
): void {
  const entry = model.cases[trace.caseIndex];
  if (!entry) return;
  const x = timeScale(geometry);
  const y = laneScale(lane, place.top, place.height);
  context.save();
  context.globalAlpha = entry.stale ? 0.4 : 1;
  context.strokeStyle = tokens.cases[entry.ink] ?? tokens.ink;
  context.lineWidth = entry.pen.width;
  context.setLineDash([...entry.pen.dash]);
  for (const [from, to] of trace.stretches) {
    const start = Math.max(from, geometry.from);
    const end = Math.min(to, geometry.to);
    const columns = Math.max(1, Math.round(x(end) - x(start)));
    const points = envelope(trace.times, trace.values, start, end, columns);
    context.beginPath();
    for (let i = 0; i < points.length; i += 2) {
      const px = x(points[i] as number);
      const py = y(points[i + 1] as number);
      if (i === 0) context.moveTo(px, py);
      else context.lineTo(px, py);
    }
    context.stroke();
  }
  const fall = trace.stretches[0]?.[1];
  if (trace.stalled && fall !== undefined) drawStallEnd(context, model, lane, trace, x(fall), y, tokens);
  context.restore();
}

/** After a stall a trace ends in two dashes; the load lane ends at the stall itself, with a bar, the word and the current. */
function drawStallEnd(
  context: Context,
  model: TapeModel,
  lane: TapeLane,
  trace: TapeTrace,
  x: number,
  y: (value: number) => number,
  tokens: Tokens,
): void {
  const entry = model.cases[trace.caseIndex];
  const at = y(valueAt(trace.times, trace.values, trace.stretches[0]?.[1] ?? 0));
  context.setLineDash([]);
  if (lane.lane.role !== 'load') {
    context.beginPath();
    context.moveTo(x + 3, at);
    context.lineTo(x + 7, at);
    context.moveTo(x + 10, at);
    context.lineTo(x + 14, at);
    context.stroke();
    return;
  }
  context.strokeStyle = tokens.stall;
  context.lineWidth = 2;
  context.beginPath();
  context.moveTo(x - 15, at);
  context.lineTo(x + 17, at);
  context.stroke();
  const current = entry?.stall?.current;
  const words = current === null || current === undefined ? 'stalled' : `stalled, ${Math.round(current)} A`;
  context.font = `600 ${12 * tokens.step}px ${tokens.body}`;
  context.textAlign = 'left';
  context.textBaseline = 'top';
  context.fillStyle = tokens.ink;
  context.fillText(words, x + 18, Math.max(at - 4, 0));
}

/** Boxed letters at the ends of traces, pushed apart so that all can be read. */
function drawLetters(
  context: Context,
  model: TapeModel,
  lane: TapeLane,
  place: { top: number; height: number },
  geometry: TapeGeometry,
  tokens: Tokens,
): void {
  const x = timeScale(geometry);
  const y = laneScale(lane, place.top, place.height);
  const ends = lane.traces.map((trace) => {
    const time = Math.min(trace.stretches[trace.stretches.length - 1]?.[1] ?? 0, geometry.to);
    return {
      trace,
      x: x(time),
      y: y(valueAt(trace.times, trace.values, time)),
      atEdge: time >= geometry.to - 1e-9 || x(time) > geometry.plotWidth - 24,
    };
  });
  const edge = ends.filter((end) => end.atEdge);
  const places = pushApart(
    edge.map((end) => end.y),
    LETTER_GAP,
    place.top + 9,
    place.top + place.height - 9,
  );
  const box = (letter: string, cx: number, cy: number, ink: string) => {
    context.fillStyle = ink;
    context.fillRect(cx - 7.5, cy - 7.5, 15, 15);
    context.fillStyle = tokens.sheet;
    context.font = `700 12px ${tokens.reading}`;
    context.textAlign = 'center';
    context.textBaseline = 'middle';
    context.fillText(letter, cx, cy + 0.5);
  };
  context.save();
  for (const end of ends) {
    const entry = model.cases[end.trace.caseIndex];
    if (!entry) continue;
    const k = edge.indexOf(end);
    const ink = tokens.cases[entry.ink] ?? tokens.ink;
    if (k >= 0) box(entry.pen.letter, geometry.plotWidth + 13, places[k] as number, ink);
    else
      box(
        entry.pen.letter,
        Math.min(end.x + (end.trace.stalled ? 25 : 12), geometry.plotWidth - 8),
        Math.min(Math.max(end.y, place.top + 9), place.top + place.height - 9),
        ink,
      );
  }
  context.restore();
}
