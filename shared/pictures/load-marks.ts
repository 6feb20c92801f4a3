import { clipPolyline } from './clip.ts';
import { curvePoints, type Frame, label, pathPoints, placeWords, wordsBox } from './load-chart.ts';
import { type Box, freePlace } from './placement.ts';
import type { Ink, Shape } from './shape.ts';

/** What cases bring to the load picture: pump line, way of the operating point, stall, numerals of findings. */

/** Steady pump line of every case; broken where no steady state exists. */
export function pumpLines(frame: Frame): Shape[] {
  return frame.input.cases.flatMap((entry) =>
    entry.curves.pumpLine.flatMap((piece) =>
      clipPolyline(curvePoints(frame, piece), frame.plot).map(
        (points): Shape => ({
          type: 'polyline',
          points,
          stroke: entry.pen.ink,
          width: 1.3,
          opacity: entry.stale ? 0.4 : 1,
          role: 'pump-line',
        }),
      ),
    ),
  );
}

/** Cases whose lines begin closer than this share one label [px]. */
const TOGETHER = 6;

/** Words at the beginning of each pump line: letters, and where its stop stands. */
export function pumpWords(frame: Frame): Shape[] {
  const { x, y } = frame;
  const starts: { letters: string[]; words: string; x: number; y: number; ink: Ink }[] = [];
  for (const entry of [...frame.input.cases].sort((a, b) => a.letter.localeCompare(b.letter))) {
    const first = entry.curves.pumpLine[0];
    if (!first || first.flow.length === 0 || entry.words === '') continue;
    const at = y(first.flow[0] as number);
    const same = starts.find((start) => start.words === entry.words && Math.abs(start.y - at) < TOGETHER);
    if (same) {
      same.letters.push(entry.letter);
      same.ink = 'ink';
    } else starts.push({ letters: [entry.letter], words: entry.words, x: x(first.pressure[0] as number) + 8, y: at, ink: entry.pen.ink });
  }
  return starts.flatMap((start) => {
    const text = `${start.letters.join(', ')} ${start.words}`;
    const candidates = [-22, 9, 26, -40].map((by) => wordsBox(text, start.x, start.y + by));
    return placeWords(frame, text, candidates, { ink: start.ink, ground: 'sheet' });
  });
}

/** The whole way of the operating point, thin and dashed; the part travelled is drawn over it by the cursor's layer. */
export function toCome(frame: Frame): Shape[] {
  // From three cases on only the case on the drawing shows what is still to come.
  const shown = frame.input.cases.length > 2 ? frame.input.cases.filter((entry) => entry.active) : frame.input.cases;
  return shown.flatMap((entry) => {
    if (!entry.path) return [];
    return clipPolyline(pathPoints(frame, entry.path), frame.plot).map(
      (points): Shape => ({
        type: 'polyline',
        points,
        stroke: entry.pen.ink,
        width: 1.1,
        dash: [3, 3],
        cap: 'butt',
        opacity: entry.stale ? 0.3 : 0.7,
        role: 'to-come',
      }),
    );
  });
}

const OCTAGON = 8.5;

export function stallMarks(frame: Frame): Shape[] {
  const { plot, x, y } = frame;
  return frame.input.cases.flatMap((entry): Shape[] => {
    if (!entry.stall) return [];
    const cx = x(entry.stall.pressure);
    const cy = y(entry.stall.flow);
    if (cx < plot.x || cx > plot.x + plot.w || cy < plot.y || cy > plot.y + plot.h) return [];
    frame.taken.push({ x: cx - OCTAGON - 1, y: cy - OCTAGON - 1, w: 2 * OCTAGON + 2, h: 2 * OCTAGON + 2 });
    const a = OCTAGON;
    const b = OCTAGON * 0.414;
    const octagon = [
      cx - b,
      cy - a,
      cx + b,
      cy - a,
      cx + a,
      cy - b,
      cx + a,
      cy + b,
      cx + b,
      cy + a,
      cx - b,
      cy + a,
      cx - a,
      cy + b,
      cx - a,
      cy - b,
    ];
    const box = freePlace([wordsBox(entry.letter, cx - 20, cy + 9), wordsBox(entry.letter, cx - 4, cy + 10)], frame.taken, plot);
    if (box) frame.taken.push(box);
    return [
      { type: 'polyline', points: octagon, closed: true, fill: 'verdict-motor-stalls', stroke: 'sheet', width: 1.5, role: 'stall' },
      { type: 'line', x1: cx - 5, y1: cy, x2: cx + 5, y2: cy, stroke: 'sheet', width: 2.6, cap: 'butt' },
      ...(box ? label(box, entry.letter, { ink: entry.pen.ink, weight: 700 }) : []),
    ];
  });
}

export function numeralMarks(frame: Frame): Shape[] {
  const { plot, x, y } = frame;
  const R = 9.5;
  return frame.input.numerals.flatMap((numeral): Shape[] => {
    const cx = x(numeral.pressure);
    const cy = y(numeral.flow);
    const at = (dx: number, dy: number): Box => ({ x: cx + dx - R, y: cy + dy - R, w: 2 * R, h: 2 * R });
    const box = freePlace([at(17, -14), at(17, 14), at(-17, -14), at(0, -24), at(26, 0), at(38, -14)], frame.taken, plot);
    if (!box) return [];
    frame.taken.push(box);
    return [
      { type: 'circle', x: box.x + R, y: box.y + R, r: R, fill: 'ink', role: 'numeral' },
      {
        type: 'text',
        x: box.x + R,
        y: box.y + R + 4.5,
        text: String(numeral.number),
        size: 13,
        weight: 700,
        anchor: 'middle',
        font: 'reading',
        fill: 'sheet',
      },
    ];
  });
}
