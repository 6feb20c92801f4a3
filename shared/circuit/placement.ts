import type { Side, SymbolDefinition } from '../symbols/symbol.ts';

/** Where a symbol's points lie on the sheet, in modules.
 *
 *  One rule for everything that draws or routes: `at` is the top-left corner of the box as it stands on the sheet (after
 *  turning). The symbol is first mirrored left–right inside its own box, then turned clockwise by quarter turns; an odd turn
 *  swaps the width and the height of the box. */
export interface Placed {
  readonly at: { readonly x: number; readonly y: number };
  readonly turn: 0 | 1 | 2 | 3;
  readonly mirror: boolean;
}

export interface SheetPoint {
  readonly x: number;
  readonly y: number;
}

export interface SheetPort extends SheetPoint {
  readonly side: Side;
}

export interface SheetBox {
  readonly x: number;
  readonly y: number;
  readonly width: number;
  readonly height: number;
}

const clockwise: Record<Side, Side> = { top: 'right', right: 'bottom', bottom: 'left', left: 'top' };
const mirrored: Record<Side, Side> = { top: 'top', right: 'left', bottom: 'bottom', left: 'right' };

/** Width and height of the box as it stands on the sheet. */
export function turnedSize(symbol: Pick<SymbolDefinition, 'width' | 'height'>, turn: number): { width: number; height: number } {
  return turn % 2 === 0 ? { width: symbol.width, height: symbol.height } : { width: symbol.height, height: symbol.width };
}

/** A point of the symbol (origin at its top-left, turn 0, not mirrored), relative to the top-left of the turned box. */
export function turnPoint(
  symbol: Pick<SymbolDefinition, 'width' | 'height'>,
  placed: Pick<Placed, 'turn' | 'mirror'>,
  point: SheetPoint,
): SheetPoint {
  const { width: w, height: h } = symbol;
  const x = placed.mirror ? w - point.x : point.x;
  const y = point.y;
  if (placed.turn === 0) return { x, y };
  if (placed.turn === 1) return { x: h - y, y: x };
  if (placed.turn === 2) return { x: w - x, y: h - y };
  return { x: y, y: w - x };
}

/** Side of the sheet towards which a side of the symbol looks. */
export function turnSide(placed: Pick<Placed, 'turn' | 'mirror'>, side: Side): Side {
  let result = placed.mirror ? mirrored[side] : side;
  for (let i = 0; i < placed.turn; i++) result = clockwise[result];
  return result;
}

/** A point of the symbol on the sheet. */
export function onSheet(symbol: Pick<SymbolDefinition, 'width' | 'height'>, placed: Placed, point: SheetPoint): SheetPoint {
  const turned = turnPoint(symbol, placed, point);
  return { x: placed.at.x + turned.x, y: placed.at.y + turned.y };
}

/** A port on the sheet and the side towards which its line leaves; undefined for a port the symbol does not have. */
export function portOnSheet(symbol: SymbolDefinition, placed: Placed, portId: string): SheetPort | undefined {
  const port = symbol.ports[portId];
  if (!port) return undefined;
  return { ...onSheet(symbol, placed, port), side: turnSide(placed, port.side) };
}

/** The box of a placed symbol on the sheet. */
export function boxOnSheet(symbol: Pick<SymbolDefinition, 'width' | 'height'>, placed: Placed): SheetBox {
  return { x: placed.at.x, y: placed.at.y, ...turnedSize(symbol, placed.turn) };
}
