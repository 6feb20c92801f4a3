import { type Box, placedBox, placedSize, placePoint, placePort, placeSide } from '../../symbols/place.ts';
import { symbolOf } from '../../symbols/registry.ts';
import type { Side } from '../../symbols/symbol.ts';
import { findComponent } from '../kind-lookup.ts';
import type { CircuitDocument, Component, PortRef } from '../schema.ts';
import { type Point, snapPoint } from './components.ts';

/** Free places on the sheet for new parts. All in modules. */

export const sideSteps: Readonly<Record<Side, Point>> = {
  left: { x: -1, y: 0 },
  right: { x: 1, y: 0 },
  top: { x: 0, y: -1 },
  bottom: { x: 0, y: 1 },
};
const opposite: Readonly<Record<Side, Side>> = { left: 'right', right: 'left', top: 'bottom', bottom: 'top' };

/** Room kept round a symbol for tags and lines. */
const ROOM = 1;
/** Length of a straight run to a part that faces the port, and of the two legs to one that does not. */
const STRAIGHT = 5;
const RUN = 9;
const RISE = 4;

export interface FreeSpot {
  readonly at: Point;
  readonly turn: Component['turn'];
  readonly mirror: boolean;
}

export function portPlace(document: CircuitDocument, ref: PortRef) {
  const component = findComponent(document, ref.component);
  const symbol = component && symbolOf(component.kind);
  return component && symbol ? placePort(symbol, component, ref.port) : undefined;
}

function taken(document: CircuitDocument): Box[] {
  return document.components.flatMap((component) => {
    const symbol = symbolOf(component.kind);
    return symbol ? [placedBox(symbol, component)] : [];
  });
}

function isFree(boxes: readonly Box[], box: Box): boolean {
  return boxes.every(
    (other) =>
      box.x >= other.x + other.w + ROOM ||
      other.x >= box.x + box.w + ROOM ||
      box.y >= other.y + other.h + ROOM ||
      other.y >= box.y + box.h + ROOM,
  );
}

/** Nearest free place for a box, tried in rings round the wished one, further along `first` before other ways. */
export function freePlace(
  document: CircuitDocument,
  wish: Point,
  size: { width: number; height: number },
  first: Point = { x: 1, y: 0 },
): Point {
  const boxes = taken(document);
  const across = { x: -first.y, y: first.x };
  for (let ring = 0; ring <= 30; ring++) {
    const steps: [number, number][] = [];
    for (let along = ring; along >= 0; along--) for (const side of [ring - along, along - ring]) steps.push([along, side]);
    for (let back = 1; back <= ring; back++) for (const side of [ring - back, back - ring]) steps.push([-back, side]);
    for (const [along, side] of steps) {
      const at = snapPoint({ x: wish.x + 2 * (first.x * along + across.x * side), y: wish.y + 2 * (first.y * along + across.y * side) });
      if (isFree(boxes, { x: at.x, y: at.y, w: size.width, h: size.height })) return at;
    }
  }
  return snapPoint(wish);
}

/** Where a new part stands when its port `entry` is to be joined to something at `from` that leaves towards `side`: facing it
 *  where it can, else round one bend, to the right and down before left and up. */
export function spotAt(document: CircuitDocument, from: Point, side: Side, kind: string, entry: string): FreeSpot | null {
  const symbol = symbolOf(kind);
  const port = symbol?.ports[entry];
  if (!symbol || !port) return null;
  const out = sideSteps[side];
  let mirror = false;
  // A part in line (check, filter, meter, throttle) that would be entered from behind is mirrored; a shaft part too.
  if (port.side === side && (side === 'left' || side === 'right')) mirror = true;
  const entrySide = placeSide(port.side, 0, mirror);
  const facing = entrySide === opposite[side];
  const lateral = facing ? out : entrySide === side ? lateralOf(side) : sideSteps[opposite[entrySide]];
  const target = facing
    ? { x: from.x + out.x * STRAIGHT, y: from.y + out.y * STRAIGHT }
    : entrySide === side
      ? { x: from.x + lateral.x * RUN * 1.5, y: from.y + lateral.y * RUN * 1.5 }
      : side === 'left' || side === 'right'
        ? { x: from.x + out.x * RUN, y: from.y + lateral.y * RISE }
        : { x: from.x + lateral.x * RUN, y: from.y + out.y * RISE };
  const offset = placePoint(symbol, { at: { x: 0, y: 0 }, turn: 0, mirror }, port);
  const wish = { x: target.x - offset.x, y: target.y - offset.y };
  const along = facing ? out : side === 'left' || side === 'right' ? out : lateral;
  return { at: freePlace(document, wish, placedSize(symbol, 0), along), turn: 0, mirror };
}

function lateralOf(side: Side): Point {
  return side === 'top' || side === 'bottom' ? { x: 1, y: 0 } : { x: 0, y: 1 };
}
