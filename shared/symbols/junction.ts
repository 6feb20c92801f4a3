import type { SymbolDefinition } from './symbol.ts';

/** A joint: a dot of 1.1 modules. Lines run to its middle. A tee uses a, b and c. */
export const junctionSymbol: SymbolDefinition = {
  kind: 'junction',
  width: 2,
  height: 2,
  ports: {
    a: { x: 0, y: 1, side: 'left', stub: [1, 1] },
    b: { x: 2, y: 1, side: 'right', stub: [1, 1] },
    c: { x: 1, y: 2, side: 'bottom', stub: [1, 1] },
    d: { x: 1, y: 0, side: 'top', stub: [1, 1] },
  },
  anchors: {},
  code: { x: 2.4, y: 2.4 },
  still: () => [{ type: 'circle', x: 1, y: 1, r: 0.55, fill: 'ink' }],
};
