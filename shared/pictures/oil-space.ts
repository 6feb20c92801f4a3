import { inkShare, strandCount, strandInk, strandOffsets } from './pressure-ink.ts';
import type { Shape } from './shape.ts';

/** An oil chamber as tinted rectangle and strands along its length. The rows lie across the chamber's height.
 *  @param pressure [Pa]; null = no pressure shown
 *  @param scale scale of the ink [Pa] */
export function oilSpace(box: Extract<Shape, { type: 'oil' }>, pressure: number | null, scale: number): readonly Shape[] {
  const share = pressure === null ? 0 : inkShare(pressure, scale);
  const shapes: Shape[] = [
    {
      type: 'rect',
      x: box.x,
      y: box.y,
      w: box.w,
      h: box.h,
      fill: `oil-${Math.round(1000 * Math.min(1, share))}`,
      role: box.role,
    },
  ];
  if (box.w < 0.3) return shapes;
  const ink = strandInk(share);
  for (const offset of strandOffsets(strandCount(share), box.h)) {
    const y = box.y + box.h / 2 + offset;
    shapes.push({
      type: 'line',
      x1: box.x,
      y1: y,
      x2: box.x + box.w,
      y2: y,
      stroke: ink,
      width: 0.12,
      opacity: 0.75,
      cap: 'butt',
    });
  }
  return shapes;
}
