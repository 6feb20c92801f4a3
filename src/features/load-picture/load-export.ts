import type { LoadCase, LoadNumeral } from '#shared/pictures/load-chart.ts';
import { loadPicture } from '#shared/pictures/load-picture.ts';
import { nowShapes, phaseStart, travelledShapes } from '#shared/pictures/load-picture-now.ts';
import type { Shape } from '#shared/pictures/shape.ts';
import { pictureToSvg } from '#shared/pictures/svg.ts';
import type { UnitPreferences } from '#shared/units/convert.ts';
import { formatQuantity } from '#shared/units/format.ts';

export const EXPORT_WIDTH = 900;
const CHART_HEIGHT = 620;
const HEAD = 44;
export const EXPORT_HEIGHT = CHART_HEIGHT + HEAD;

/** The load picture at a moment, on white ground in the light colours, as one SVG file. */
export function loadPictureSvg(
  title: string,
  cases: readonly LoadCase[],
  numerals: readonly LoadNumeral[],
  preferences: UnitPreferences,
  time: number,
  starts: readonly number[],
): string {
  const chart = loadPicture({ title, cases, numerals, preferences, width: EXPORT_WIDTH, height: CHART_HEIGHT });
  const moment = `At ${formatQuantity(time, 'time', preferences).text}, ${cases.map((entry) => `${entry.letter}${entry.words ? ` ${entry.words}` : ''}`).join('; ')}`;
  const shapes: Shape[] = [
    { type: 'text', x: 14, y: 21, text: title, size: 16, weight: 700 },
    { type: 'text', x: 14, y: 39, text: moment, size: 13, fill: 'ink2' },
    {
      type: 'group',
      dx: 0,
      dy: HEAD,
      shapes: [
        ...chart.below,
        ...travelledShapes(chart, cases, time, phaseStart(starts, time)),
        ...chart.above,
        ...nowShapes(chart, cases, time),
      ],
    },
  ];
  return pictureToSvg({ width: EXPORT_WIDTH, height: EXPORT_HEIGHT, title, shapes }, 'light', { ground: 'white' });
}
