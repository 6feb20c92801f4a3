import { memo, useEffect, useMemo, useRef } from 'react';
import type { CircuitDocument } from '#shared/circuit/schema.ts';
import { type Slip, slipShapes } from '#shared/pictures/paper-slips.ts';
import { FILLET } from '#shared/pictures/pressure-ink.ts';
import type { RoutedLine } from '#shared/pictures/route.ts';
import { filletPath } from '#shared/pictures/route-path.ts';
import { symbolValues } from '#shared/pictures/symbol-values.ts';
import { placePoint } from '#shared/symbols/place.ts';
import { symbolOf } from '#shared/symbols/registry.ts';
import { LineView } from '#src/components/schematic/line-view.tsx';
import { ShaftsView } from '#src/components/schematic/shaft-view.tsx';
import { ShapeView } from '#src/components/schematic/shape-view.tsx';
import { SymbolView, type SymbolViewProps } from '#src/components/schematic/symbol-view.tsx';
import { useJoinedPorts } from '#src/components/schematic/use-routes.ts';
import type { PlacedSlip } from './bench-layout.ts';

export interface SheetViewProps {
  readonly document: CircuitDocument;
  readonly caseId: string;
  readonly routes: ReadonlyMap<string, RoutedLine>;
  /** Factor for small words; 0 leaves them out. */
  readonly textScale: number;
  readonly slips: readonly PlacedSlip[];
  readonly grow: number;
  readonly onOpen: (id: string) => void;
}

/** Hold before a long press counts [ms]. */
const LONG_PRESS = 550;

/** Shafts, lines and symbols, live. The same sheet that is printed, ten pixels a module. */
export const SheetView = memo(function SheetView({ document, caseId, routes, textScale, slips, grow, onOpen }: SheetViewProps) {
  const joined = useJoinedPorts(document);
  const values = useSteadyValues(document, caseId);
  const group = useOpening(onOpen);
  return (
    <svg className="bench-sheet" width="1" height="1" overflow="visible" aria-hidden="true">
      <g ref={group} transform="scale(10)">
        <ShaftsView components={document.components} shafts={document.shafts} />
        {document.lines.map((line) => {
          const route = routes.get(line.id);
          return route && <SheetLine key={line.id} line={line} route={route} />;
        })}
        {document.components.map((component) => (
          <SheetPart
            key={component.id}
            component={component}
            values={values(component.id)}
            joined={joined(component.id)}
            textScale={textScale}
          />
        ))}
        {slips.map(({ slip, box }) => (
          <SlipView key={slip.id} slip={slip} x={box.x} y={box.y} grow={grow} />
        ))}
        {textScale > 0 && document.components.map((component) => <Code key={component.id} component={component} textScale={textScale} />)}
      </g>
    </svg>
  );
});

/** Double click or long press on a symbol or line. The keyboard opens the same from the tags and the component list. */
function useOpening(onOpen: (id: string) => void) {
  const group = useRef<SVGGElement>(null);
  useEffect(() => {
    const element = group.current;
    if (!element) return;
    let press: ReturnType<typeof setTimeout> | undefined;
    const release = () => clearTimeout(press);
    const open = (event: Event) => {
      const id = openedBy(event.target);
      if (id) onOpen(id);
    };
    const hold = (event: PointerEvent) => {
      release();
      const id = openedBy(event.target);
      if (id && event.pointerType !== 'mouse') press = setTimeout(() => onOpen(id), LONG_PRESS);
    };
    const stray = (event: PointerEvent) => {
      if (Math.abs(event.movementX) + Math.abs(event.movementY) > 3) release();
    };
    element.addEventListener('dblclick', open);
    element.addEventListener('pointerdown', hold);
    element.addEventListener('pointerup', release);
    element.addEventListener('pointercancel', release);
    element.addEventListener('pointermove', stray);
    return () => {
      release();
      element.removeEventListener('dblclick', open);
      element.removeEventListener('pointerdown', hold);
      element.removeEventListener('pointerup', release);
      element.removeEventListener('pointercancel', release);
      element.removeEventListener('pointermove', stray);
    };
  }, [onOpen]);
  return group;
}

/** Id of the component or line under the pointer. */
function openedBy(target: EventTarget | null): string | null {
  return target instanceof Element ? (target.closest('[data-open]')?.getAttribute('data-open') ?? null) : null;
}

const SheetLine = memo(function SheetLine({
  line,
  route,
}: {
  readonly line: CircuitDocument['lines'][number];
  readonly route: RoutedLine;
}) {
  return (
    <g data-open={line.id}>
      <path d={filletPath(route.points, FILLET)} className="line-hit" />
      <LineView line={line} route={route} live />
    </g>
  );
});

const SheetPart = memo(function SheetPart({ component, values, joined, textScale }: Omit<SymbolViewProps, 'live'>) {
  return (
    <g transform={`translate(${component.at.x} ${component.at.y})`} data-component={component.id} data-open={component.id}>
      <SymbolView component={component} values={values} joined={joined} live textScale={textScale} />
    </g>
  );
});

const SlipView = memo(function SlipView({
  slip,
  x,
  y,
  grow,
}: {
  readonly slip: Slip;
  readonly x: number;
  readonly y: number;
  readonly grow: number;
}) {
  const shapes = useMemo(() => slipShapes({ ...slip, box: { ...slip.box, x: 0, y: 0 } }), [slip]);
  return <ShapeView shapes={shapes} className={`bench-slip bench-slip-${slip.kind}`} transform={`translate(${x} ${y}) scale(${grow})`} />;
});

const Code = memo(function Code({
  component,
  textScale,
}: {
  readonly component: CircuitDocument['components'][number];
  readonly textScale: number;
}) {
  const symbol = symbolOf(component.kind);
  if (!symbol || component.kind === 'junction' || component.kind === 'tank') return null;
  const at = placePoint(symbol, component, symbol.code);
  return (
    <text x={at.x} y={at.y} className="item-code" fontSize={1.2 * textScale} textAnchor="middle">
      {component.name}
    </text>
  );
});

const nothing: Readonly<Record<string, number | string>> = {};

/** Effective values by component; the same object while nothing in it changed, so that a turned screw redraws one symbol. */
function useSteadyValues(document: CircuitDocument, caseId: string): (id: string) => Readonly<Record<string, number | string>> {
  const kept = useRef(new Map<string, { text: string; values: Readonly<Record<string, number | string>> }>());
  return useMemo(() => {
    const next = new Map<string, { text: string; values: Readonly<Record<string, number | string>> }>();
    for (const component of document.components) {
      const values = symbolValues(document, caseId, component);
      const text = JSON.stringify(values);
      const before = kept.current.get(component.id);
      next.set(component.id, before?.text === text ? before : { text, values });
    }
    kept.current = next;
    return (id: string) => next.get(id)?.values ?? nothing;
  }, [document, caseId]);
}
