import type { Shape } from '../pictures/shape.ts';
import { crossedArrows, parallelArrows, portLetters, SQUARE, solenoid, squares } from './directional-valve-parts.ts';
import { clamp, spring } from './strokes.ts';
import type { SymbolDefinition, SymbolState } from './symbol.ts';

/** 4/2 directional valve: two squares, one solenoid, return spring. At rest the crossed square stands on the ports (P to B);
 *  solenoid a slides the parallel square over them (P to A). */

function moving(state: SymbolState): readonly Shape[] {
  const spool = clamp(state.readings.spool ?? 0, 0, 1);
  const shapes: Shape[] = [
    ...squares(3, 2),
    ...parallelArrows(3),
    ...crossedArrows(7),
    ...solenoid(0, 'a', spool > 0.05),
    spring(11, 2, 13.2, 2, 0.75, 2.5),
  ];
  return [{ type: 'group', dx: spool * SQUARE, dy: 0, shapes, role: 'spool' }];
}

export const directionalValve42Symbol: SymbolDefinition = {
  kind: 'directional-valve-4-2',
  width: 14,
  height: 4,
  ports: {
    P: { x: 8, y: 4, side: 'bottom' },
    T: { x: 10, y: 4, side: 'bottom' },
    A: { x: 8, y: 0, side: 'top' },
    B: { x: 10, y: 0, side: 'top' },
  },
  anchors: { spool: { x: 9, y: 4 }, 'reading.words': { x: 18.5, y: 2.4 } },
  code: { x: 13, y: 5.6 },
  reach: () => ({ left: 1.5, right: 4, top: 0.5, bottom: 0.5 }),
  bodies: () => [
    { x: -1.5, y: 0, w: 19, h: 4 },
    { x: 6, y: -1.7, w: 6.2, h: 7.4 },
  ],
  still: () => portLetters(8, 10),
  moving,
};
