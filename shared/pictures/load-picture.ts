import { loadAxes } from './load-axes.ts';
import { bandNames, limitLines, limitNames, loadBands } from './load-bands.ts';
import { type LoadChart, type LoadPictureInput, loadFrame } from './load-chart.ts';
import { numeralMarks, pumpLines, pumpWords, stallMarks, toCome } from './load-marks.ts';
import type { Shape } from './shape.ts';

/** The load picture (P–Q chart) as a drawing list in pixels: bands of motor load, pump lines, limits of pressure, the way of the
 *  operating point. What moves with the cursor is in load-picture-now.ts. */
export function loadPicture(input: LoadPictureInput): LoadChart {
  const frame = loadFrame(input);
  const { plot } = frame;
  // Marks take their places first, then words by their weight.
  const marks = [...stallMarks(frame), ...numeralMarks(frame)];
  const words = [...limitNames(frame), ...bandNames(frame), ...pumpWords(frame)];
  const below: Shape[] = [
    { type: 'rect', x: plot.x, y: plot.y, w: plot.w, h: plot.h, fill: 'sheet', role: 'ground' },
    ...loadBands(frame),
    ...loadAxes(frame),
    ...limitLines(frame),
    ...pumpLines(frame),
    ...toCome(frame),
  ];
  const above = [...words, ...marks];
  const picture = { width: input.width, height: input.height, title: input.title, shapes: [...below, ...above] };
  return { picture, below, above, plot, x: frame.x, y: frame.y };
}
