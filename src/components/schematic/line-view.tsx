import { memo, useMemo, useRef } from 'react';
import type { Line } from '#shared/circuit/schema.ts';
import { barbSpacing, barbsPath, strandsPath } from '#shared/pictures/line-shapes.ts';
import { CASING, FILLET, inkShare, LINE_WIDTH, oilTintCss, strandCount, strandInk } from '#shared/pictures/pressure-ink.ts';
import type { RoutedLine } from '#shared/pictures/route.ts';
import { filletPath } from '#shared/pictures/route-path.ts';
import { useReducedMotion } from '#src/lib/theme.ts';
import { useCursor } from '#src/stores/cursor-store.ts';
import { type Moment, useMoment } from './moment.ts';

export interface LineViewProps {
  readonly line: Line;
  readonly route: RoutedLine;
  /** Follow the cursor; false = no pressure, no barbs. */
  readonly live: boolean;
}

/** Modules that barbs move per second of tape and litre per minute, while it plays. */
const DRIFT = 0.2;

function set(element: Element | null, name: string, value: string): void {
  if (element && element.getAttribute(name) !== value) element.setAttribute(name, value);
}

/** One line, in modules on the sheet: tint and strands by pressure, barbs by flow. Goes inside an SVG. */
export const LineView = memo(function LineView({ line, route, live }: LineViewProps) {
  const casing = useRef<SVGPathElement>(null);
  const tint = useRef<SVGPathElement>(null);
  const strands = useRef<SVGPathElement>(null);
  const halo = useRef<SVGPathElement>(null);
  const barbs = useRef<SVGPathElement>(null);
  const phase = useRef({ at: 0, time: 0 });
  const still = useReducedMotion();
  const { points } = route;
  const d = useMemo(() => filletPath(points, FILLET), [points]);

  function drift(flow: number, time: number): number {
    const since = time - phase.current.time;
    phase.current.time = time;
    const spacing = barbSpacing(flow);
    if (spacing === null || still || !useCursor.getState().playing || since <= 0 || since > 0.5) return phase.current.at;
    const moved = phase.current.at + Math.min(spacing * 0.4, since * Math.abs(flow) * 60_000 * DRIFT) * Math.sign(flow);
    phase.current.at = ((moved % spacing) + spacing) % spacing;
    return phase.current.at;
  }

  useMoment(
    ({ at, inkScale, time }: Moment) => {
      const from = at(`${line.from.component}.${line.from.port}.pressure`);
      const share = inkShare(from ?? at(`${line.to.component}.${line.to.port}.pressure`) ?? 0, inkScale);
      const rounded = Math.round(share * 500) / 500;
      const flow = at(`line.${line.id}.flow`) ?? 0;
      set(tint.current, 'stroke', oilTintCss(rounded));
      set(casing.current, 'stroke-dasharray', share > 1 ? '0.6 0.35' : 'none');
      set(strands.current, 'd', strandCount(share) === 0 ? '' : strandsPath(points, share));
      set(strands.current, 'stroke', `var(--${strandInk(share)})`);
      const path = barbsPath(points, flow, drift(flow, time));
      set(halo.current, 'd', path);
      set(barbs.current, 'd', path);
    },
    live && route.kind === 'working',
  );

  if (route.kind !== 'working') {
    return <path d={d} fill="none" stroke="var(--ink)" strokeWidth={0.18} strokeDasharray="0.5 0.3" data-line={line.id} />;
  }
  return (
    <g fill="none" data-line={line.id}>
      <path ref={casing} d={d} stroke="var(--ink)" strokeWidth={LINE_WIDTH + 2 * CASING} />
      <path ref={tint} d={d} stroke="var(--oil-0)" strokeWidth={LINE_WIDTH} />
      <path ref={strands} strokeWidth={0.07} opacity={0.8} />
      <path ref={halo} stroke="var(--sheet)" strokeWidth={0.42} strokeLinecap="round" strokeLinejoin="round" />
      <path ref={barbs} stroke="var(--ink)" strokeWidth={0.17} strokeLinecap="round" strokeLinejoin="round" />
    </g>
  );
});
