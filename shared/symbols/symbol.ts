import type { Shape } from '../pictures/shape.ts';

/** A symbol: shapes of the open fluid-power symbol standard (ISO 1219-1), sizes our own (one module = one grid step).
 *  The list is drawn for turn 0, not mirrored, origin at the top-left of the box; renderer turns and mirrors. */
export type Side = 'left' | 'right' | 'top' | 'bottom';

export interface SymbolPort {
  readonly x: number;
  readonly y: number;
  /** Side towards which a line leaves. */
  readonly side: Side;
  /** Points x, y, … from the symbol's body to (not including) the port: a joined line is drawn from the first of them; an open
   *  port shows them as a thin stroke. Absent = the port lies on the body. */
  readonly stub?: readonly number[];
  /** 'drain' and 'pilot' lines are dashed; absent = a working line. */
  readonly line?: 'drain' | 'pilot';
}

/** What the moving parts depend on. Absent readings mean: draw at rest. */
export interface SymbolState {
  /** Reading id → value at the cursor [SI]. */
  readonly readings: Readonly<Record<string, number>>;
  /** Port id → pressure [Pa]. */
  readonly pressures: Readonly<Record<string, number>>;
  /** Parameter id → effective value. */
  readonly values: Readonly<Record<string, number | string>>;
  /** Pressure scale of the ink [Pa], for tinted strokes. */
  readonly inkScale?: number;
}

/** How far moving parts and loads may pass the box on each side, in modules. */
export interface Reach {
  readonly left: number;
  readonly right: number;
  readonly top: number;
  readonly bottom: number;
}

export interface SymbolDefinition {
  readonly kind: string;
  readonly width: number;
  readonly height: number;
  readonly ports: Readonly<Record<string, SymbolPort>>;
  /** Named points for tag strings (screw ids) and readings. */
  readonly anchors: Readonly<Record<string, { readonly x: number; readonly y: number }>>;
  /** Place of the item code (middle of its baseline). */
  readonly code: { readonly x: number; readonly y: number };
  /** Swept room beside the box, for tags and routes. */
  readonly reach?: (values: Readonly<Record<string, number | string>>) => Reach;
  /** What the symbol really covers, as boxes, with everything that may move out; absent = box and reach. Tags may stand between them. */
  readonly bodies?: (
    values: Readonly<Record<string, number | string>>,
  ) => readonly { readonly x: number; readonly y: number; readonly w: number; readonly h: number }[];
  /** Strokes that never change. */
  readonly still: (values: Readonly<Record<string, number | string>>) => readonly Shape[];
  /** Parts that move with readings (spool, rod, needle, ring); drawn above `still`. */
  readonly moving?: (state: SymbolState) => readonly Shape[];
}
