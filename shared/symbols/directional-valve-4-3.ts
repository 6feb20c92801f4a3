import type { Shape } from '../pictures/shape.ts';
import {
  centrePassages,
  cornerSpring,
  crossedArrows,
  parallelArrows,
  portLetters,
  SQUARE,
  solenoid,
  squares,
} from './directional-valve-parts.ts';
import { clamp } from './strokes.ts';
import type { SymbolDefinition, SymbolState } from './symbol.ts';

/** 4/3 directional valve: three squares, chosen centre, two solenoids, centring springs. The row of squares slides over the
 *  fixed ports with the spool (+1 = solenoid a: P to A). */

function moving(state: SymbolState): readonly Shape[] {
  const spool = clamp(state.readings.spool ?? 0, -1, 1);
  const shapes: Shape[] = [
    ...squares(3, 3),
    ...parallelArrows(3),
    ...centrePassages(7, String(state.values.centre ?? 'closed')),
    ...crossedArrows(11),
    ...solenoid(0, 'a', spool > 0.05),
    ...solenoid(15, 'b', spool < -0.05),
    cornerSpring(3, -1),
    cornerSpring(15, 1),
  ];
  return [{ type: 'group', dx: spool * SQUARE, dy: 0, shapes, role: 'spool' }];
}

export const directionalValve43Symbol: SymbolDefinition = {
  kind: 'directional-valve-4-3',
  width: 18,
  height: 4,
  ports: {
    P: { x: 8, y: 4, side: 'bottom' },
    T: { x: 10, y: 4, side: 'bottom' },
    A: { x: 8, y: 0, side: 'top' },
    B: { x: 10, y: 0, side: 'top' },
  },
  anchors: { spool: { x: 9, y: 4 }, 'reading.words': { x: 20.5, y: 2.4 } },
  code: { x: 13.6, y: 5.6 },
  reach: () => ({ left: 5.5, right: 5.5, top: 0.5, bottom: 0.5 }),
  bodies: () => [
    { x: -5.5, y: 0, w: 29, h: 4 },
    { x: 6, y: -1.7, w: 6.2, h: 7.4 },
  ],
  still: () => portLetters(8, 10),
  moving,
};
