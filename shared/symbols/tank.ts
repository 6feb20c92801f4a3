import { stroke } from './strokes.ts';
import type { SymbolDefinition } from './symbol.ts';

/** Open reservoir: a flat U; the line ends above its bottom. */
export const tankSymbol: SymbolDefinition = {
  kind: 'tank',
  width: 4,
  height: 2,
  ports: { T: { x: 2, y: 0, side: 'top', stub: [2, 1.25] } },
  anchors: {},
  code: { x: 4.9, y: 2 },
  still: () => [stroke([0.3, 0.8, 0.3, 2, 3.7, 2, 3.7, 0.8], 0.21)],
};
