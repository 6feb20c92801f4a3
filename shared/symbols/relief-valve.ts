import type { Shape } from '../pictures/shape.ts';
import { arrow, arrowHead, box, clamp, dashed, spring, stroke } from './strokes.ts';
import type { SymbolDefinition, SymbolState } from './symbol.ts';

/** Relief valve: one square, normally closed arrow off the ports on the pilot side, spring with slanted arrow; pressure at P
 *  pushes the arrow towards the spring until it stands on the ports. Pilot-operated: pilot stage with a filled triangle. */

function still(values: SymbolState['values']): readonly Shape[] {
  const shapes: Shape[] = [
    box(1, 2, 4, 4),
    dashed([3, 0.95, 0.1, 0.95, 0.1, 4, 1, 4]),
    spring(5, 4.3, 7.4, 4.3, 0.95, 2.5),
    ...arrow(5.25, 5.75, 7.55, 2.15, 0.17, 0.8),
  ];
  if (values.type === 'pilot') {
    shapes.push(box(5, 2, 1.15, 1.15, 0.16), { type: 'polyline', points: [5.9, 2.3, 5.9, 2.85, 5.25, 2.575], closed: true, fill: 'ink' });
  }
  return shapes;
}

function moving(state: SymbolState): readonly Shape[] {
  const x = 2 + clamp(state.readings.lift ?? 0, 0, 1);
  return [stroke([x, 2.1, x, 5.3], 0.19), { ...arrowHead(x, 5.9, 90, 0.95, 0.36), role: 'relief-arrow' } as Shape];
}

export const reliefValveSymbol: SymbolDefinition = {
  kind: 'relief-valve',
  width: 8,
  height: 6,
  ports: {
    P: { x: 3, y: 0, side: 'top', stub: [3, 2] },
    T: { x: 3, y: 6, side: 'bottom' },
  },
  anchors: { setPressure: { x: 7.6, y: 2 }, 'reading.flow': { x: 11.8, y: 7.6 } },
  code: { x: -0.4, y: 7.2 },
  still,
  moving,
};
