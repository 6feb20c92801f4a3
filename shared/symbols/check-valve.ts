import type { Shape } from '../pictures/shape.ts';
import { checkSeat, num, spring, stroke } from './strokes.ts';
import type { SymbolDefinition, SymbolState } from './symbol.ts';

/** Check valve: the point of the V faces the incoming free flow (A to B); the ball lifts away at its open side. A spring is
 *  drawn where the valve has a cracking pressure. */

const SEAT = 0.35;
const BALL = 0.58;

function moving(state: SymbolState): readonly Shape[] {
  const flow = state.readings.flow ?? 0;
  const rated = num(state.values, 'ratedFlow', 0);
  const lift = rated > 0 ? Math.min(1, Math.sqrt(Math.max(0, flow) / (0.25 * rated))) : flow > 0 ? 1 : 0;
  const { seat, ball } = checkSeat(SEAT, 1, lift, 1, 0, BALL);
  const shapes: Shape[] = [];
  if (num(state.values, 'crackingPressure', 0) > 0) {
    const from = SEAT + BALL * (Math.SQRT2 + lift * 0.7 + 1);
    shapes.push(spring(from, 1, 3.5, 1, 0.4, 1.5, 0.15), stroke([3.5, 0.5, 3.5, 1.5], 0.17));
  }
  shapes.push(seat, { ...ball, role: 'check-ball' } as Shape);
  return shapes;
}

export const checkValveSymbol: SymbolDefinition = {
  kind: 'check-valve',
  width: 4,
  height: 2,
  ports: {
    A: { x: 0, y: 1, side: 'left', stub: [SEAT, 1] },
    B: { x: 4, y: 1, side: 'right', stub: [3.5, 1] },
  },
  anchors: { 'reading.flow': { x: 2, y: -1 } },
  code: { x: 1.6, y: 3.4 },
  still: () => [],
  moving,
};
