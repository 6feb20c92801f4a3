import type { Shape } from '../pictures/shape.ts';
import { checkSeat, dashed, spring, stroke } from './strokes.ts';
import type { SymbolDefinition, SymbolState } from './symbol.ts';

/** Filter: a square on its corner with a dashed line across the flow, and its spring-loaded bypass check beside it. */

function moving(state: SymbolState): readonly Shape[] {
  const open = (state.readings.bypassFlow ?? 0) > 1e-7 ? 1 : 0;
  const { seat, ball } = checkSeat(3.1, 1, open, 1, 0, 0.55);
  const from = 3.1 + 0.55 * Math.SQRT2 + open * 0.385 + 0.55;
  return [spring(from, 1, 5.7, 1, 0.4, 1.5, 0.15), seat, { ...ball, role: 'bypass-ball' } as Shape];
}

export const filterSymbol: SymbolDefinition = {
  kind: 'filter',
  width: 8,
  height: 6,
  ports: {
    A: { x: 0, y: 4, side: 'left', stub: [2, 4] },
    B: { x: 8, y: 4, side: 'right', stub: [6, 4] },
  },
  anchors: { 'reading.drop': { x: 4, y: 7.6 } },
  code: { x: 1.6, y: 6.6 },
  bodies: () => [
    { x: 1.8, y: 1.8, w: 4.4, h: 4.4 },
    { x: 0.4, y: 0.2, w: 7.2, h: 2 },
  ],
  still: () => [
    {
      type: 'polyline',
      points: [2, 4, 4, 2, 6, 4, 4, 6],
      closed: true,
      stroke: 'ink',
      width: 0.21,
      fill: 'sheet',
    },
    dashed([4, 2.2, 4, 5.8]),
    stroke([0.6, 4, 0.6, 1, 3.1, 1], 0.2),
    stroke([5.7, 1, 7.4, 1, 7.4, 4], 0.2),
  ],
  moving,
};
