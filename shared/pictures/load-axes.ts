import { fromSi, preferredUnit } from '../units/convert.ts';
import { formatNumber } from '../units/format.ts';
import type { Frame } from './load-chart.ts';
import { roundTicks, tickDigits } from './scale.ts';
import type { Shape } from './shape.ts';

/** Grid and axes in the reader's units: pressure across, flow upwards. */
export function loadAxes(frame: Frame): Shape[] {
  const { plot, input, ends, x, y } = frame;
  const { preferences } = input;
  const pressure = preferredUnit('pressure', preferences);
  const flow = preferredUnit('flow', preferences);
  const shapes: Shape[] = [];
  const across = roundTicks(0, fromSi(ends.pressure, pressure), Math.min(10, Math.max(2, Math.round(plot.w / 62))));
  const up = roundTicks(0, fromSi(ends.flow, flow), Math.min(8, Math.max(2, Math.round(plot.h / 42))));
  const digitsAcross = tickDigits(across);
  const digitsUp = tickDigits(up);
  const base = plot.y + plot.h;
  for (const tick of across) {
    const at = x(tick * pressure.factor);
    if (tick > 0) shapes.push({ type: 'line', x1: at, y1: plot.y, x2: at, y2: base, stroke: 'rule', width: 1, opacity: 0.8 });
    // The unit stands at the axis' end: a number that would touch it is left out.
    if (at > plot.x + plot.w - 44) continue;
    shapes.push({
      type: 'text',
      x: at,
      y: base + 17,
      text: formatNumber(tick, digitsAcross, preferences),
      size: 13,
      anchor: 'middle',
      font: 'reading',
    });
  }
  for (const tick of up) {
    if (tick === 0) continue;
    const at = y(tick * flow.factor);
    shapes.push({ type: 'line', x1: plot.x, y1: at, x2: plot.x + plot.w, y2: at, stroke: 'rule', width: 1, opacity: 0.8 });
    if (at < plot.y + 10) continue;
    shapes.push({
      type: 'text',
      x: plot.x - 7,
      y: at + 4.5,
      text: formatNumber(tick, digitsUp, preferences),
      size: 13,
      anchor: 'end',
      font: 'reading',
    });
  }
  shapes.push(
    { type: 'text', x: plot.x + plot.w, y: base + 17, text: pressure.symbol, size: 13, anchor: 'end', font: 'reading' },
    { type: 'text', x: plot.x - 7, y: plot.y + 5, text: flow.symbol, size: 13, anchor: 'end', font: 'reading' },
    { type: 'line', x1: plot.x, y1: plot.y, x2: plot.x, y2: base, stroke: 'ink', width: 2 },
    { type: 'line', x1: plot.x, y1: base, x2: plot.x + plot.w, y2: base, stroke: 'ink', width: 2 },
  );
  return shapes;
}
