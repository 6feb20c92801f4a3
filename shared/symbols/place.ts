import type { Shape } from '../pictures/shape.ts';
import type { Side, SymbolDefinition } from './symbol.ts';

/** Where a symbol's points land on the drawing. A component's `at` is the top-left corner of its box as drawn (after mirroring
 *  left to right, then turning clockwise by 90° × turn). All in modules. */

export interface Placement {
  readonly at: { readonly x: number; readonly y: number };
  readonly turn: 0 | 1 | 2 | 3;
  readonly mirror: boolean;
}
export interface Point {
  readonly x: number;
  readonly y: number;
}
export interface Box {
  readonly x: number;
  readonly y: number;
  readonly w: number;
  readonly h: number;
}
export interface PlacedPort extends Point {
  readonly side: Side;
  /** Points from the body to the port, the port last. */
  readonly path: readonly Point[];
  readonly line: 'working' | 'drain' | 'pilot';
}

type Size = Pick<SymbolDefinition, 'width' | 'height'>;

const clockwise: readonly Side[] = ['top', 'right', 'bottom', 'left'];

/** Width and height of the box as drawn. */
export function placedSize(size: Size, turn: number): { readonly width: number; readonly height: number } {
  return turn % 2 === 0 ? { width: size.width, height: size.height } : { width: size.height, height: size.width };
}

/** A point of the symbol's own box, as drawn, relative to `at`. */
export function turnPoint(size: Size, turn: number, mirror: boolean, point: Point): Point {
  const x = mirror ? size.width - point.x : point.x;
  const y = point.y;
  if (turn === 1) return { x: size.height - y, y: x };
  if (turn === 2) return { x: size.width - x, y: size.height - y };
  if (turn === 3) return { x: y, y: size.width - x };
  return { x, y };
}

/** A point of the symbol's own box on the drawing. */
export function placePoint(size: Size, place: Placement, point: Point): Point {
  const turned = turnPoint(size, place.turn, place.mirror, point);
  return { x: place.at.x + turned.x, y: place.at.y + turned.y };
}

export function placeSide(side: Side, turn: number, mirror: boolean): Side {
  let index = clockwise.indexOf(side);
  if (mirror && index % 2 === 1) index = 4 - index;
  return clockwise[(index + turn) % 4] as Side;
}

/** A port on the drawing, or undefined where the symbol has no such port. */
export function placePort(symbol: SymbolDefinition, place: Placement, portId: string): PlacedPort | undefined {
  const port = Object.hasOwn(symbol.ports, portId) ? symbol.ports[portId] : undefined;
  if (!port) return undefined;
  const path: Point[] = [];
  const stub = port.stub ?? [];
  for (let k = 0; k + 1 < stub.length; k += 2)
    path.push(
      placePoint(symbol, place, {
        x: stub[k] as number,
        y: stub[k + 1] as number,
      }),
    );
  const end = placePoint(symbol, place, port);
  path.push(end);
  return {
    ...end,
    side: placeSide(port.side, place.turn, place.mirror),
    path,
    line: port.line ?? 'working',
  };
}

/** The box as drawn. */
export function placedBox(symbol: SymbolDefinition, place: Placement): Box {
  const { width, height } = placedSize(symbol, place.turn);
  return { x: place.at.x, y: place.at.y, w: width, h: height };
}

/** The box with everything that may move out of it. */
export function sweptBox(symbol: SymbolDefinition, place: Placement, values: Readonly<Record<string, number | string>>): Box {
  const reach = symbol.reach?.(values);
  if (!reach) return placedBox(symbol, place);
  const a = placePoint(symbol, place, { x: -reach.left, y: -reach.top });
  const b = placePoint(symbol, place, {
    x: symbol.width + reach.right,
    y: symbol.height + reach.bottom,
  });
  return {
    x: Math.min(a.x, b.x),
    y: Math.min(a.y, b.y),
    w: Math.abs(a.x - b.x),
    h: Math.abs(a.y - b.y),
  };
}

/** Drawing list of a symbol as one group at its place. Group rule: mirror (x → −x), then turn clockwise about the origin, then
 *  shift by dx, dy; text inside stays upright. */
export function placedGroup(size: Size, place: Placement, shapes: readonly Shape[], role?: string): Shape {
  const origin = placePoint(size, place, { x: 0, y: 0 });
  return {
    type: 'group',
    dx: origin.x,
    dy: origin.y,
    turn: place.turn,
    mirror: place.mirror,
    shapes,
    role,
  };
}

/** What a symbol really covers on the drawing, for tags and words that must not lie on it. */
export function bodyBoxes(symbol: SymbolDefinition, place: Placement, values: Readonly<Record<string, number | string>>): readonly Box[] {
  if (!symbol.bodies) return [sweptBox(symbol, place, values)];
  return symbol.bodies(values).map((box) => {
    const a = placePoint(symbol, place, { x: box.x, y: box.y });
    const b = placePoint(symbol, place, { x: box.x + box.w, y: box.y + box.h });
    return { x: Math.min(a.x, b.x), y: Math.min(a.y, b.y), w: Math.abs(a.x - b.x), h: Math.abs(a.y - b.y) };
  });
}

/** Smallest box around boxes; null for none. */
export function unionBox(boxes: readonly Box[]): Box | null {
  if (boxes.length === 0) return null;
  const x = Math.min(...boxes.map((box) => box.x));
  const y = Math.min(...boxes.map((box) => box.y));
  const right = Math.max(...boxes.map((box) => box.x + box.w));
  const bottom = Math.max(...boxes.map((box) => box.y + box.h));
  return { x, y, w: right - x, h: bottom - y };
}
