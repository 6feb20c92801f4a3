import type { Ink } from './shape.ts';

/** Letter, ink and dash of a case travel together, by the case's ink number (0 = A). */
export interface CasePen {
  readonly letter: string;
  readonly ink: Ink;
  readonly dash: readonly number[];
  readonly width: number;
}

const pens: readonly (readonly [dash: readonly number[], width: number])[] = [
  [[], 1.7],
  [[], 3],
  [[8, 3], 2],
  [[2, 3], 2.2],
  [[10, 3, 2, 3], 2],
];

/** Width of the case on the drawing: always the thicker. */
const ACTIVE_WIDTH = 3;
const OTHERS_AT_MOST = 2.2;

export function casePen(ink: number): CasePen {
  const [dash, width] = pens[Math.min(ink, pens.length - 1)] as (typeof pens)[number];
  // A sixth case reuses A's ink with E's dash, a seventh B's, and so on.
  return {
    letter: caseLetter(ink),
    ink: `case-${ink % pens.length}`,
    dash,
    width,
  };
}

export function caseLetter(ink: number): string {
  return String.fromCharCode(65 + ink);
}

/** Pen of a trace beside others. With at most two cases both are solid. */
export function tracePen(ink: number, active: boolean, cases: number): CasePen {
  const pen = casePen(ink);
  return {
    ...pen,
    dash: cases <= 2 && ink < pens.length ? [] : pen.dash,
    width: active ? ACTIVE_WIDTH : Math.min(pen.width, OTHERS_AT_MOST),
  };
}
