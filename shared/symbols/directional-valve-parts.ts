import type { Shape } from '../pictures/shape.ts';
import { arrow, box, letter, OUTLINE, spring, stroke } from './strokes.ts';

/** Squares, passages, solenoids and springs that directional valves are put together from. One square is four modules; its
 *  ports stand one and three modules from its left edge, P and T below, A and B above. */

export const SQUARE = 4;

/** P to A and B to T, in the square whose left edge is at x. */
export function parallelArrows(x: number): readonly Shape[] {
  return [...arrow(x + 1, 3.9, x + 1, 0.12, 0.18, 0.95), ...arrow(x + 3, 0.1, x + 3, 3.88, 0.18, 0.95)];
}

/** P to B and A to T. */
export function crossedArrows(x: number): readonly Shape[] {
  return [...arrow(x + 1, 3.9, x + 2.95, 0.15, 0.18, 0.95), ...arrow(x + 1, 0.1, x + 2.95, 3.85, 0.18, 0.95)];
}

function stop(x: number, top: boolean): readonly Shape[] {
  const end = top ? 0.95 : 3.05;
  return [stroke([x, top ? 0 : 4, x, end], 0.18), stroke([x - 0.6, end, x + 0.6, end], 0.18)];
}

/** The centre square: closed, open, tandem or float. */
export function centrePassages(x: number, centre: string): readonly Shape[] {
  const p = x + 1;
  const t = x + 3;
  if (centre === 'open') {
    return [stroke([p, 0, p, 4], 0.18), stroke([t, 0, t, 4], 0.18), stroke([p, 2, t, 2], 0.18)];
  }
  if (centre === 'tandem') {
    return [...stop(p, true), ...stop(t, true), stroke([p, 4, p, 2.6, t, 2.6, t, 4], 0.18)];
  }
  if (centre === 'float') {
    return [...stop(p, false), stroke([p, 0, p, 1.7, t, 1.7], 0.18), stroke([t, 0, t, 4], 0.18)];
  }
  return [...stop(p, true), ...stop(t, true), ...stop(p, false), ...stop(t, false)];
}

/** Outlines of a row of squares from x. */
export function squares(x: number, count: number): readonly Shape[] {
  return Array.from({ length: count }, (_, k) => box(x + SQUARE * k, 0, SQUARE, SQUARE, OUTLINE));
}

/** A solenoid, 3 by 1.8, with its left edge at x; filled while energised. The letter stands beside it. */
export function solenoid(x: number, name: 'a' | 'b', on: boolean): readonly Shape[] {
  const slash: Shape = stroke([x + 1, 2.85, x + 2.2, 1.15], on ? 0.22 : 0.17, on ? 'sheet' : 'ink');
  return [
    {
      ...box(x, 1.1, 3, 1.8, 0.19, on ? 'ink' : 'sheet'),
      role: `solenoid-${name}${on ? '-on' : ''}`,
    } as Shape,
    slash,
    letter(name === 'a' ? x - 0.85 : x + 3.85, 2.45, name, 1.25, 700, 'ink'),
  ];
}

/** The centring or return spring in the corner under the solenoid: from the square's edge outwards. */
export function cornerSpring(x: number, outward: 1 | -1): Shape {
  return spring(x, 3.45, x + outward * 1.6, 3.45, 0.42, 2, 0.17);
}

/** Port letters beside the lines: left of the left pair, right of the right pair. */
export function portLetters(left: number, right: number): readonly Shape[] {
  return [letter(left - 1.25, -0.6, 'A'), letter(right + 1.35, -0.6, 'B'), letter(left - 1.25, 5.4, 'P'), letter(right + 1.35, 5.4, 'T')];
}
