import { useMemo, useRef } from 'react';
import type { CircuitDocument, Line } from '#shared/circuit/schema.ts';
import { endOf } from '#shared/pictures/line-ends.ts';
import { type RoutedLine, routeLines, routeSignature } from '#shared/pictures/route.ts';
import { placedBox } from '#shared/symbols/place.ts';
import { symbolOf } from '#shared/symbols/registry.ts';

/** Routes on the Draw stage. Laying every line anew takes too long for every step of a drag on a large sheet, so lines whose
 *  ends stay and that nothing was put upon keep their way, and only the others look for a new one. */

type Routes = ReadonlyMap<string, RoutedLine>;

interface Kept {
  readonly routes: Routes;
  /** Where both ends lie and which bends a person set, by line. */
  readonly ends: ReadonlyMap<string, string>;
  readonly boxes: ReadonlyMap<string, string>;
}

/** Up to this many lines are all laid anew once the hand lets go, so that the sheet looks as it will on the bench. */
const FEW_LINES = 60;

function endsOf(document: CircuitDocument): Map<string, string> {
  const byId = new Map(document.components.map((component) => [component.id, component]));
  const spot = (end: Line['from']) => {
    const place = endOf(byId.get(end.component), end.port);
    return place ? `${place.x} ${place.y} ${place.side}` : '';
  };
  return new Map(
    document.lines.map((line) => [line.id, [spot(line.from), spot(line.to), ...line.route.map((bend) => `${bend.x} ${bend.y}`)].join('|')]),
  );
}

function boxesOf(document: CircuitDocument): Map<string, string> {
  return new Map(document.components.map(({ id, at, turn, kind }) => [id, `${kind} ${at.x} ${at.y} ${turn}`]));
}

/** Routes of a document that differs little from one whose routes are known.
 *  @param hasty while something is dragged: lines it passes over keep their way, and only the neighbourhood counts */
export function routeAnew(document: CircuitDocument, kept: Kept, hasty = false): Routes {
  const ends = endsOf(document);
  const moved = hasty ? [] : document.components.filter((component) => kept.boxes.get(component.id) !== boxKey(component));
  const staying = new Map<string, RoutedLine>();
  for (const line of document.lines) {
    const route = kept.routes.get(line.id);
    if (!route || kept.ends.get(line.id) !== ends.get(line.id)) continue;
    if (!moved.some((component) => liesOn(component, line, route))) staying.set(line.id, route);
  }
  const due = document.lines.filter((line) => !staying.has(line.id));
  if (due.length === 0) return staying;
  const near = neighbourhood(document, due);
  const fixed = document.lines.flatMap((line) => {
    const points = staying.get(line.id)?.points;
    if (!points || (hasty && !points.some((point) => inside(near, point)))) return [];
    return [{ ...line, route: points.slice(1, -1) as Line['route'] }];
  });
  const owners = new Set([...fixed, ...due].flatMap((line) => [line.from.component, line.to.component]));
  const components = hasty ? document.components.filter((part) => owners.has(part.id) || inside(near, part.at)) : document.components;
  const fresh = routeLines({ components, lines: [...fixed, ...due] });
  return new Map(
    document.lines.flatMap((line) => {
      const route = staying.get(line.id) ?? fresh.get(line.id);
      return route ? [[line.id, route] as const] : [];
    }),
  );
}

const NEAR = 14;

interface Region {
  readonly left: number;
  readonly top: number;
  readonly right: number;
  readonly bottom: number;
}

/** Room in which new ways for these lines may run. */
function neighbourhood(document: CircuitDocument, lines: readonly Line[]): Region {
  const owners = new Set(lines.flatMap((line) => [line.from.component, line.to.component]));
  const at = document.components.filter((component) => owners.has(component.id)).map((component) => component.at);
  const x = at.map((point) => point.x);
  const y = at.map((point) => point.y);
  return { left: Math.min(...x) - NEAR, top: Math.min(...y) - NEAR, right: Math.max(...x) + 2 * NEAR, bottom: Math.max(...y) + 2 * NEAR };
}

function inside(region: Region, point: { readonly x: number; readonly y: number }): boolean {
  return point.x >= region.left && point.x <= region.right && point.y >= region.top && point.y <= region.bottom;
}

function boxKey({ at, turn, kind }: CircuitDocument['components'][number]): string {
  return `${kind} ${at.x} ${at.y} ${turn}`;
}

/** True when a part that moved now stands on a line that is not its own. */
function liesOn(component: CircuitDocument['components'][number], line: Line, route: RoutedLine): boolean {
  if (component.id === line.from.component || component.id === line.to.component) return false;
  const symbol = symbolOf(component.kind);
  if (!symbol) return false;
  const box = placedBox(symbol, component);
  return route.points.slice(1).some((b, k) => {
    const a = route.points[k];
    if (!a) return false;
    return (
      Math.min(a.x, b.x) < box.x + box.w && Math.max(a.x, b.x) > box.x && Math.min(a.y, b.y) < box.y + box.h && Math.max(a.y, b.y) > box.y
    );
  });
}

let current: Kept = { routes: new Map(), ends: new Map(), boxes: new Map() };

/** Routes as they are drawn on the sheet now. */
export function drawnRoutes(): Routes {
  return current.routes;
}

/** Routes of what an edit would make, next to those that are drawn. */
export function routesAfter(document: CircuitDocument): Routes {
  return routeAnew(document, current, true);
}

export function useSheetRoutes(document: CircuitDocument, dragging: boolean): Routes {
  const signature = useMemo(() => routeSignature(document), [document]);
  const laid = useRef('');
  return useMemo(() => {
    const key = dragging ? `dragging ${signature}` : signature;
    if (laid.current === key) return current.routes;
    laid.current = key;
    const whole = !dragging && document.lines.length <= FEW_LINES;
    const routes = whole ? routeLines(document) : routeAnew(document, current, dragging);
    current = { routes, ends: endsOf(document), boxes: boxesOf(document) };
    return routes;
  }, [document, signature, dragging]);
}
