import type { Point } from '../symbols/place.ts';
import {
  BARB_FLOW,
  BARB_LEAST,
  BARB_MOST,
  CASING,
  DASHED_WIDTH,
  FILLET,
  inkShare,
  LEAST_FLOW,
  LEAST_SEGMENT,
  LINE_WIDTH,
  strandCount,
  strandInk,
  strandOffsets,
} from './pressure-ink.ts';
import type { RoutedLine } from './route.ts';
import { barbPath, barbPlaces, filletPath } from './route-path.ts';
import type { Shape } from './shape.ts';

/** A line as a drawing list, in modules. */

export const BARB_DEPTH = 0.5;
export const BARB_HALF = 0.52;

/** Barb spacing in modules for a flow [m³/s]; null = none drawn. */
export function barbSpacing(flow: number): number | null {
  const size = Math.abs(flow);
  if (!(size >= LEAST_FLOW)) return null;
  return Math.min(BARB_MOST, Math.max(BARB_LEAST, BARB_FLOW / (size * 60_000))) / 10;
}

/** Path data of all barbs of a line; '' where there are none. */
export function barbsPath(points: readonly Point[], flow: number, phase: number): string {
  const spacing = barbSpacing(flow);
  if (spacing === null) return '';
  return barbPlaces(points, spacing, phase, LEAST_SEGMENT / 10, FILLET)
    .map((barb) => barbPath(barb, flow > 0, BARB_DEPTH, BARB_HALF))
    .join('');
}

/** Path data of the strands of a line at a share of the scale. */
export function strandsPath(points: readonly Point[], share: number): string {
  return strandOffsets(strandCount(share), LINE_WIDTH)
    .map((offset) => filletPath(points, FILLET, offset))
    .join('');
}

/** @param pressure [Pa]; null = no pressure shown
 *  @param flow along the route's direction [m³/s]
 *  @param scale of the ink [Pa] */
export function lineShapes(line: RoutedLine, pressure: number | null, flow: number, scale: number, tintOnly = false): readonly Shape[] {
  const d = filletPath(line.points, FILLET);
  if (line.kind !== 'working')
    return [{ type: 'path', d, stroke: 'ink', width: DASHED_WIDTH, dash: [0.5, 0.3], cap: 'butt', role: line.kind }];
  const share = pressure === null ? 0 : inkShare(pressure, scale);
  const shapes: Shape[] = [
    {
      type: 'path',
      d,
      stroke: 'ink',
      width: LINE_WIDTH + 2 * CASING,
      cap: 'butt',
      ...(share > 1 ? { dash: [0.6, 0.35] } : {}),
      role: 'casing',
    },
    { type: 'path', d, stroke: `oil-${Math.round(1000 * Math.min(1, share))}`, width: LINE_WIDTH, cap: 'butt', role: 'tint' },
  ];
  if (tintOnly) return shapes;
  const strands = strandsPath(line.points, share);
  if (strands) shapes.push({ type: 'path', d: strands, stroke: strandInk(share), width: 0.07, cap: 'butt', opacity: 0.8, role: 'strands' });
  const barbs = barbsPath(line.points, flow, 0);
  if (barbs) {
    shapes.push(
      { type: 'path', d: barbs, stroke: 'sheet', width: 0.42, role: 'halo' },
      { type: 'path', d: barbs, stroke: 'ink', width: 0.17, role: 'barbs' },
    );
  }
  return shapes;
}
