import type { Shape } from '../pictures/shape.ts';
import { arrow, arrowHead, box, circle, clamp, dashed, letter, num, OUTLINE, spring, stroke } from './strokes.ts';
import type { SymbolDefinition, SymbolState } from './symbol.ts';

/** Pressure-compensated variable pump: circle, outlet triangle, slanted stroke arrow that flattens as the pump destrokes, the
 *  stop's pad against the arrow's tail, and above the pump the compensator: control square with spring and slanted arrow,
 *  pilot from the outlet, line to the stroke, drain to the case. */

const X = 8;
const Y = 7;
const TIP = 5.4;
const TAIL = 6.3;
/** Slant of the stroke arrow at no stroke and at full stroke [degrees above the horizontal]. */
const FLAT = 14;
const STEEP = 41;

function slant(fraction: number): number {
  return FLAT + (STEEP - FLAT) * clamp(fraction, 0, 1);
}

function along(angle: number, r: number): readonly [number, number] {
  const a = (angle * Math.PI) / 180;
  return [X + r * Math.cos(a), Y - r * Math.sin(a)];
}

function share(values: SymbolState['values'], id: string, fallback: number): number {
  const displacement = num(values, 'displacement', 0);
  return displacement > 0 ? clamp(num(values, id, fallback * displacement) / displacement, 0, 1) : fallback;
}

/** A pad across the direction of the arrow at the end of a radius. */
function pad(angle: number, r: number): Shape {
  const [x, y] = along(angle, r);
  const a = (angle * Math.PI) / 180;
  return stroke([x - 0.75 * Math.sin(a), y - 0.75 * Math.cos(a), x + 0.75 * Math.sin(a), y + 0.75 * Math.cos(a)], OUTLINE);
}

function still(values: SymbolState['values']): readonly Shape[] {
  const stop = slant(share(values, 'maxVolumeStop', 1));
  const least = share(values, 'minVolumeStop', 0);
  const [fx, fy] = along(stop, -TAIL - 0.12);
  const [sx, sy] = along(STEEP, -TAIL - 0.7);
  const shapes: Shape[] = [
    circle(X, Y, 4),
    {
      type: 'polyline',
      points: [X, Y - 4, X - 1.15, Y - 1.95, X + 1.15, Y - 1.95],
      closed: true,
      fill: 'ink',
    },
    // compensator: control square, spring with slanted arrow
    box(2.8, 0.3, 2.2, 2.2, 0.2),
    spring(2.8, 1.4, 0.7, 1.4, 0.75, 2.5),
    ...arrow(0.55, 2.6, 2.75, 0.05, 0.17, 0.75),
    // pilot from the outlet, line to the stroke, drain to the case
    dashed([5, 1.4, X, 1.4]),
    { type: 'circle', x: X, y: 1.4, r: 0.36, fill: 'ink' },
    stroke([4.5, 2.5, 5.45, 3.92], 0.19),
    dashed([3.25, 2.5, 3.25, 4.0, 4.45, 5.1]),
    // stop: screw and pad against the tail
    stroke([fx, fy, sx, sy], 0.15),
    pad(stop, -TAIL - 0.12),
    letter(X + 1.4, 2.2, 'P'),
    letter(13, 11, 'L'),
  ];
  if (least > 0.001) shapes.push(pad(slant(least), TIP + 0.15));
  return shapes;
}

function moving(state: SymbolState): readonly Shape[] {
  const stroked = state.readings.stroke ?? share(state.values, 'maxVolumeStop', 1);
  const angle = slant(stroked);
  const [tx, ty] = along(angle, -TAIL);
  const [hx, hy] = along(angle, TIP);
  const pressure = state.pressures.outlet;
  const setting = num(state.values, 'compensatorPressure', Number.POSITIVE_INFINITY);
  const band = Math.max(1, num(state.values, 'band', 8e5));
  const shift = pressure === undefined ? 0 : clamp((pressure - (setting - band)) / band, 0, 1);
  const x = 3.45 + shift * 0.45;
  return [
    ...(arrow(tx, ty, hx, hy, 0.2, 1.15).map((shape) => ({
      ...shape,
      role: 'stroke-arrow',
    })) as Shape[]),
    stroke([x, 0.35, x, 1.8], 0.17),
    arrowHead(x, 2.42, 90, 0.75, 0.32),
  ];
}

export const compensatedPumpSymbol: SymbolDefinition = {
  kind: 'compensated-pump',
  width: 13,
  height: 12,
  ports: {
    suction: { x: X, y: 12, side: 'bottom', stub: [X, Y + 4] },
    outlet: { x: X, y: 0, side: 'top', stub: [X, Y - 4] },
    drain: {
      x: 12,
      y: 12,
      side: 'bottom',
      stub: [X + 2.83, Y + 2.83, 12, Y + 4],
      line: 'drain',
    },
    shaft: { x: 4, y: Y, side: 'left' },
  },
  anchors: {
    compensatorPressure: { x: 2.75, y: -0.1 },
    maxVolumeStop: { x: 2.75, y: 11.6 },
    minVolumeStop: { x: 12.6, y: 5.2 },
    'reading.flow': { x: 15, y: -1.2 },
  },
  code: { x: 13, y: 8.8 },
  bodies: () => [
    { x: 4, y: 3, w: 8, h: 8 },
    { x: 0.4, y: -0.1, w: 7.8, h: 3.2 },
    { x: 2.3, y: 9.6, w: 2.5, h: 2.3 },
    { x: 11, y: 2.6, w: 1.7, h: 2 },
    { x: 11.5, y: 9.6, w: 2, h: 2.4 },
  ],
  still,
  moving,
};
