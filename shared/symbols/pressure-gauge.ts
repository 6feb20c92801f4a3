import type { Ink, Shape } from '../pictures/shape.ts';
import { arc, arrow, circle, clamp, letter, num } from './strokes.ts';
import type { SymbolDefinition, SymbolState } from './symbol.ts';

/** Pressure gauge: circle on a stub with a needle; the arc behind the needle takes the pressure ink. Full range is 270°. */

const X = 3;
const Y = 2.4;

function moving(state: SymbolState): readonly Shape[] {
  const range = num(state.values, 'range', 0);
  const pressure = state.readings.pressure;
  const share = range > 0 && pressure !== undefined ? clamp(pressure / range, 0, 1.05) : 0;
  const angle = 135 + 270 * share;
  const radians = (angle * Math.PI) / 180;
  const shapes: Shape[] = [];
  if (share > 0.01 && pressure !== undefined) {
    const scale = state.inkScale ?? range;
    const ink: Ink = `oil-${Math.round(1000 * clamp(pressure / scale, 0, 1))}`;
    shapes.push(arc(X, Y, 1.62, 135, angle, 0.52, ink, 'gauge-arc'));
  }
  const c = Math.cos(radians);
  const s = Math.sin(radians);
  shapes.push(
    ...(arrow(X - 0.7 * c, Y - 0.7 * s, X + 1.5 * c, Y + 1.5 * s, 0.16, 0.75).map((shape) => ({ ...shape, role: 'needle' })) as Shape[]),
    { type: 'circle', x: X, y: Y, r: 0.26, fill: 'ink' },
  );
  return shapes;
}

export const pressureGaugeSymbol: SymbolDefinition = {
  kind: 'pressure-gauge',
  width: 6,
  height: 6,
  ports: { M: { x: X, y: 6, side: 'bottom', stub: [X, Y + 2.2] } },
  anchors: { 'reading.pressure': { x: 8.8, y: 2.4 } },
  code: { x: 0.3, y: 5.4 },
  bodies: () => [{ x: 0.8, y: 0.2, w: 4.4, h: 4.4 }],
  still: () => [circle(X, Y, 2.2), letter(X + 1.6, 5.6, 'M')],
  moving,
};
