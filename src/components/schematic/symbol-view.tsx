import { memo, useMemo, useRef } from 'react';
import { findKind } from '#shared/circuit/kind-lookup.ts';
import type { Component } from '#shared/circuit/schema.ts';
import { openStubs, symbolState, withOil } from '#shared/pictures/schematic-shapes.ts';
import { groupMatrix } from '#shared/pictures/shape-transform.ts';
import { shapesMarkup } from '#shared/pictures/svg.ts';
import { placePoint } from '#shared/symbols/place.ts';
import { symbolOf } from '#shared/symbols/registry.ts';
import { inkCss } from './ink-css.ts';
import { useMoment } from './moment.ts';
import { ShapeView, setMarkup } from './shape-view.tsx';

export interface SymbolViewProps {
  readonly component: Component;
  /** Effective parameter values (symbolValues of shared/pictures). */
  readonly values: Readonly<Record<string, number | string>>;
  /** Port ids to which a line is joined; open ones show their stub. */
  readonly joined: ReadonlySet<string>;
  /** Follow the cursor; false = as printed: valve at rest, rod in, no pressure. */
  readonly live: boolean;
  /** Factor for port letters and the like; 0 leaves them out. */
  readonly textScale?: number;
}

const nothing: readonly string[] = [];

/** One symbol, in modules, its box's top-left corner (as drawn) at the origin. Goes inside an SVG. */
export const SymbolView = memo(function SymbolView({ component, values, joined, live, textScale = 1 }: SymbolViewProps) {
  const { kind, turn, mirror } = component;
  const symbol = symbolOf(kind);
  const moving = useRef<SVGGElement>(null);
  const readings = useMemo(() => findKind(kind)?.readings.map((reading) => reading.id) ?? nothing, [kind]);
  const still = useMemo(() => {
    if (!symbol) return [];
    const stubs = kind === 'junction' ? [] : openStubs(symbol, joined);
    return [...stubs, ...symbol.still(values)];
  }, [symbol, kind, joined, values]);

  const draw = (at: ((address: string) => number | undefined) | null, inkScale: number) => {
    if (!moving.current || !symbol?.moving) return;
    const view = { readingAt: at, readingsOf: () => readings, valuesOf: () => values, inkScale, plain: false };
    const state = symbolState(component, symbol, view);
    const shapes = withOil(symbol.moving(state), state, inkScale);
    setMarkup(moving.current, shapesMarkup(shapes, { colour: inkCss, turn, mirror, textScale }));
  };
  useMoment((moment) => draw(live ? moment.at : null, moment.inkScale));

  if (!symbol) return null;
  const origin = placePoint(symbol, { at: { x: 0, y: 0 }, turn, mirror }, { x: 0, y: 0 });
  return (
    <g transform={`matrix(${groupMatrix({ dx: origin.x, dy: origin.y, turn, mirror }).join(' ')})`}>
      <ShapeView shapes={still} turn={turn} mirror={mirror} textScale={textScale} />
      {symbol.moving && <g ref={moving} />}
    </g>
  );
});
