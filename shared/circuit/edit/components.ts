import { placedSize } from '../../symbols/place.ts';
import { findComponent, findKind, symbolSize } from '../kind-lookup.ts';
import { type CircuitDocument, type Component, MAX_COMPONENTS } from '../schema.ts';
import { freeId, idPrefix, nextCode } from './ids.ts';

/** Putting parts on the sheet and moving them about. All functions give the same object back when nothing changes. */

export interface Point {
  readonly x: number;
  readonly y: number;
}

const LIMIT = 9_900;
// Adding 0 turns −0 into 0, which is what a file would give back.
const half = (value: number) => Math.max(-LIMIT, Math.min(LIMIT, Math.round(value * 2) / 2)) + 0;

/** Positions lie on half modules, inside the sheet's limits. */
export function snapPoint(point: Point): { x: number; y: number } {
  return { x: half(point.x), y: half(point.y) };
}

export function replaceComponent(document: CircuitDocument, id: string, change: (component: Component) => Component): CircuitDocument {
  let changed = false;
  const components = document.components.map((component) => {
    if (component.id !== id) return component;
    const next = change(component);
    changed ||= next !== component;
    return next;
  });
  return changed ? { ...document, components } : document;
}

/** A new part with its item code and typical values (nothing given). `at` is the top-left of its box.
 *  `componentId` is null, and the document unchanged, when the kind is unknown or the sheet is full. */
export function addComponent(
  document: CircuitDocument,
  kindId: string,
  at: Point,
  turn: Component['turn'] = 0,
  mirror = false,
): { document: CircuitDocument; componentId: string | null } {
  const kind = findKind(kindId);
  if (!kind || document.components.length >= MAX_COMPONENTS) return { document, componentId: null };
  const component: Component = {
    id: freeId(document, idPrefix(kindId)),
    kind: kindId,
    kindVersion: kind.version,
    name: nextCode(document, kindId),
    at: snapPoint(at),
    turn,
    mirror,
    parameters: {},
  };
  return { document: { ...document, components: [...document.components, component] }, componentId: component.id };
}

export function renameComponent(document: CircuitDocument, id: string, name: string): CircuitDocument {
  const text = name.trim().slice(0, 60);
  return replaceComponent(document, id, (component) => (component.name === text ? component : { ...component, name: text }));
}

/** Moves parts, notes and labels by whole steps [modules]. Bends of lines between moved parts go along; bends of other lines stay. */
export function moveParts(document: CircuitDocument, ids: readonly string[], by: Point): CircuitDocument {
  if (by.x === 0 && by.y === 0) return document;
  const moved = new Set(ids);
  const shift = <T extends { at: Point }>(entry: T): T => ({ ...entry, at: snapPoint({ x: entry.at.x + by.x, y: entry.at.y + by.y }) });
  const known = [...document.components, ...document.notes, ...document.labels].some((entry) => moved.has(entry.id));
  if (!known) return document;
  return {
    ...document,
    components: document.components.map((entry) => (moved.has(entry.id) ? shift(entry) : entry)),
    notes: document.notes.map((entry) => (moved.has(entry.id) ? shift(entry) : entry)),
    labels: document.labels.map((entry) => (moved.has(entry.id) || moved.has(entry.component) ? shift(entry) : entry)),
    lines: document.lines.map((line) =>
      line.route.length > 0 && moved.has(line.from.component) && moved.has(line.to.component)
        ? { ...line, route: line.route.map((point) => snapPoint({ x: point.x + by.x, y: point.y + by.y })) }
        : line,
    ),
  };
}

/** Puts one part, note or label at a place. */
export function placeAt(document: CircuitDocument, id: string, at: Point): CircuitDocument {
  const entry = [...document.components, ...document.notes, ...document.labels].find((candidate) => candidate.id === id);
  if (!entry) return document;
  const to = snapPoint(at);
  return moveParts(document, [id], { x: to.x - entry.at.x, y: to.y - entry.at.y });
}

/** Boxes of the chosen parts on the sheet, as they stand. */
function boxes(document: CircuitDocument, ids: readonly string[]) {
  return ids.flatMap((id) => {
    const component = findComponent(document, id);
    return component ? [{ component, ...placedSize(symbolSize(component.kind), component.turn) }] : [];
  });
}

/** Middle of several parts, on a whole module, so that four quarter turns come back to the start. */
function middle(parts: ReturnType<typeof boxes>): Point {
  const left = Math.min(...parts.map((part) => part.component.at.x));
  const top = Math.min(...parts.map((part) => part.component.at.y));
  const right = Math.max(...parts.map((part) => part.component.at.x + part.width));
  const bottom = Math.max(...parts.map((part) => part.component.at.y + part.height));
  return { x: Math.round((left + right) / 2), y: Math.round((top + bottom) / 2) };
}

/** A quarter turn clockwise: one part about its own middle, several about their common middle. Lines find their way anew. */
export function turnParts(document: CircuitDocument, ids: readonly string[]): CircuitDocument {
  const parts = boxes(document, ids);
  const centre = parts.length > 1 ? middle(parts) : null;
  return reseat(document, parts, ({ component, width, height }) => {
    const turn = ((component.turn + 1) % 4) as Component['turn'];
    if (!centre) {
      const by = Math.trunc((width - height) / 2);
      return { ...component, turn, at: snapPoint({ x: component.at.x + by, y: component.at.y - by }) };
    }
    // The corner that becomes the top-left after a clockwise quarter turn is the bottom-left one.
    const from = { x: component.at.x - centre.x, y: component.at.y + height - centre.y };
    return { ...component, turn, at: snapPoint({ x: centre.x - from.y, y: centre.y + from.x }) };
  });
}

/** Left for right as it stands on the sheet: one part in its own box, several about their common middle. */
export function mirrorParts(document: CircuitDocument, ids: readonly string[]): CircuitDocument {
  const parts = boxes(document, ids);
  const centre = parts.length > 1 ? middle(parts) : null;
  return reseat(document, parts, ({ component, width }) => {
    // Mirroring comes before turning, so a part on its side also has to be turned half round to be mirrored left–right.
    const turn = (component.turn % 2 === 0 ? component.turn : (component.turn + 2) % 4) as Component['turn'];
    const x = centre ? 2 * centre.x - component.at.x - width : component.at.x;
    return { ...component, mirror: !component.mirror, turn, at: snapPoint({ x, y: component.at.y }) };
  });
}

function reseat(
  document: CircuitDocument,
  parts: ReturnType<typeof boxes>,
  change: (part: ReturnType<typeof boxes>[number]) => Component,
): CircuitDocument {
  if (parts.length === 0) return document;
  const changed = new Map(parts.map((part) => [part.component.id, change(part)]));
  return {
    ...document,
    components: document.components.map((component) => changed.get(component.id) ?? component),
    lines: document.lines.map((line) =>
      line.route.length > 0 && (changed.has(line.from.component) || changed.has(line.to.component)) ? { ...line, route: [] } : line,
    ),
  };
}
