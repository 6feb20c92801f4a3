import type { Shape } from '../pictures/shape.ts';
import { box, clamp, letter, num, OUTLINE, spring, stroke } from './strokes.ts';
import type { Reach, SymbolDefinition, SymbolState } from './symbol.ts';

/** Double-acting cylinder with its load. Piston, rod and load move to scale: the whole stroke is 18 modules. Both oil chambers
 *  take the pressure ink. Loads are drawn as what they are: a bale of card against a wall, a spring, or a block of metal. */

const BARREL = 20;
const TRAVEL = 18;
const PISTON = 1.5;
/** Rod left showing with the rod in. */
const SHOWN = 0.9;
const PLATE = 0.9;
/** Thickness left of a bale when the rod is fully out. */
const PRESSED = 4;
const WALL = BARREL + SHOWN + TRAVEL + PLATE + PRESSED;

type Values = SymbolState['values'];

function loadKind(values: Values): 'bale' | 'spring' | 'block' | 'none' {
  if (num(values, 'workForce', 0) > 0) return 'bale';
  if (num(values, 'springRate', 0) > 0) return 'spring';
  if (num(values, 'loadForce', 0) !== 0 || num(values, 'mass', 0) >= 200) return 'block';
  return 'none';
}

function reach(values: Values): Reach {
  const kind = loadKind(values);
  const right = kind === 'none' ? SHOWN + TRAVEL + 1 : kind === 'block' ? SHOWN + TRAVEL + 4.6 : WALL - BARREL + 1.4;
  return { left: 0, right, top: kind === 'none' ? 0 : 1.2, bottom: 0 };
}

function wall(): readonly Shape[] {
  const shapes: Shape[] = [stroke([WALL, -1.2, WALL, 7.4], OUTLINE)];
  for (let k = 0; k < 9; k += 1) {
    const y = -0.3 + k * 0.95;
    shapes.push(stroke([WALL + 0.15, y, WALL + 1.25, y - 0.85], 0.16));
  }
  return shapes;
}

/** Card between the plate and the wall, in sheets that are pressed together. */
function bale(left: number): readonly Shape[] {
  const shapes: Shape[] = [
    {
      type: 'rect',
      x: left,
      y: -0.3,
      w: WALL - left,
      h: 6.6,
      fill: 'card',
      stroke: 'ink',
      width: 0.17,
      role: 'bale',
    },
  ];
  const sheets = 7;
  const step = (WALL - left) / sheets;
  for (let k = 0; k < sheets; k += 1) {
    const x = left + k * step;
    if (k > 0) shapes.push(stroke([x, -0.3, x, 6.3], 0.16));
    const zigzag: number[] = [];
    for (let j = 0; j <= 6; j += 1) zigzag.push(x + step * (j % 2 === 0 ? 0.22 : 0.78), 0.05 + j * 1);
    shapes.push({
      type: 'polyline',
      points: zigzag,
      stroke: 'ink2',
      width: 0.08,
      opacity: 0.7,
    });
  }
  return shapes;
}

function load(values: Values, end: number): readonly Shape[] {
  const kind = loadKind(values);
  const plate: Shape = {
    type: 'rect',
    x: end,
    y: -0.8,
    w: PLATE,
    h: 7.6,
    fill: 'metal',
    stroke: 'ink',
    width: 0.18,
    role: 'plate',
  };
  const stretch = TRAVEL / Math.max(1e-6, num(values, 'stroke', 0.5));
  if (kind === 'bale') {
    const contact = BARREL + SHOWN + PLATE + num(values, 'workContact', 0) * stretch;
    return [...bale(clamp(Math.max(end + PLATE, contact), 0, WALL - 0.5)), ...wall(), plate];
  }
  if (kind === 'spring') {
    const free = BARREL + SHOWN + PLATE + num(values, 'springFrom', 0) * stretch;
    return [spring(Math.max(end + PLATE, free), 3, WALL, 3, 2, 4, 0.22), ...wall(), plate];
  }
  if (kind === 'block')
    return [
      {
        type: 'rect',
        x: end,
        y: -0.8,
        w: 3.6,
        h: 7.6,
        fill: 'metal',
        stroke: 'ink',
        width: 0.18,
        role: 'block',
      },
    ];
  return [];
}

function moving(state: SymbolState): readonly Shape[] {
  const { values } = state;
  const whole = Math.max(1e-6, num(values, 'stroke', 0.5));
  const position = clamp(state.readings.position ?? 0, 0, whole);
  const face = 0.25 + (position / whole) * TRAVEL;
  const end = BARREL + SHOWN + (position / whole) * TRAVEL;
  return [
    {
      type: 'oil',
      x: 0.12,
      y: 0.12,
      w: Math.max(0, face - 0.12),
      h: 5.76,
      port: 'A',
      role: 'cap-chamber',
    },
    {
      type: 'oil',
      x: face + PISTON,
      y: 0.12,
      w: BARREL - 0.12 - face - PISTON,
      h: 5.76,
      port: 'B',
      role: 'rod-chamber',
    },
    ...load(values, end),
    {
      type: 'rect',
      x: face + PISTON,
      y: 2.1,
      w: end - face - PISTON,
      h: 1.8,
      fill: 'metal',
      stroke: 'ink',
      width: 0.18,
      role: 'rod',
    },
    {
      type: 'rect',
      x: face,
      y: 0.1,
      w: PISTON,
      h: 5.8,
      fill: 'sheet',
      stroke: 'ink',
      width: 0.19,
      role: 'piston',
    },
    {
      type: 'rect',
      x: 0,
      y: 0,
      w: BARREL,
      h: 6,
      stroke: 'ink',
      width: OUTLINE,
      fill: 'none',
    },
    stroke([BARREL, 1.5, BARREL, 4.5], 0.42),
  ];
}

export const cylinderSymbol: SymbolDefinition = {
  kind: 'cylinder',
  width: BARREL,
  height: 7,
  ports: {
    A: { x: 2, y: 7, side: 'bottom', stub: [2, 6] },
    B: { x: 18, y: 7, side: 'bottom', stub: [18, 6] },
  },
  anchors: {
    load: { x: BARREL + 2, y: 2.1 },
    'reading.position': { x: 27, y: -1.8 },
    'reading.loadForce': { x: 34, y: 9.8 },
  },
  code: { x: 0.8, y: -0.7 },
  reach,
  bodies: (values) => [
    { x: 0, y: 0, w: BARREL, h: 6 },
    { x: BARREL, y: -reach(values).top, w: reach(values).right, h: 6 + 2 * reach(values).top },
  ],
  still: () => [box(0, 0, BARREL, 6), letter(0.75, 7.5, 'A'), letter(19.3, 7.5, 'B')],
  moving,
};
