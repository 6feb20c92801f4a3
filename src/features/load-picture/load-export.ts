import type { LoadCase, LoadNumeral } from '#shared/pictures/load-chart.ts';
import { loadPicture } from '#shared/pictures/load-picture.ts';
import { movingShapes } from '#shared/pictures/load-picture-now.ts';
import { pictureToSvg } from '#shared/pictures/svg.ts';
import type { UnitPreferences } from '#shared/units/convert.ts';

export const EXPORT_WIDTH = 900;
export const EXPORT_HEIGHT = 640;

/** The load picture at a moment, on white ground in the light colours, as one SVG file. */
export function loadPictureSvg(
  title: string,
  cases: readonly LoadCase[],
  numerals: readonly LoadNumeral[],
  preferences: UnitPreferences,
  time: number,
): string {
  const chart = loadPicture({ title, cases, numerals, preferences, width: EXPORT_WIDTH, height: EXPORT_HEIGHT });
  const shapes = [...chart.below, ...movingShapes(chart, cases, time), ...chart.above];
  return pictureToSvg({ ...chart.picture, shapes }, 'light', { ground: 'white' });
}
