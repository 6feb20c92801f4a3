import type { Ink, Shape } from '../pictures/shape.ts';

/** Strokes that symbols are made of. All in modules; y down; angles in degrees, clockwise from +x. */

/** Line widths of UI.md section 5 at ten pixels a module: outline 2.1, inner 1.7, dashes 1.8. */
export const OUTLINE = 0.21;
export const INNER = 0.17;
export const DASHED = 0.18;
/** Dash of pilot and drain lines. */
export const DASH = [0.5, 0.3] as const;
/** Size of port letters and item codes. */
export const LETTER = 1.25;

type Values = Readonly<Record<string, number | string>>;

/** A value as a number, or the fallback where it is absent or a word. */
export function num(values: Values, id: string, fallback: number): number {
  const value = values[id];
  return typeof value === 'number' && Number.isFinite(value) ? value : fallback;
}

export function clamp(value: number, least: number, most: number): number {
  return Math.min(most, Math.max(least, value));
}

/** An open stroke through x, y, x, y, … */
export function stroke(points: readonly number[], width = INNER, ink: Ink = 'ink'): Shape {
  return { type: 'polyline', points, stroke: ink, width };
}

/** A dashed pilot or drain stroke. */
export function dashed(points: readonly number[]): Shape {
  return {
    type: 'polyline',
    points,
    stroke: 'ink',
    width: DASHED,
    dash: DASH,
    cap: 'butt',
  };
}

/** A filled triangle with its apex at x, y, pointing along the angle. */
export function arrowHead(x: number, y: number, angle: number, length = 0.85, half = 0.36, ink: Ink = 'ink'): Shape {
  const c = Math.cos((angle * Math.PI) / 180);
  const s = Math.sin((angle * Math.PI) / 180);
  const bx = x - c * length;
  const by = y - s * length;
  return {
    type: 'polyline',
    points: [x, y, bx - s * half, by + c * half, bx + s * half, by - c * half],
    closed: true,
    fill: ink,
  };
}

/** A stroke with a filled head at its second end. */
export function arrow(x1: number, y1: number, x2: number, y2: number, width = INNER, head = 0.85): readonly Shape[] {
  const angle = (Math.atan2(y2 - y1, x2 - x1) * 180) / Math.PI;
  const length = Math.hypot(x2 - x1, y2 - y1) || 1;
  const back = (head * 0.7) / length;
  return [stroke([x1, y1, x2 - (x2 - x1) * back, y2 - (y2 - y1) * back], width), arrowHead(x2, y2, angle, head, head * 0.42)];
}

/** A zigzag spring between two points; `half` is its half width, `turns` the number of whole waves. */
export function spring(x1: number, y1: number, x2: number, y2: number, half = 0.75, turns = 2.5, width = INNER): Shape {
  const length = Math.hypot(x2 - x1, y2 - y1) || 1;
  const ux = (x2 - x1) / length;
  const uy = (y2 - y1) / length;
  const count = Math.round(turns * 2);
  const points: number[] = [x1, y1];
  for (let k = 0; k < count; k += 1) {
    const along = ((k + 0.5) / count) * length;
    const side = k % 2 === 0 ? -half : half;
    points.push(x1 + ux * along - uy * side, y1 + uy * along + ux * side);
  }
  points.push(x2, y2);
  return stroke(points, width);
}

/** An arc as a stroke, from one angle to another (degrees, clockwise from +x). */
export function arc(x: number, y: number, r: number, from: number, to: number, width: number, ink: Ink = 'ink', role?: string): Shape {
  const a = (from * Math.PI) / 180;
  const b = (to * Math.PI) / 180;
  const large = Math.abs(to - from) > 180 ? 1 : 0;
  const sweep = to >= from ? 1 : 0;
  const d = `M${round(x + r * Math.cos(a))} ${round(y + r * Math.sin(a))}A${r} ${r} 0 ${large} ${sweep} ${round(x + r * Math.cos(b))} ${round(y + r * Math.sin(b))}`;
  return { type: 'path', d, stroke: ink, width, cap: 'butt', role };
}

export function circle(x: number, y: number, r: number, width = OUTLINE, fill: Ink = 'sheet'): Shape {
  return { type: 'circle', x, y, r, stroke: 'ink', width, fill };
}

export function box(x: number, y: number, w: number, h: number, width = OUTLINE, fill: Ink = 'sheet'): Shape {
  return { type: 'rect', x, y, w, h, stroke: 'ink', width, fill };
}

/** A port letter or other short word, centred on x; y is its baseline. */
export function letter(x: number, y: number, text: string, size = LETTER, weight = 600, ink: Ink = 'ink3'): Shape {
  return {
    type: 'text',
    x,
    y,
    text,
    size,
    anchor: 'middle',
    weight,
    fill: ink,
    font: 'body',
  };
}

/** The 90° seat of a check valve with its ball: the apex faces the incoming free flow (towards +x). `lift` 0..1 opens it.
 *  `ux`, `uy` give the direction of free flow. */
export function checkSeat(x: number, y: number, lift: number, ux = 1, uy = 0, ball = 0.6): { seat: Shape; ball: Shape } {
  const arm = ball * 1.6;
  const seat = stroke([x + ux * arm - uy * arm, y + uy * arm + ux * arm, x, y, x + ux * arm + uy * arm, y + uy * arm - ux * arm], OUTLINE);
  const away = ball * Math.SQRT2 + clamp(lift, 0, 1) * ball * 0.7;
  return { seat, ball: circle(x + ux * away, y + uy * away, ball, OUTLINE) };
}

function round(value: number): number {
  return Math.round(value * 1000) / 1000;
}
