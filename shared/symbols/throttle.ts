import type { Shape } from '../pictures/shape.ts';
import { arrow, OUTLINE, stroke } from './strokes.ts';
import type { SymbolDefinition } from './symbol.ts';

/** Adjustable throttle: two facing arcs squeezing the line, with a slanted arrow. */

const arcs: readonly Shape[] = [
  {
    type: 'path',
    d: 'M0.8 0.55Q2 2.45 3.2 0.55',
    stroke: 'ink',
    width: OUTLINE,
  },
  {
    type: 'path',
    d: 'M0.8 3.45Q2 1.55 3.2 3.45',
    stroke: 'ink',
    width: OUTLINE,
  },
];

export const throttleSymbol: SymbolDefinition = {
  kind: 'throttle',
  width: 4,
  height: 4,
  ports: {
    A: { x: 0, y: 2, side: 'left', stub: [0.7, 2] },
    B: { x: 4, y: 2, side: 'right', stub: [3.3, 2] },
  },
  anchors: { opening: { x: 3.8, y: 0.2 }, 'reading.flow': { x: 2, y: -1 } },
  code: { x: 2, y: 5.4 },
  still: () => [stroke([0.7, 2, 3.3, 2], 0.19), ...arcs, ...arrow(0.5, 3.9, 3.65, 0.35, 0.18, 0.85)],
};
