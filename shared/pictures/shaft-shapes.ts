import type { PlacedPort, Point } from '../symbols/place.ts';
import { arrowHead } from '../symbols/strokes.ts';
import type { Shape } from './shape.ts';

/** A shaft: a double line between two machines with a curved arrow for the sense of rotation. */

/** Corners of the shaft between two shaft ports. */
export function shaftPath(from: PlacedPort, to: PlacedPort): readonly Point[] {
  if (from.x === to.x || from.y === to.y) return [from, to];
  const level = from.side === 'left' || from.side === 'right';
  const middle = level ? (from.x + to.x) / 2 : (from.y + to.y) / 2;
  return level
    ? [from, { x: middle, y: from.y }, { x: middle, y: to.y }, to]
    : [from, { x: from.x, y: middle }, { x: to.x, y: middle }, to];
}

export function shaftShapes(points: readonly Point[]): readonly Shape[] {
  const flat = points.flatMap((point) => [point.x, point.y]);
  const a = points[0];
  const b = points[points.length - 1];
  const shapes: Shape[] = [
    { type: 'polyline', points: flat, stroke: 'ink', width: 0.98, cap: 'butt', role: 'shaft' },
    { type: 'polyline', points: flat, stroke: 'sheet', width: 0.6, cap: 'butt' },
  ];
  if (!a || !b || points.length !== 2) return shapes;
  const length = Math.hypot(b.x - a.x, b.y - a.y);
  if (length < 3) return shapes;
  const x = (a.x + b.x) / 2;
  const y = (a.y + b.y) / 2;
  if (a.y === b.y) {
    shapes.push(
      {
        type: 'path',
        d: `M${x + 0.25} ${y + 1.5}C${x - 0.9} ${y + 0.75} ${x - 0.9} ${y - 0.75} ${x + 0.1} ${y - 1.5}`,
        stroke: 'ink',
        width: 0.19,
      },
      arrowHead(x + 0.75, y - 1.68, -20, 0.85, 0.38),
    );
  } else {
    shapes.push(
      {
        type: 'path',
        d: `M${x + 1.5} ${y + 0.25}C${x + 0.75} ${y - 0.9} ${x - 0.75} ${y - 0.9} ${x - 1.5} ${y + 0.1}`,
        stroke: 'ink',
        width: 0.19,
      },
      arrowHead(x - 1.68, y + 0.75, 110, 0.85, 0.38),
    );
  }
  return shapes;
}
