import type { Curve } from '../findings/load-curves.ts';
import { formatQuantity } from '../units/format.ts';
import { clipPolygon, clipPolyline } from './clip.ts';
import { curvePoints, type Frame, placeWords, SMALL, wordsBox } from './load-chart.ts';
import { type Box, freePlace, textWidth } from './placement.ts';
import type { Ink, Shape } from './shape.ts';

/** Bands of motor load with the map's names and textures, and the straight limits of pressure. */

export function loadBands(frame: Frame): Shape[] {
  const curves = frame.active?.curves;
  if (!curves) return [];
  const area = (curve: Curve, verdict: string, texture: string): Shape[] => {
    const line = curvePoints(frame, curve);
    if (line.length < 4) return [];
    const far = frame.plot.x + frame.plot.w + 1;
    const above = frame.plot.y - 1;
    const polygon = clipPolygon([line[0] as number, above, ...line, far, line[line.length - 1] as number, far, above], frame.plot);
    if (polygon.length < 6) return [];
    const tint = `tint-${verdict}` as Ink;
    const ink = `verdict-${verdict}` as Ink;
    return [
      { type: 'polyline', points: polygon, closed: true, fill: tint, role: `band ${verdict}` },
      { type: 'polyline', points: polygon, closed: true, stroke: ink, texture, opacity: 0.5, role: `texture ${verdict}` },
    ];
  };
  const edge = (curve: Curve, stroke: Ink, width: number, dash?: readonly number[]): Shape[] =>
    clipPolyline(curvePoints(frame, curve), frame.plot).map((piece) => ({
      type: 'polyline',
      points: piece,
      stroke,
      width,
      dash,
      cap: 'butt',
      role: 'limit',
    }));
  return [
    ...area(curves.rated, 'over', 'dots'),
    ...area(curves.trips, 'trips', 'hatch'),
    ...area(curves.pullOut, 'motor-stalls', 'cross-hatch'),
    ...edge(curves.rated, 'ink', 1.6),
    ...edge(curves.trips, 'ink', 1.4, [8, 4]),
    ...edge(curves.pullOut, 'verdict-motor-stalls', 2.4),
  ];
}

/** Cut-off, and the relief from cracking to its set pressure. */
export function limitLines(frame: Frame): Shape[] {
  const { active, plot, x, y } = frame;
  if (!active) return [];
  const { curves } = active;
  const shapes: Shape[] = [];
  const at = x(curves.deadHead);
  if (curves.deadHead > 0) {
    const top = plot.y + 0.66 * plot.h;
    shapes.push({ type: 'line', x1: at, y1: y(0), x2: at, y2: top, stroke: 'ink3', width: 1.6, role: 'cut-off' });
  }
  if (curves.relief) {
    const full = active.reliefFlow === null ? plot.y : y(active.reliefFlow);
    const line = [x(curves.relief.cracks), y(0), x(curves.relief.set), full];
    for (const points of clipPolyline(line, plot)) {
      shapes.push({ type: 'polyline', points, stroke: 'ink', width: 1.6, dash: [2, 3], cap: 'butt', role: 'relief' });
    }
  }
  return shapes;
}

/** Words along the limits of pressure, upright beside them. */
export function limitNames(frame: Frame): Shape[] {
  const { active, plot, x } = frame;
  if (!active) return [];
  const { deadHead, relief } = active.curves;
  const bottom = plot.y + plot.h;
  const figure = (pressure: number) => formatQuantity(pressure, 'pressure', frame.input.preferences).value;
  const upright = (text: string, foot: number): Shape[] => {
    const h = textWidth(text, SMALL, 640) + 4;
    const tops = [bottom - h - 4, bottom - h - 0.3 * plot.h, plot.y + 4];
    const candidates = [foot - 16, foot + 3].flatMap((left) => tops.map((top) => ({ x: left, y: top, w: 14, h })));
    const box = freePlace(candidates, frame.taken, plot);
    if (!box) return [];
    frame.taken.push(box);
    return [{ type: 'text', x: box.x + 11, y: box.y + box.h - 2, text, size: SMALL, weight: 640, turn: -90, role: 'label' }];
  };
  return [
    ...(deadHead > 0 ? upright(`cut-off ${figure(deadHead)}`, x(deadHead)) : []),
    ...(relief ? upright(`relief cracks ${figure(relief.cracks)}`, x(relief.cracks)) : []),
  ];
}

/** Names of the bands, inside them. */
export function bandNames(frame: Frame): Shape[] {
  const { active, plot, x, y } = frame;
  if (!active || active.curves.pullOut.pressure.length === 0) return [];
  const { curves } = active;
  const right = plot.x + plot.w;
  const heightAt = (curve: Curve, px: number): number => {
    let best = plot.y;
    for (let i = 1; i < curve.pressure.length; i += 1) {
      const a = x(curve.pressure[i - 1] as number);
      const b = x(curve.pressure[i] as number);
      if ((px - a) * (px - b) > 0 || a === b) continue;
      const t = (px - a) / (b - a);
      best = y((curve.flow[i - 1] as number) + t * ((curve.flow[i] as number) - (curve.flow[i - 1] as number)));
    }
    return best;
  };
  /** Places inside a band, from the right edge leftwards, in the middle of its height. */
  const inside = (words: string, upper: Curve, lower: Curve): Box[] => {
    const w = textWidth(words, SMALL, 640);
    const found: Box[] = [];
    for (let left = right - w - 4; left > plot.x + 0.3 * plot.w; left -= 12) {
      const top = Math.max(plot.y, heightAt(upper, left), heightAt(upper, left + w));
      const low = Math.min(heightAt(lower, left), heightAt(lower, left + w));
      if (low - top >= 14) found.push({ x: left, y: (top + low) / 2 - 8, w, h: 16 });
    }
    // A band too thin for its name gets it at the right edge, beside the line where it begins.
    found.push({ x: right - w - 4, y: heightAt(lower, right - w) - 17, w, h: 16 });
    return found;
  };
  const put = (words: string, candidates: readonly Box[], ground: Ink) => placeWords(frame, words, candidates, { ground });
  const corner = wordsBox('Motor stalls', right - textWidth('Motor stalls', SMALL, 640) - 6, plot.y + 3);
  const outer = curves.trips.pressure.length > 0 ? curves.trips : curves.pullOut;
  return [
    // Named only where the region itself is in view.
    ...put(
      'Motor stalls',
      [corner, { ...corner, y: corner.y + 18 }, { ...corner, x: corner.x - 40 }].filter(
        (box) => heightAt(curves.pullOut, box.x + 0.4 * box.w) > box.y + box.h,
      ),
      'tint-motor-stalls',
    ),
    ...(curves.trips.pressure.length > 0 ? put('Trips', inside('Trips', curves.pullOut, curves.trips), 'tint-trips') : []),
    ...put('Over', inside('Over', outer, curves.rated), 'tint-over'),
    ...put(
      'Within limits',
      [wordsBox('Within limits', plot.x + 9, plot.y + plot.h - 34), wordsBox('Within limits', plot.x + 9, plot.y + plot.h - 60)],
      'sheet',
    ),
  ];
}
