import type { Box } from './placement.ts';

/** Cutting lines and areas to a box, because drawing lists know no clip. Points are pairs x, y in one flat array. */

/** Pieces of a polyline inside the box. */
export function clipPolyline(points: ArrayLike<number>, box: Box): number[][] {
  const pieces: number[][] = [];
  let piece: number[] = [];
  const close = () => {
    if (piece.length >= 4) pieces.push(piece);
    piece = [];
  };
  for (let i = 0; i + 3 < points.length; i += 2) {
    const cut = clipSegment(points[i] as number, points[i + 1] as number, points[i + 2] as number, points[i + 3] as number, box);
    if (!cut) {
      close();
      continue;
    }
    const [x1, y1, x2, y2] = cut;
    const n = piece.length;
    if (n === 0 || piece[n - 2] !== x1 || piece[n - 1] !== y1) {
      close();
      piece.push(x1, y1);
    }
    piece.push(x2, y2);
  }
  close();
  return pieces;
}

/** Part of a segment inside the box by its parameters along the segment (Liang and Barsky, 1984); null when outside. */
function clipSegment(x1: number, y1: number, x2: number, y2: number, box: Box): readonly [number, number, number, number] | null {
  const dx = x2 - x1;
  const dy = y2 - y1;
  let from = 0;
  let to = 1;
  const edges = [
    [-dx, x1 - box.x],
    [dx, box.x + box.w - x1],
    [-dy, y1 - box.y],
    [dy, box.y + box.h - y1],
  ] as const;
  for (const [p, q] of edges) {
    if (p === 0) {
      if (q < 0) return null;
      continue;
    }
    const r = q / p;
    if (p < 0) from = Math.max(from, r);
    else to = Math.min(to, r);
    if (from > to) return null;
  }
  return [from === 0 ? x1 : x1 + from * dx, from === 0 ? y1 : y1 + from * dy, to === 1 ? x2 : x1 + to * dx, to === 1 ? y2 : y1 + to * dy];
}

/** A polygon cut to the box, one side after the other (Sutherland and Hodgman, 1974); [] when nothing is left. */
export function clipPolygon(points: readonly number[], box: Box): number[] {
  const sides: readonly ((x: number, y: number) => number)[] = [
    (x) => x - box.x,
    (x) => box.x + box.w - x,
    (_, y) => y - box.y,
    (_, y) => box.y + box.h - y,
  ];
  let shape: number[] = [...points];
  for (const inside of sides) {
    const next: number[] = [];
    for (let i = 0; i < shape.length; i += 2) {
      const x1 = shape[i] as number;
      const y1 = shape[i + 1] as number;
      const x2 = shape[(i + 2) % shape.length] as number;
      const y2 = shape[(i + 3) % shape.length] as number;
      const a = inside(x1, y1);
      const b = inside(x2, y2);
      if (a >= 0) next.push(x1, y1);
      if (a >= 0 !== b >= 0) next.push(x1 + ((x2 - x1) * a) / (a - b), y1 + ((y2 - y1) * a) / (a - b));
    }
    shape = next;
  }
  return shape;
}
