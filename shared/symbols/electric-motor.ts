import type { Shape } from '../pictures/shape.ts';
import { arc, circle, clamp, letter, num, stroke } from './strokes.ts';
import type { SymbolDefinition, SymbolState } from './symbol.ts';

/** Electric motor: circle with M over 3~, shaft to the right. On the bench a ring shows torque × rated from 0 to 2
 *  (from eight o'clock over the top to four o'clock), a mark at 1 and a dark mark at pull-out torque. */

const RING = 3.42;

function ringAngle(ratio: number): number {
  return -90 + (clamp(ratio, 0, 2) - 1) * 120;
}

function mark(ratio: number, ink: 'ink' | 'verdict-motor-stalls', width: number): Shape {
  const angle = (ringAngle(ratio) * Math.PI) / 180;
  const c = Math.cos(angle);
  const s = Math.sin(angle);
  const shape = stroke([4 + c * (RING - 0.5), 4 + s * (RING - 0.5), 4 + c * (RING + 0.42), 4 + s * (RING + 0.42)], width, ink);
  return {
    ...shape,
    role: ink === 'ink' ? 'rated-mark' : 'pull-out-mark',
  } as Shape;
}

function moving(state: SymbolState): readonly Shape[] {
  const ratio = state.readings.torqueRatio;
  if (ratio === undefined) return [];
  const shapes: Shape[] = [arc(4, 4, RING, ringAngle(0), ringAngle(2), 0.12, 'rule')];
  const load = Math.abs(ratio);
  if (load > 0.01) {
    shapes.push(arc(4, 4, RING, ringAngle(0), ringAngle(load), 0.44, 'ink2', 'load-ring'));
    shapes.push(arc(4, 4, RING, ringAngle(0), ringAngle(load), 0.1, 'sheet'));
  }
  shapes.push(mark(1, 'ink', 0.18));
  // Pull-out torque at the present voltage over rated torque (rated power over rated speed).
  const rated = num(state.values, 'ratedPower', 0) / num(state.values, 'ratedSpeed', Number.POSITIVE_INFINITY);
  const pullOut = rated > 0 ? (state.readings.pullOutTorque ?? 0) / rated : 0;
  if (pullOut > 0) shapes.push(mark(pullOut, 'verdict-motor-stalls', 0.28));
  return shapes;
}

export const electricMotorSymbol: SymbolDefinition = {
  kind: 'electric-motor',
  width: 8,
  height: 8,
  ports: { shaft: { x: 8, y: 4, side: 'right' } },
  anchors: {
    supply: { x: 6.7, y: 1 },
    relayDial: { x: 1.2, y: 1.2 },
    'reading.torque': { x: 3.4, y: -2.6 },
    'reading.torqueRatio': { x: 3.4, y: -0.7 },
    'reading.speed': { x: 12.6, y: 7.6 },
  },
  code: { x: 0.4, y: 8.3 },
  still: () => [circle(4, 4, 4), letter(4, 4.75, 'M', 2.5, 700, 'ink'), letter(4, 6.2, '3~', 1.2, 600, 'ink')],
  moving,
};
