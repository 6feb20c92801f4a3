import { memo, type SVGProps, useLayoutEffect, useRef } from 'react';
import type { Shape } from '#shared/pictures/shape.ts';
import { shapesMarkup } from '#shared/pictures/svg.ts';
import { inkCss } from './ink-css.ts';

export interface ShapeViewProps extends Pick<SVGProps<SVGGElement>, 'transform' | 'className' | 'opacity'> {
  readonly shapes: readonly Shape[];
  /** Turn and mirror of the group around it, so that words stay upright. */
  readonly turn?: number;
  readonly mirror?: boolean;
  /** Factor for small words; 0 leaves them out. */
  readonly textScale?: number;
}

/** A drawing list inside an SVG, in the list's own unit. All words in it are escaped by the markup writer. */
export const ShapeView = memo(function ShapeView({ shapes, turn = 0, mirror = false, textScale = 1, ...rest }: ShapeViewProps) {
  const group = useRef<SVGGElement>(null);
  useLayoutEffect(() => {
    if (group.current) setMarkup(group.current, shapesMarkup(shapes, { colour: inkCss, turn, mirror, textScale }));
  }, [shapes, turn, mirror, textScale]);
  return <g ref={group} {...rest} />;
});

const written = new WeakMap<Element, string>();

/** Writes the markup of a group only when it differs from what stands there. */
export function setMarkup(element: Element, markup: string): void {
  if (written.get(element) === markup) return;
  written.set(element, markup);
  element.innerHTML = markup;
}
