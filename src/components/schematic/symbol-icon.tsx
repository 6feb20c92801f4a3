import { memo, useMemo } from 'react';
import { findKind } from '#shared/circuit/kind-lookup.ts';
import { openStubs } from '#shared/pictures/schematic-shapes.ts';
import type { Shape } from '#shared/pictures/shape.ts';
import { symbolOf } from '#shared/symbols/registry.ts';
import type { SymbolState } from '#shared/symbols/symbol.ts';
import { ShapeView } from './shape-view.tsx';

export interface SymbolIconProps {
  readonly kind: string;
  /** Room in pixels; the symbol is fitted in, never above ten pixels a module. */
  readonly width: number;
  readonly height: number;
}

const none: ReadonlySet<string> = new Set();

/** A kind's symbol at rest with typical values, without letters: for drawers, strips and lists. */
export const SymbolIcon = memo(function SymbolIcon({ kind, width, height }: SymbolIconProps) {
  const symbol = symbolOf(kind);
  const shapes = useMemo((): readonly Shape[] => {
    if (!symbol) return [];
    const values: Record<string, number | string> = {};
    for (const spec of findKind(kind)?.parameters ?? []) if (spec.initial !== null && spec.group !== 'load') values[spec.id] = spec.initial;
    const state: SymbolState = { readings: {}, pressures: {}, values: { ...values, mass: 0 } };
    const moving = (symbol.moving?.(state) ?? []).map(
      (shape): Shape => (shape.type === 'oil' ? { type: 'rect', x: shape.x, y: shape.y, w: shape.w, h: shape.h, fill: 'oil-0' } : shape),
    );
    return [...openStubs(symbol, none), ...symbol.still(state.values), ...moving];
  }, [symbol, kind]);
  if (!symbol) return null;
  const scale = Math.min(10, width / (symbol.width + 0.6), height / (symbol.height + 0.6));
  const left = (width / scale - symbol.width) / 2;
  const top = (height / scale - symbol.height) / 2;
  return (
    <svg width={width} height={height} viewBox={`0 0 ${width / scale} ${height / scale}`} aria-hidden="true" overflow="visible">
      <ShapeView shapes={shapes} textScale={0} transform={`translate(${left} ${top})`} />
    </svg>
  );
});
