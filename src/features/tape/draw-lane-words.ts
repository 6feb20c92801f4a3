import { pushApart } from '#shared/pictures/placement.ts';
import { valueAt } from '#shared/simulation/result.ts';
import { type Context, laneScale, type TapeGeometry, timeScale } from './tape-geometry.ts';
import type { TapeLane, TapeModel } from './tape-model.ts';
import type { Tokens } from './tokens.ts';

interface Place {
  readonly top: number;
  readonly height: number;
}

const LETTER_GAP = 16;

/** Dotted lines across a lane at its limits and settings. */
export function drawReferenceLines(context: Context, lane: TapeLane, place: Place, geometry: TapeGeometry, tokens: Tokens): void {
  const y = laneScale(lane, place.top, place.height);
  context.save();
  context.strokeStyle = tokens.ink;
  context.lineWidth = 1.3;
  context.setLineDash([2, 3]);
  for (const reference of lane.references) {
    const at = y(reference.value);
    if (at < place.top || at > place.top + place.height) continue;
    context.beginPath();
    context.moveTo(0, at);
    context.lineTo(geometry.plotWidth, at);
    context.stroke();
  }
  context.restore();
}

const widths = new Map<string, number>();

/** Width of words in the font in force, measured once: measuring takes longer than drawing. */
function widthOf(context: Context, words: string): number {
  const key = `${context.font} ${words}`;
  let width = widths.get(key);
  if (width === undefined) {
    if (widths.size > 500) widths.clear();
    width = context.measureText(words).width;
    widths.set(key, width);
  }
  return width;
}

/** Their words, over the traces on a ground of their own, at the right end. */
export function drawReferenceWords(context: Context, lane: TapeLane, place: Place, geometry: TapeGeometry, tokens: Tokens): void {
  const y = laneScale(lane, place.top, place.height);
  const size = 12 * tokens.step;
  context.save();
  context.font = `600 ${size}px ${tokens.body}`;
  context.textAlign = 'right';
  context.textBaseline = 'alphabetic';
  for (const reference of lane.references) {
    const at = y(reference.value);
    if (at < place.top || at > place.top + place.height) continue;
    const words = reference.label.replaceAll('\u202f', ' ');
    const base = at - place.top < size + 4 ? at + size + 2 : at - 4;
    const width = widthOf(context, words);
    context.globalAlpha = 0.85;
    context.fillStyle = tokens.sheet;
    context.fillRect(geometry.plotWidth - width - 8, base - size + 1, width + 6, size + 2);
    context.globalAlpha = 1;
    context.fillStyle = tokens.ink2;
    context.fillText(words, geometry.plotWidth - 5, base);
  }
  context.restore();
}

/** Boxed letters at the ends of traces, pushed apart so that all can be read. */
export function drawLetters(
  context: Context,
  model: TapeModel,
  lane: TapeLane,
  place: Place,
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
