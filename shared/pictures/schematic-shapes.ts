import type { CircuitDocument, Component } from '../circuit/schema.ts';
import { type Box, placedGroup, placePoint, sweptBox } from '../symbols/place.ts';
import { symbolOf } from '../symbols/registry.ts';
import type { SymbolDefinition, SymbolState } from '../symbols/symbol.ts';
import { endOf } from './line-ends.ts';
import { lineShapes } from './line-shapes.ts';
import { oilSpace } from './oil-space.ts';
import { type RoutedLine, routeLines } from './route.ts';
import { shaftPath, shaftShapes } from './shaft-shapes.ts';
import type { Shape } from './shape.ts';

/** The whole circuit as drawing lists, in modules on the sheet. */

/** Value of an address at the moment that is shown [SI]; undefined = not in the run. */
export type ReadingAt = (address: string) => number | undefined;

export interface SchematicView {
  readonly valuesOf: (component: Component) => Readonly<Record<string, number | string>>;
  /** null = as printed: valve at rest, rod in, no pressure. */
  readonly readingAt: ReadingAt | null;
  /** Reading ids of a component's kind. */
  readonly readingsOf: (component: Component) => readonly string[];
  readonly inkScale: number;
  /** Thumbnails: tint only, no words. */
  readonly plain: boolean;
}

/** State of a symbol's moving parts at the shown moment. */
export function symbolState(component: Component, symbol: SymbolDefinition, view: SchematicView): SymbolState {
  const readings: Record<string, number> = {};
  const pressures: Record<string, number> = {};
  if (view.readingAt) {
    for (const id of view.readingsOf(component)) {
      const value = view.readingAt(`${component.id}.${id}`);
      if (value !== undefined) readings[id] = value;
    }
    for (const port of Object.keys(symbol.ports)) {
      const value = view.readingAt(`${component.id}.${port}.pressure`);
      if (value !== undefined) pressures[port] = value;
    }
  }
  return { readings, pressures, values: view.valuesOf(component), inkScale: view.inkScale };
}

/** Oil spaces of a moving part turned into tint and strands. */
export function withOil(shapes: readonly Shape[], state: SymbolState, scale: number): readonly Shape[] {
  return shapes.flatMap((shape): readonly Shape[] => {
    if (shape.type === 'oil') return oilSpace(shape, state.pressures[shape.port] ?? null, scale);
    if (shape.type === 'group') return [{ ...shape, shapes: withOil(shape.shapes, state, scale) }];
    return [shape];
  });
}

/** Thin strokes of ports to which no line is joined. */
export function openStubs(symbol: SymbolDefinition, joined: ReadonlySet<string>): readonly Shape[] {
  const shapes: Shape[] = [];
  for (const [id, port] of Object.entries(symbol.ports)) {
    if (joined.has(id) || !port.stub) continue;
    const dashed = port.line ? { dash: [0.5, 0.3] as const, cap: 'butt' as const } : {};
    shapes.push({ type: 'polyline', points: [...port.stub, port.x, port.y], stroke: 'ink', width: 0.2, ...dashed, role: `stub-${id}` });
  }
  return shapes;
}

/** Port ids of each component to which a line is joined. */
export function joinedPorts(document: Pick<CircuitDocument, 'lines'>): ReadonlyMap<string, ReadonlySet<string>> {
  const joined = new Map<string, Set<string>>();
  for (const line of document.lines) {
    for (const end of [line.from, line.to]) {
      const ports = joined.get(end.component) ?? new Set<string>();
      ports.add(end.port);
      joined.set(end.component, ports);
    }
  }
  return joined;
}

/** Pressure [Pa] that a line shows: that of its first end, or the other's; null where neither is known. */
export function linePressure(document: CircuitDocument, lineId: string, readingAt: ReadingAt | null): number | null {
  const line = document.lines.find((entry) => entry.id === lineId);
  if (!line || !readingAt) return null;
  const from = readingAt(`${line.from.component}.${line.from.port}.pressure`);
  return from ?? readingAt(`${line.to.component}.${line.to.port}.pressure`) ?? null;
}

function componentShapes(component: Component, joined: ReadonlySet<string>, view: SchematicView): readonly Shape[] {
  const symbol = symbolOf(component.kind);
  if (!symbol) return [];
  const state = symbolState(component, symbol, view);
  const moving = withOil(symbol.moving?.(state) ?? [], state, view.inkScale);
  const shapes = [
    ...openStubs(symbol, component.kind === 'junction' ? new Set(Object.keys(symbol.ports)) : joined),
    ...symbol.still(state.values),
    ...moving,
  ];
  const group = placedGroup(symbol, component, view.plain ? withoutWords(shapes) : shapes, `component-${component.id}`);
  if (view.plain || component.kind === 'junction' || component.kind === 'tank') return [group];
  const code = placePoint(symbol, component, symbol.code);
  return [
    group,
    { type: 'text', x: code.x, y: code.y, text: component.name, size: 1.2, anchor: 'middle', weight: 500, fill: 'ink3', role: 'code' },
  ];
}

function withoutWords(shapes: readonly Shape[]): readonly Shape[] {
  return shapes.flatMap((shape): readonly Shape[] => {
    if (shape.type === 'text' && shape.size < 2) return [];
    return shape.type === 'group' ? [{ ...shape, shapes: withoutWords(shape.shapes) }] : [shape];
  });
}

/** Shapes in drawing order: shafts, lines, symbols. */
export function schematicShapes(document: CircuitDocument, view: SchematicView, routes = routeLines(document)): readonly Shape[] {
  const shapes: Shape[] = [];
  const components = new Map(document.components.map((component) => [component.id, component]));
  for (const shaft of document.shafts) {
    for (let k = 0; k + 1 < shaft.members.length; k += 1) {
      const from = endOf(components.get(shaft.members[k]!.component), shaft.members[k]!.port);
      const to = endOf(components.get(shaft.members[k + 1]!.component), shaft.members[k + 1]!.port);
      if (from && to) shapes.push(...shaftShapes(shaftPath(from, to)));
    }
  }
  for (const line of document.lines) {
    const route = routes.get(line.id);
    if (!route) continue;
    const flow = view.readingAt?.(`line.${line.id}.flow`) ?? 0;
    shapes.push(...lineShapes(route, linePressure(document, line.id, view.readingAt), flow, view.inkScale, view.plain));
  }
  const joined = joinedPorts(document);
  const none = new Set<string>();
  for (const component of document.components) shapes.push(...componentShapes(component, joined.get(component.id) ?? none, view));
  return shapes;
}

/** Everything the drawing covers, in modules; null for an empty sheet. */
export function schematicBounds(
  document: CircuitDocument,
  valuesOf: SchematicView['valuesOf'],
  routes: ReadonlyMap<string, RoutedLine>,
): Box | null {
  let left = Number.POSITIVE_INFINITY;
  let top = Number.POSITIVE_INFINITY;
  let right = Number.NEGATIVE_INFINITY;
  let bottom = Number.NEGATIVE_INFINITY;
  const add = (x: number, y: number) => {
    left = Math.min(left, x);
    top = Math.min(top, y);
    right = Math.max(right, x);
    bottom = Math.max(bottom, y);
  };
  for (const component of document.components) {
    const symbol = symbolOf(component.kind);
    if (!symbol) continue;
    const box = sweptBox(symbol, component, valuesOf(component));
    add(box.x, box.y);
    add(box.x + box.w, box.y + box.h);
    const code = placePoint(symbol, component, symbol.code);
    add(code.x - 1, code.y - 1.2);
    add(code.x + 1, code.y + 0.3);
  }
  for (const route of routes.values()) for (const point of route.points) add(point.x, point.y);
  return left <= right ? { x: left, y: top, w: right - left, h: bottom - top } : null;
}
