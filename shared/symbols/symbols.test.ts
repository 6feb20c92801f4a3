import { describe, expect, it } from 'vitest';
import { kinds } from '../kinds/registry.ts';
import type { Shape } from '../pictures/shape.ts';
import { bodyBoxes, placedGroup, placePoint, placePort, placeSide, sweptBox } from './place.ts';
import { symbolOf, symbols } from './registry.ts';
import type { SymbolState } from './symbol.ts';

type Values = Record<string, number | string>;

function typical(kindId: string): Values {
  const values: Values = {};
  for (const spec of kinds.find((kind) => kind.id === kindId)?.parameters ?? []) if (spec.initial !== null) values[spec.id] = spec.initial;
  return values;
}

function numbersIn(shapes: readonly Shape[]): number[] {
  return shapes.flatMap((shape): number[] => {
    if (shape.type === 'group') return [shape.dx, shape.dy, ...numbersIn(shape.shapes)];
    if (shape.type === 'polyline') return Array.from(shape.points);
    if (shape.type === 'path') return [...shape.d.matchAll(/-?\d*\.?\d+(?:e-?\d+)?|NaN|Infinity/g)].map(([text]) => Number(text));
    return Object.values(shape).filter((value): value is number => typeof value === 'number');
  });
}

function roles(shapes: readonly Shape[]): string[] {
  return shapes.flatMap((shape) => [...(shape.role ? [shape.role] : []), ...(shape.type === 'group' ? roles(shape.shapes) : [])]);
}

describe.each(kinds.map((kind) => [kind.id, kind] as const))('symbol of %s', (id, kind) => {
  const symbol = symbolOf(id);
  it('has exactly the ports of its kind', () => {
    expect(symbol).toBeDefined();
    expect(Object.keys(symbol?.ports ?? {}).sort()).toEqual(kind.ports.map((port) => port.id).sort());
  });
  it('stands on half-modules', () => {
    for (const port of Object.values(symbol?.ports ?? {})) {
      expect(Number.isInteger(port.x * 2) && Number.isInteger(port.y * 2)).toBe(true);
    }
    expect(Number.isInteger(symbol?.width) && Number.isInteger(symbol?.height)).toBe(true);
  });
  it('has an anchor for every screw', () => {
    for (const screw of kind.screws) expect(symbol?.anchors[screw.anchor]).toBeDefined();
  });
  it('draws finite strokes at rest and at odd readings', () => {
    const values = typical(id);
    const odd: SymbolState[] = [
      { readings: {}, pressures: {}, values: {} },
      { readings: {}, pressures: {}, values },
      {
        readings: Object.fromEntries(kind.readings.map((reading) => [reading.id, 1e9])),
        pressures: Object.fromEntries(kind.ports.map((port) => [port.id, 9e8])),
        values,
        inkScale: 250e5,
      },
      { readings: Object.fromEntries(kind.readings.map((reading) => [reading.id, -1e9])), pressures: {}, values },
    ];
    for (const state of odd) {
      const shapes = [...(symbol?.still(state.values) ?? []), ...(symbol?.moving?.(state) ?? [])];
      for (const value of numbersIn(shapes)) expect(Number.isFinite(value)).toBe(true);
    }
    expect([...(symbol?.still(values) ?? []), ...(symbol?.moving?.(odd[1] as SymbolState) ?? [])].length).toBeGreaterThan(0);
  });
});

describe('moving parts', () => {
  const state = (readings: Record<string, number>, pressures: Record<string, number> = {}, values: Values = {}): SymbolState => ({
    readings,
    pressures,
    values,
  });
  const find = (shapes: readonly Shape[] | undefined, role: string) => shapes?.find((shape) => shape.role === role);

  it('slides the squares of the 4/3 valve by four modules and fills the solenoid that is on', () => {
    const at = (spool: number) => symbols['directional-valve-4-3'].moving?.(state({ spool }, {}, { centre: 'tandem' }));
    expect(find(at(1), 'spool')).toMatchObject({ dx: 4 });
    expect(find(at(-1), 'spool')).toMatchObject({ dx: -4 });
    expect(roles(at(1) ?? [])).toContain('solenoid-a-on');
    expect(roles(at(-1) ?? [])).toContain('solenoid-b-on');
    expect(roles(at(0) ?? []).some((role) => role.endsWith('-on'))).toBe(false);
  });
  it('pushes the relief arrow from beside the ports onto them', () => {
    const x = (lift: number) =>
      (find(symbols['relief-valve'].moving?.(state({ lift })), 'relief-arrow') as unknown as { points: number[] }).points[0];
    expect(x(0)).toBe(2);
    expect(x(1)).toBe(symbols['relief-valve'].ports.P?.x);
  });
  it('flattens the stroke arrow as the pump destrokes', () => {
    const rise = (stroke: number) => {
      const shaft = find(symbols['compensated-pump'].moving?.(state({ stroke })), 'stroke-arrow') as unknown as { points: number[] };
      const [x1 = 0, y1 = 0, x2 = 0, y2 = 0] = shaft.points;
      return (y1 - y2) / (x2 - x1);
    };
    expect(rise(0)).toBeLessThan(rise(0.5));
    expect(rise(0.5)).toBeLessThan(rise(1));
  });
  it('moves the rod to scale and never past its stroke', () => {
    const end = (position: number) => {
      const rod = find(symbols.cylinder.moving?.(state({ position }, {}, { stroke: 0.5 })), 'rod') as { x: number; w: number };
      return rod.x + rod.w;
    };
    expect(end(0.25) - end(0)).toBeCloseTo(9, 9);
    expect(end(0.5) - end(0)).toBeCloseTo(18, 9);
    expect(end(2)).toBeCloseTo(end(0.5), 9);
  });
  it('lifts the ball of the check valve away from the incoming flow', () => {
    const x = (flow: number) =>
      (find(symbols['check-valve'].moving?.(state({ flow }, {}, { ratedFlow: 1e-3 })), 'check-ball') as { x: number }).x;
    expect(x(1e-3)).toBeGreaterThan(x(0));
    expect(x(-1e-3)).toBe(x(0));
  });
  it('shows no load ring and no needle movement without readings', () => {
    expect(symbols['electric-motor'].moving?.(state({}))).toEqual([]);
    expect(find(symbols['pressure-gauge'].moving?.(state({}, {}, { range: 250e5 })), 'gauge-arc')).toBeUndefined();
  });
});

describe('placing', () => {
  const symbol = symbols['relief-valve'];
  it('turns clockwise about the box and mirrors left to right first', () => {
    const size = { width: 8, height: 6 };
    const at = { x: 10, y: 20 };
    expect(placePoint(size, { at, turn: 0, mirror: true }, { x: 3, y: 0 })).toEqual({ x: 15, y: 20 });
    expect(placePoint(size, { at, turn: 1, mirror: false }, { x: 3, y: 0 })).toEqual({ x: 16, y: 23 });
    expect(placePoint(size, { at, turn: 2, mirror: false }, { x: 3, y: 0 })).toEqual({ x: 15, y: 26 });
    expect(placePoint(size, { at, turn: 3, mirror: false }, { x: 3, y: 0 })).toEqual({ x: 10, y: 25 });
    expect(placeSide('top', 1, false)).toBe('right');
    expect(placeSide('left', 0, true)).toBe('right');
    expect(placeSide('right', 1, true)).toBe('top');
  });
  it('keeps ports on the side they look to and gives their stub', () => {
    const port = placePort(symbol, { at: { x: 0, y: 0 }, turn: 1, mirror: false }, 'P');
    expect(port).toMatchObject({ x: 6, y: 3, side: 'right', line: 'working' });
    expect(port?.path[0]).toEqual({ x: 4, y: 3 });
    expect(placePort(symbol, { at: { x: 0, y: 0 }, turn: 0, mirror: false }, 'toString')).toBeUndefined();
  });
  it('gives a group that lands where its points do', () => {
    for (const turn of [0, 1, 2, 3] as const) {
      for (const mirror of [false, true]) {
        const place = { at: { x: 5, y: 7 }, turn, mirror };
        const group = placedGroup(symbol, place, []) as { dx: number; dy: number };
        const origin = placePoint(symbol, place, { x: 0, y: 0 });
        expect([group.dx, group.dy]).toEqual([origin.x, origin.y]);
      }
    }
  });
  it('covers the rod and its load with the swept box', () => {
    const values = { ...typical('cylinder'), workForce: 5e4 };
    const place = { at: { x: 0, y: 0 }, turn: 0 as const, mirror: false };
    const swept = sweptBox(symbols.cylinder, place, values);
    expect(swept.w).toBeGreaterThan(symbols.cylinder.width + 18);
    expect(bodyBoxes(symbols.cylinder, place, values)).toHaveLength(2);
  });
});
