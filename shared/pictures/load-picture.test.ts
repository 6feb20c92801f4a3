import { describe, expect, it } from 'vitest';
import type { Curve, LoadCurves } from '../findings/load-curves.ts';
import { tracePen } from './case-pens.ts';
import { clipPolygon, clipPolyline } from './clip.ts';
import { chartEnds, type LoadCase, type LoadPictureInput } from './load-chart.ts';
import { bandAt, flowAt, loadPath, thinPath } from './load-path.ts';
import { loadPicture } from './load-picture.ts';
import { loadNow, loadWords, nowShapes, phaseStart, pointsUntil, travelledShapes } from './load-picture-now.ts';
import { overlaps, textWidth } from './placement.ts';
import { syntheticRun } from './run-for-tests.ts';
import type { Shape } from './shape.ts';

const box = { x: 0, y: 0, w: 100, h: 50 };

describe('clipping', () => {
  it('cuts a line where it leaves the box and takes it up where it comes back', () => {
    expect(clipPolyline([-50, 25, 50, 25, 50, 100, 80, 100, 80, 10], box)).toEqual([
      [0, 25, 50, 25, 50, 50],
      [80, 50, 80, 10],
    ]);
    expect(clipPolyline([-10, -10, -5, 80], box)).toEqual([]);
  });
  it('cuts a polygon to the box', () => {
    const area = (flat: readonly number[]) => {
      let sum = 0;
      for (let i = 0; i < flat.length; i += 2) {
        const j = (i + 2) % flat.length;
        sum += (flat[i] as number) * (flat[j + 1] as number) - (flat[j] as number) * (flat[i + 1] as number);
      }
      return Math.abs(sum) / 2;
    };
    expect(area(clipPolygon([-20, -20, 200, -20, 200, 200, -20, 200], box))).toBeCloseTo(5000, 9);
    expect(area(clipPolygon([50, 0, 150, 0, 150, 50, 50, 50], box))).toBeCloseTo(2500, 9);
    expect(clipPolygon([200, 200, 300, 200, 300, 300], box)).toEqual([]);
  });
});

describe('path of the operating point', () => {
  const n = 5000;
  const xs = Float64Array.from({ length: n }, (_, i) => i * 4000 + (i === 2500 ? 9e6 : 0));
  const ys = Float64Array.from({ length: n }, (_, i) => 7e-4 - 1e-8 * i);
  it('keeps at most 300 points, the ends and the peak', () => {
    const kept = thinPath(xs, ys, 300);
    expect(kept.length).toBeLessThanOrEqual(300);
    expect(kept[0]).toBe(0);
    expect(kept[kept.length - 1]).toBe(n - 1);
    expect(kept).toContain(2500);
    expect([...kept].sort((a, b) => a - b)).toEqual(kept);
  });
  it('needs few points for a straight way and copes with one that stands still', () => {
    const straight = Float64Array.from({ length: 1000 }, (_, i) => i);
    expect(thinPath(straight, straight, 300)).toEqual([0, 999]);
    expect(thinPath(new Float64Array(1000), new Float64Array(1000), 300)).toEqual([0, 999]);
  });
  it('never strays from the full path by more than a thousandth of the chart', () => {
    const round = Float64Array.from({ length: 3000 }, (_, i) => 1e7 + 1e7 * Math.cos(i / 300));
    const up = Float64Array.from({ length: 3000 }, (_, i) => 5e-4 + 5e-4 * Math.sin(i / 200));
    const kept = thinPath(round, up, 300);
    let worst = 0;
    for (let k = 1; k < kept.length; k += 1) {
      const a = kept[k - 1] as number;
      const b = kept[k] as number;
      for (let i = a; i <= b; i += 1) {
        const x0 = (round[a] as number) / 2e7;
        const y0 = (up[a] as number) / 1e-3;
        const dx = (round[b] as number) / 2e7 - x0;
        const dy = (up[b] as number) / 1e-3 - y0;
        const t = Math.min(
          1,
          Math.max(0, (((round[i] as number) / 2e7 - x0) * dx + ((up[i] as number) / 1e-3 - y0) * dy) / (dx * dx + dy * dy)),
        );
        worst = Math.max(worst, Math.hypot((round[i] as number) / 2e7 - x0 - t * dx, (up[i] as number) / 1e-3 - y0 - t * dy));
      }
    }
    expect(worst).toBeLessThan(1e-3);
  });
});

function curve(torque: number): Curve {
  const pressure = Float64Array.from({ length: 80 }, (_, i) => (i + 4) * 3e5);
  return { pressure, flow: pressure.map((p) => torque / p) };
}
const curves: LoadCurves = {
  pump: 'P1',
  motor: 'M1',
  rated: curve(5000),
  trips: curve(5800),
  pullOut: curve(9600),
  pumpLine: [{ pressure: Float64Array.of(0, 190e5), flow: Float64Array.of(7e-4, 6.5e-4) }],
  deadHead: 190e5,
  knee: 182e5,
  relief: { component: 'V2', cracks: 204e5, set: 215e5 },
  pressureAddress: 'P1.outlet.pressure',
  flowAddress: 'P1.flow',
};

function loadCase(ink: number, part: Partial<LoadCase> = {}): LoadCase {
  const run = syntheticRun({
    channels: [
      { address: 'P1.outlet.pressure', quantity: 'pressure', value: (t) => 25e5 * t },
      { address: 'P1.flow', quantity: 'flow', value: (t) => 7e-4 - 1e-5 * t },
    ],
  });
  const active = ink === 1;
  return {
    id: 'ABCD'[ink] as string,
    letter: 'ABCD'[ink] as string,
    pen: tracePen(ink, active, 2),
    active,
    stale: false,
    curves,
    path: loadPath(run, curves),
    stall: null,
    words: 'stop fully out, 28.0 cm³/rev',
    reliefFlow: 40 / 60000,
    ...part,
  };
}

function picture(part: Partial<LoadPictureInput> = {}) {
  return loadPicture({
    title: 'Load picture',
    cases: [loadCase(0, { stall: { pressure: 150e5, flow: 6.4e-4 } }), loadCase(1, { words: 'stop 16.0 cm³/rev' })],
    numerals: [{ number: 1, caseId: 'A', pressure: 150e5, flow: 6.4e-4 }],
    preferences: { system: 'si' },
    width: 424,
    height: 278,
    ...part,
  });
}

const texts = (shapes: readonly Shape[]) => shapes.flatMap((shape) => (shape.type === 'text' ? [shape] : []));

describe('bands', () => {
  it('follow the limits of torque', () => {
    expect(flowAt(curves.rated, 100e5)).toBeCloseTo(5000 / 100e5, 6);
    expect(bandAt(curves, 100e5, 4.9e-4)).toBe('within-limits');
    expect(bandAt(curves, 100e5, 5.5e-4)).toBe('over');
    expect(bandAt(curves, 100e5, 7e-4)).toBe('trips');
    expect(bandAt(curves, 100e5, 9.9e-4)).toBe('motor-stalls');
    expect(bandAt(curves, 1e5, 7e-4)).toBe('within-limits');
  });
  it('are absent without a motor', () => {
    const none = { pressure: new Float64Array(0), flow: new Float64Array(0) };
    expect(bandAt({ ...curves, motor: null, rated: none, trips: none, pullOut: none }, 1e7, 1e-3)).toBeNull();
  });
});

describe('load picture', () => {
  it('maps pressure and flow onto its plot and holds all that is drawn', () => {
    const chart = picture();
    const ends = chartEnds({ cases: [loadCase(0)] });
    expect(chart.x(0)).toBe(chart.plot.x);
    expect(chart.x(ends.pressure)).toBeCloseTo(chart.plot.x + chart.plot.w, 9);
    expect(chart.y(0)).toBe(chart.plot.y + chart.plot.h);
    expect(ends.pressure).toBeGreaterThan(215e5);
    expect(ends.flow).toBeGreaterThan(7e-4);
    expect(chartEnds({ cases: [] })).toEqual({ pressure: 1e7, flow: 1e-3 });
  });
  it('names every band, the limits and the pump lines', () => {
    const said = texts(picture().picture.shapes).map((shape) => shape.text);
    for (const words of [
      'Motor stalls',
      'Trips',
      'Within limits',
      'cut-off 190',
      'relief cracks 204',
      'B stop 16.0 cm³/rev',
      '1',
      'bar',
      'L/min',
    ]) {
      expect(said).toContain(words);
    }
  });
  it('keeps every label inside and off every other', () => {
    for (const [width, height] of [
      [424, 278],
      [396, 212],
      [360, 500],
      [900, 640],
    ] as const) {
      const chart = picture({ width, height });
      const boxes = texts(chart.picture.shapes)
        .filter((shape) => shape.role === 'label')
        .map((shape) => {
          const length = textWidth(shape.text, 12.5, 640);
          return shape.turn
            ? { x: shape.x - 10, y: shape.y - length, w: 12, h: length }
            : { x: shape.x, y: shape.y - 12, w: length, h: 14 };
        });
      boxes.forEach((a, i) => {
        expect(a.x).toBeGreaterThanOrEqual(0);
        expect(a.x + a.w).toBeLessThanOrEqual(width);
        for (const b of boxes.slice(i + 1)) expect(overlaps(a, b)).toBe(false);
      });
    }
  });
  it('draws textures, the stall on its point and the numeral beside it', () => {
    const { picture: drawn, x, y } = picture();
    const textures = drawn.shapes.flatMap((shape) => ('texture' in shape && shape.texture ? [shape.texture] : []));
    expect(textures).toEqual(['dots', 'hatch', 'cross-hatch']);
    const stall = drawn.shapes.find((shape) => 'role' in shape && shape.role === 'stall');
    expect(stall?.type).toBe('polyline');
    if (stall?.type !== 'polyline') return;
    const xs = [...stall.points].filter((_, i) => i % 2 === 0);
    expect((Math.min(...xs) + Math.max(...xs)) / 2).toBeCloseTo(x(150e5), 6);
    const numeral = drawn.shapes.find((shape) => 'role' in shape && shape.role === 'numeral');
    expect(numeral?.type === 'circle' && Math.hypot(numeral.x - x(150e5), numeral.y - y(6.4e-4))).toBeGreaterThan(15);
  });
  it('keeps bands and lines inside the plot', () => {
    const { picture: drawn, plot } = picture();
    for (const shape of drawn.shapes) {
      if (shape.type !== 'polyline' || shape.role === 'stall') continue;
      for (let i = 0; i < shape.points.length; i += 2) {
        expect(shape.points[i]).toBeGreaterThanOrEqual(plot.x - 1e-6);
        expect(shape.points[i]).toBeLessThanOrEqual(plot.x + plot.w + 1e-6);
        expect(shape.points[i + 1]).toBeGreaterThanOrEqual(plot.y - 1e-6);
        expect(shape.points[i + 1]).toBeLessThanOrEqual(plot.y + plot.h + 1e-6);
      }
    }
  });
  it('does not name a band that lies outside the chart', () => {
    const far = { ...curves, pullOut: curve(60_000) };
    const said = texts(picture({ cases: [loadCase(1, { curves: far })], numerals: [] }).picture.shapes).map((shape) => shape.text);
    expect(said).not.toContain('Motor stalls');
    expect(said).toContain('Trips');
  });
  it('joins the letters of pump lines that are the same', () => {
    const said = texts(picture({ cases: [loadCase(0), loadCase(2)] }).picture.shapes).map((shape) => shape.text);
    expect(said).toContain('A, C stop fully out, 28.0 cm³/rev');
  });
  it('speaks the reader’s units', () => {
    const said = texts(picture({ preferences: { system: 'us' } }).picture.shapes).map((shape) => shape.text);
    expect(said).toContain('psi');
    expect(said).toContain('gpm');
    expect(said).toContain('cut-off 2756');
  });
});

describe('what moves', () => {
  const entry = loadCase(1);
  it('travels up to the cursor and marks the point now', () => {
    const chart = picture();
    const shapes = travelledShapes(chart, [entry], 3.5);
    const now = nowShapes(chart, [entry], 3.5).find((shape) => 'role' in shape && shape.role === 'now');
    expect(now?.type === 'circle' && now.x).toBeCloseTo(chart.x(87.5e5), 3);
    const travelled = shapes.find((shape) => 'role' in shape && shape.role === 'travelled');
    expect(travelled?.type === 'polyline' && Math.max(...[...travelled.points].filter((_, i) => i % 2 === 0))).toBeCloseTo(
      chart.x(87.5e5),
      3,
    );
    if (!entry.path) throw new Error('no path');
    expect(pointsUntil(entry.path, -1)).toBe(0);
    expect(pointsUntil(entry.path, 99)).toBe(entry.path.times.length);
    expect(loadNow(entry.path, 99).pressure).toBeCloseTo(175e5, 3);
  });
  it('is thick since the last command and faint before it', () => {
    expect(phaseStart([0, 2, 5], 4)).toBe(2);
    expect(phaseStart([], 4)).toBe(0);
    const chart = picture();
    const shapes = travelledShapes(chart, [entry], 3.5, 2);
    const xs = (role: string) =>
      shapes.flatMap((shape) => (shape.type === 'polyline' && shape.role === role ? [...shape.points].filter((_, i) => i % 2 === 0) : []));
    expect(Math.min(...xs('travelled'))).toBeCloseTo(chart.x(50e5), 3);
    expect(Math.max(...xs('travelled'))).toBeCloseTo(chart.x(87.5e5), 3);
    expect(Math.max(...xs('before'), 0)).toBeLessThanOrEqual(chart.x(50e5) + 1e-6);
  });
  it('is told in words', () => {
    const words = loadWords([loadCase(0, { stall: { pressure: 150e5, flow: 6.4e-4 } }), entry], 3.5, { system: 'si' });
    expect(words.replaceAll('\u202f', ' ')).toBe(
      'Case B at 3.50 s: 88 bar, 39.9 L/min, trips, if it lasts. Case A at 3.50 s: 88 bar, 39.9 L/min, trips, if it lasts. ' +
        'Case A stalls at 150 bar and 38.4 L/min. The pump leaves full stroke at 182 bar and cuts off at 190 bar. ' +
        'The relief cracks at 204 bar and is set to 215 bar.',
    );
    expect(loadWords([], 0, { system: 'si' })).toBe('No run with a pump yet.');
  });
});
