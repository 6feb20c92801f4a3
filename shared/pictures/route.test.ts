import { describe, expect, it } from 'vitest';
import { crowdedCircuit } from '../circuit/samples/crowded.ts';
import { demoCircuit } from '../circuit/samples/demo.ts';
import { bodyBoxes } from '../symbols/place.ts';
import { symbolOf } from '../symbols/registry.ts';
import { endOf, outward, writtenValues } from './line-ends.ts';
import { type RoutedLine, routeLines, routeSignature, straighten } from './route.ts';
import { LINE_GAP, segmentsOf } from './route-cost.ts';
import { barbPlaces, filletPath } from './route-path.ts';
import { legMeets } from './tag-geometry.ts';

const samples = [
  ['demo', demoCircuit],
  ['crowded', crowdedCircuit],
] as const;

/** Points of a route between its two ports, without the stubs. */
function between(document: typeof demoCircuit, route: RoutedLine) {
  const line = document.lines.find((entry) => entry.id === route.id)!;
  const byId = new Map(document.components.map((component) => [component.id, component]));
  return { from: endOf(byId.get(line.from.component), line.from.port)!, to: endOf(byId.get(line.to.component), line.to.port)! };
}

describe.each(samples)('routes of the %s circuit', (_, document) => {
  const routes = routeLines(document);
  it('join every line from body to body', () => {
    expect(routes.size).toBe(document.lines.length);
    for (const route of routes.values()) {
      const { from, to } = between(document, route);
      expect(route.points[0]).toEqual({ x: from.path[0]!.x, y: from.path[0]!.y });
      expect(route.points[route.points.length - 1]).toEqual({ x: to.path[0]!.x, y: to.path[0]!.y });
    }
  });
  it('run at right angles on half-modules and leave along the side of their port', () => {
    for (const route of routes.values()) {
      if (route.kind !== 'working') continue;
      const { from } = between(document, route);
      const [a, b] = [route.points[0]!, route.points[1]!];
      const away = outward(from.side);
      expect((b.x - a.x) * away.x + (b.y - a.y) * away.y).toBeGreaterThan(0);
      route.points.slice(1).forEach((point, k) => {
        const before = route.points[k]!;
        expect(point.x === before.x || point.y === before.y).toBe(true);
      });
      for (const point of route.points.slice(1, -1)) {
        expect(Number.isInteger(point.x * 2) && Number.isInteger(point.y * 2)).toBe(true);
      }
    }
  });
  it('pass through no symbol', () => {
    for (const component of document.components) {
      const symbol = symbolOf(component.kind)!;
      if (component.kind === 'junction') continue;
      for (const route of routes.values()) {
        const line = document.lines.find((entry) => entry.id === route.id)!;
        if (line.from.component === component.id || line.to.component === component.id) continue;
        for (const body of bodyBoxes(symbol, component, writtenValues(component))) {
          const inner = { x: body.x + 0.3, y: body.y + 0.3, w: body.w - 0.6, h: body.h - 0.6 };
          for (const leg of segmentsOf(route.points))
            expect(legMeets(leg.a, leg.b, inner), `${route.id} through ${component.id}`).toBe(false);
        }
      }
    }
  });
  it('keep parallel lines two modules apart', () => {
    const legs = [...routes.values()].flatMap((route) => segmentsOf(route.points).map((leg) => ({ ...leg, id: route.id })));
    for (const a of legs) {
      for (const b of legs) {
        if (a.id >= b.id || a.horizontal !== b.horizontal) continue;
        const [a1, a2, b1, b2] = a.horizontal ? [a.a.x, a.b.x, b.a.x, b.b.x] : [a.a.y, a.b.y, b.a.y, b.b.y];
        const shared = Math.min(Math.max(a1, a2), Math.max(b1, b2)) - Math.max(Math.min(a1, a2), Math.min(b1, b2));
        const gap = a.horizontal ? Math.abs(a.a.y - b.a.y) : Math.abs(a.a.x - b.a.x);
        if (shared > 0.5) expect(gap, `${a.id} beside ${b.id}`).toBeGreaterThanOrEqual(LINE_GAP);
      }
    }
  });
  it('are the same every time', () => {
    expect([...routeLines(document)]).toEqual([...routes]);
  });
});

describe('bends a person set', () => {
  const line = demoCircuit.lines.find((entry) => entry.from.component === 'V3' && entry.from.port === 'A')!;
  const bends = [
    { x: 72, y: 16 },
    { x: 72, y: 13.5 },
  ];
  const document = { ...demoCircuit, lines: demoCircuit.lines.map((entry) => (entry === line ? { ...entry, route: bends } : entry)) };
  it('are kept, with right angles between them', () => {
    const points = routeLines(document).get(line.id)!.points;
    for (const bend of bends) expect(points).toContainEqual(bend);
    points.slice(1).forEach((point, k) => {
      expect(point.x === points[k]!.x || point.y === points[k]!.y).toBe(true);
    });
  });
  it('change the signature, a turned screw does not', () => {
    expect(routeSignature(document)).not.toBe(routeSignature(demoCircuit));
    const turned = {
      ...demoCircuit,
      components: demoCircuit.components.map((entry) =>
        entry.id === 'V2'
          ? { ...entry, parameters: { ...entry.parameters, setPressure: { value: 1e7, source: 'typed' as const } } }
          : entry,
      ),
    };
    expect(routeSignature(turned)).toBe(routeSignature(demoCircuit));
  });
});

describe('paths', () => {
  const corner = [
    { x: 0, y: 0 },
    { x: 10, y: 0 },
    { x: 10, y: 10 },
  ];
  it('round bends and run strands beside the middle', () => {
    expect(filletPath(corner, 0.9)).toBe('M0 0L9.1 0A0.9 0.9 0 0 1 10 0.9L10 10');
    expect(filletPath(corner, 0.9, 0.2)).toBe('M0 0.2L9.1 0.2A0.7 0.7 0 0 1 9.8 0.9L9.8 10');
    expect(filletPath([], 0.9)).toBe('');
  });
  it('shorten the bend where a leg is short', () => {
    expect(
      filletPath(
        [
          { x: 0, y: 0 },
          { x: 1, y: 0 },
          { x: 1, y: 8 },
        ],
        0.9,
      ),
    ).toContain('A0.5 0.5');
  });
  it('drop needless corners and refuse to double back', () => {
    expect(
      straighten([
        { x: 0, y: 0 },
        { x: 1, y: 0 },
        { x: 1, y: 0 },
        { x: 4, y: 0 },
      ]),
    ).toEqual([
      { x: 0, y: 0 },
      { x: 4, y: 0 },
    ]);
    expect(
      straighten([
        { x: 0, y: 0 },
        { x: 4, y: 0 },
        { x: 1, y: 0 },
      ]),
    ).toBeNull();
  });
  it('set no barb on short legs nor in bends', () => {
    const barbs = barbPlaces(corner, 1.5, 0, 2, 0.9);
    expect(barbs.length).toBeGreaterThan(8);
    for (const barb of barbs) expect(Math.hypot(barb.x - 10, barb.y)).toBeGreaterThanOrEqual(0.9 - 1e-9);
    expect(
      barbPlaces(
        [
          { x: 0, y: 0 },
          { x: 1.9, y: 0 },
        ],
        1.5,
        0,
        2,
        0.9,
      ),
    ).toEqual([]);
  });
});
