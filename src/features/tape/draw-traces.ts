import { envelope } from '#shared/pictures/envelope.ts';
import { valueAt } from '#shared/simulation/result.ts';
import { drawLetters, drawReferenceLines, drawReferenceWords } from './draw-lane-words.ts';
import { type Context, laneScale, type TapeGeometry, timeScale, type Vertical } from './tape-geometry.ts';
import type { TapeLane, TapeModel, TapeTrace } from './tape-model.ts';
import type { Tokens } from './tokens.ts';

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
    drawReferenceLines(context, lane, place, geometry, tokens);
    const order = [...lane.traces].sort((a, b) => Number(a.caseIndex === model.activeIndex) - Number(b.caseIndex === model.activeIndex));
    context.save();
    context.beginPath();
    context.rect(0, place.top, geometry.width, place.height);
    context.clip();
    for (const trace of order) drawTrace(context, model, lane, trace, place, geometry, tokens);
    context.restore();
    drawReferenceWords(context, lane, place, geometry, tokens);
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
