import type { TapeGeometry } from './tape-geometry.ts';
import type { TapeModel } from './tape-model.ts';

/** Measures of the tape [CSS px]; the style sheet carries the same left column. */
export interface TapeMeasures {
  readonly left: number;
  /** Margin right of the plot, for letters at trace ends. */
  readonly right: number;
  readonly rowHeight: number;
  readonly shortFlags: boolean;
  readonly bareMarks: boolean;
}

export function tapeMeasures(lanes: number, isNarrow: boolean): TapeMeasures {
  if (lanes === 1) return { left: 78, right: 14, rowHeight: 26, shortFlags: true, bareMarks: true };
  if (isNarrow) return { left: 108, right: 16, rowHeight: 26, shortFlags: true, bareMarks: false };
  if (lanes <= 3) return { left: 116, right: 20, rowHeight: 25, shortFlags: true, bareMarks: false };
  return { left: 150, right: 26, rowHeight: 23, shortFlags: false, bareMarks: false };
}

/** From three cases on one lane is big and the others are folded to rows. */
export const FOLD_FROM = 3;
export const FOLDED_ROW = 22;

export interface TapePlan {
  readonly geometry: TapeGeometry;
  /** Indices of folded lanes, in order. */
  readonly folded: readonly number[];
  readonly focus: number;
}

/** Where lanes lie in a box of the given size. */
export function planTape(model: TapeModel, size: { width: number; height: number }, right: number, focusAddress: string | null): TapePlan {
  const count = model.lanes.length;
  const fold = model.cases.length >= FOLD_FROM && count > 1;
  const wanted = model.lanes.findIndex((lane) => lane.lane.address === focusAddress);
  const focus = Math.max(wanted, 0);
  const folded = fold ? model.lanes.map((_, index) => index).filter((index) => index !== focus) : [];
  const height = Math.max(0, size.height - folded.length * FOLDED_ROW);
  const plotWidth = Math.max(0, size.width - right);
  const each = count > 0 ? height / count : height;
  const lanes = fold ? [{ index: focus, top: 0, height }] : model.lanes.map((_, index) => ({ index, top: index * each, height: each }));
  return {
    folded,
    focus,
    geometry: {
      width: size.width,
      height,
      plotWidth,
      from: 0,
      to: model.duration,
      lanes,
      letters: model.cases.length >= FOLD_FROM,
    },
  };
}
