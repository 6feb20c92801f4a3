import { findKind } from '../circuit/kind-lookup.ts';
import type { CircuitDocument } from '../circuit/schema.ts';
import { placePoint, unionBox } from '../symbols/place.ts';
import { symbolOf } from '../symbols/registry.ts';
import { slipShapes, slipsOf } from './paper-slips.ts';
import { routeLines } from './route.ts';
import { type ReadingAt, schematicBounds, schematicShapes } from './schematic-shapes.ts';
import type { Picture, Shape } from './shape.ts';
import { symbolValues } from './symbol-values.ts';

export interface SchematicOptions {
  /** Scale of the pressure ink [Pa]. */
  readonly inkScale?: number;
  /** Thumbnails: tint only, no words. */
  readonly plain?: boolean;
  /** Room around the drawing [modules]. */
  readonly margin?: number;
  /** Numerals printed at screw anchors instead of tags: address 'component.screw' → numeral. */
  readonly numerals?: ReadonlyMap<string, string>;
  /** Notes as paper slips and part labels as plates. */
  readonly notes?: boolean;
}

/** The circuit as a picture in modules, for export, print and thumbnails.
 *  @param readings value of an address at the shown moment; null = valve at rest, rod in, no pressure */
export function schematicPicture(
  document: CircuitDocument,
  caseId: string,
  readings: ReadingAt | null,
  options: SchematicOptions = {},
): Picture {
  const routes = routeLines(document);
  const valuesOf = (component: CircuitDocument['components'][number]) => symbolValues(document, caseId, component);
  const margin = options.margin ?? 2;
  const slips = options.notes ? slipsOf(document) : [];
  const drawn = schematicBounds(document, valuesOf, routes);
  const box = unionBox([...(drawn ? [drawn] : []), ...slips.map((slip) => slip.box)]) ?? { x: 0, y: 0, w: 20, h: 10 };
  const shapes: Shape[] = [
    ...schematicShapes(
      document,
      {
        valuesOf,
        readingAt: readings,
        readingsOf: (component) => (findKind(component.kind)?.readings ?? []).map((reading) => reading.id),
        inkScale: options.inkScale ?? 250e5,
        plain: options.plain ?? false,
      },
      routes,
    ),
    ...slips.flatMap(slipShapes),
    ...numeralShapes(document, options.numerals),
  ];
  return {
    width: box.w + 2 * margin,
    height: box.h + 2 * margin,
    title: document.title,
    shapes: [{ type: 'group', dx: margin - box.x, dy: margin - box.y, shapes }],
  };
}

function numeralShapes(document: CircuitDocument, numerals: ReadonlyMap<string, string> | undefined): readonly Shape[] {
  if (!numerals) return [];
  const shapes: Shape[] = [];
  for (const [address, numeral] of numerals) {
    const [componentId = '', screw = ''] = address.split('.');
    const component = document.components.find((entry) => entry.id === componentId);
    const symbol = component && symbolOf(component.kind);
    const anchor = symbol?.anchors[screw];
    if (!component || !symbol || !anchor) continue;
    const at = placePoint(symbol, component, anchor);
    shapes.push(
      { type: 'circle', x: at.x, y: at.y - 1.2, r: 0.95, fill: 'ink' },
      { type: 'text', x: at.x, y: at.y - 0.75, text: numeral, size: 1.25, anchor: 'middle', weight: 700, fill: 'sheet' },
    );
  }
  return shapes;
}
