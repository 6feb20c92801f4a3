import type { Shape } from '../pictures/shape.ts';

/** A symbol: shapes of the open fluid-power symbol standard (ISO 1219-1), sizes our own (one module = one grid step).
 *  The list is drawn for turn 0, not mirrored, origin at the top-left of the box; renderer turns and mirrors. */
export type Side = 'left' | 'right' | 'top' | 'bottom';

export interface SymbolPort {
  readonly x: number;
  readonly y: number;
  /** Side towards which a line leaves. */
  readonly side: Side;
}

/** What the moving parts depend on. Absent readings mean: draw at rest. */
export interface SymbolState {
  /** Reading id → value at the cursor [SI]. */
  readonly readings: Readonly<Record<string, number>>;
  /** Port id → pressure [Pa]. */
  readonly pressures: Readonly<Record<string, number>>;
  /** Parameter id → effective value. */
  readonly values: Readonly<Record<string, number | string>>;
}

export interface SymbolDefinition {
  readonly kind: string;
  readonly width: number;
  readonly height: number;
  readonly ports: Readonly<Record<string, SymbolPort>>;
  /** Named points for tag strings (screw ids) and readings. */
  readonly anchors: Readonly<Record<string, { readonly x: number; readonly y: number }>>;
  /** Place of the item code. */
  readonly code: { readonly x: number; readonly y: number };
  /** Strokes that never change. */
  readonly still: (values: Readonly<Record<string, number | string>>) => readonly Shape[];
  /** Parts that move with readings (spool, rod, needle, ring); drawn above `still`. */
  readonly moving?: (state: SymbolState) => readonly Shape[];
}
