import { useLayoutEffect, useRef } from 'react';

export interface SvgTextProps {
  readonly label: string;
  /** A whole SVG file as text. */
  readonly svg: string;
}

/** An SVG file set into the page, there before the page is printed. */
export function SvgText({ label, svg }: SvgTextProps) {
  const ground = useRef<HTMLElement>(null);
  useLayoutEffect(() => {
    const parsed = new DOMParser().parseFromString(svg, 'image/svg+xml').documentElement;
    ground.current?.querySelector('svg')?.remove();
    ground.current?.append(document.importNode(parsed, true));
  }, [svg]);
  return (
    <figure className="print-picture" ref={ground}>
      <figcaption>{label}</figcaption>
    </figure>
  );
}
