import { circle } from './strokes.ts';
import type { SymbolDefinition } from './symbol.ts';

/** Flow meter: instrument circle in the line with a wave inside. */
export const flowMeterSymbol: SymbolDefinition = {
  kind: 'flow-meter',
  width: 6,
  height: 5,
  ports: {
    A: { x: 0, y: 2.5, side: 'left', stub: [0.8, 2.5] },
    B: { x: 6, y: 2.5, side: 'right', stub: [5.2, 2.5] },
  },
  anchors: { 'reading.flow': { x: 3, y: -0.8 } },
  code: { x: 3, y: 6.2 },
  still: () => [
    circle(3, 2.5, 2.2),
    {
      type: 'path',
      d: 'M1.5 2.1Q2.25 1.3 3 2.1T4.5 2.1',
      stroke: 'ink',
      width: 0.18,
    },
    {
      type: 'path',
      d: 'M1.5 3.3Q2.25 2.5 3 3.3T4.5 3.3',
      stroke: 'ink',
      width: 0.18,
    },
  ],
};
