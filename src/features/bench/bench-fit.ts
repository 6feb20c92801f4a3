import type { CircuitDocument } from '#shared/circuit/schema.ts';
import { overlaps } from '#shared/pictures/placement.ts';
import { legMeets } from '#shared/pictures/tag-geometry.ts';
import type { Box } from '#shared/symbols/place.ts';
import { type Bodies, fitView, growth, type Leg, placeReadings, seatTags, type TagWish, type View, visibleBox } from './bench-layout.ts';
import type { ReadingSpec } from './reading-specs.ts';

/** How the whole drawing is fitted into its region: as large as may be, with room for its tags, its readings and the key. */

export type Corner = 'top-left' | 'bottom-left' | 'bottom-right' | 'top-right';
export interface Size {
  readonly width: number;
  readonly height: number;
}

export interface FitRequest {
  readonly document: CircuitDocument;
  readonly bodies: Bodies;
  readonly legs: readonly Leg[];
  readonly readings: readonly ReadingSpec[];
  readonly wishes: readonly TagWish[];
  readonly size: Size;
  readonly touch: boolean;
  /** Pixels of the key, of the turn wheel and of the zoom buttons. */
  readonly key: Size | null;
  readonly wheel: Size | null;
  readonly buttons: Size;
}

export interface Fit {
  readonly view: View;
  /** null = no corner is free: the key then stands at the top left, above the drawing. */
  readonly keyCorner: Corner | null;
  readonly wheelCorner: Corner | null;
  readonly blocked: readonly Box[];
}

/** Room around the drawing that is tried [modules at full size]. */
const rooms = [2, 3, 4, 5.5, 7] as const;
const MOST_ZOOM = 1.35;
const corners: readonly Corner[] = ['top-left', 'bottom-left', 'bottom-right', 'top-right'];

function cornerBox(corner: Corner, view: View, size: Size, panel: Size): Box {
  const unit = 10 * view.zoom;
  const x = corner.endsWith('left') ? view.left : view.left + (size.width - panel.width) / unit;
  const y = corner.startsWith('top') ? view.top : view.top + (size.height - panel.height) / unit;
  return { x, y, w: panel.width / unit, h: panel.height / unit };
}

function freeCorner(request: FitRequest, view: View, panel: Size, taken: readonly Box[]): Corner | null {
  const { bodies, legs, size } = request;
  const covered = [...[...bodies.byComponent.values()].flat(), ...bodies.words, ...taken];
  for (const corner of corners) {
    const box = cornerBox(corner, view, size, panel);
    if (!covered.some((other) => overlaps(box, other)) && !legs.some((leg) => legMeets(leg.a, leg.b, box))) return corner;
  }
  return null;
}

function panelsIn(request: FitRequest, view: View): Fit {
  const { size, key, wheel, buttons } = request;
  const bottomRight = cornerBox('bottom-right', view, size, buttons);
  const keyCorner = key ? freeCorner(request, view, key, [bottomRight]) : null;
  const blocked = key && keyCorner ? [bottomRight, cornerBox(keyCorner, view, size, key)] : [bottomRight];
  const wheelCorner = wheel ? freeCorner(request, view, wheel, blocked) : null;
  if (wheel && wheelCorner) blocked.push(cornerBox(wheelCorner, view, size, wheel));
  return { view, keyCorner, wheelCorner, blocked };
}

/** What is wrong with a view: tags that shrink or cover something, readings without a place, a key without a corner. */
function faults(request: FitRequest, fit: Fit): number {
  const { bodies, legs, size, wishes, document, touch } = request;
  const grow = growth(fit.view.zoom);
  const frame = visibleBox(fit.view, size.width, size.height);
  const readings = placeReadings(request.readings, bodies, legs, grow, fit.blocked, frame);
  const tags = seatTags(wishes, document, bodies, legs, readings, { grow, touch, frame, blocked: fit.blocked }, null);
  let count = request.readings.length - readings.size;
  for (const { spec, form } of wishes) {
    const place = tags.get(spec.address);
    if (!place?.free) count += 2;
    else if (place.form !== form) count += form === 'full' ? 2 : 1;
  }
  return count + (request.key && !fit.keyCorner ? 2 : 0);
}

/** The largest view in which everything finds its place; where none does, the one with the fewest faults. */
export function chooseFit(request: FitRequest): Fit {
  const { bodies, size, key } = request;
  const views = rooms.map((room) => fitView(bodies.all, size.width, size.height, MOST_ZOOM, room));
  if (key) {
    const lower = fitView(bodies.all, size.width, Math.max(60, size.height - key.height), MOST_ZOOM, 2);
    views.push({ ...lower, top: lower.top - key.height / 10 / lower.zoom });
  }
  let best: Fit | null = null;
  let least = Number.POSITIVE_INFINITY;
  for (const view of views) {
    const fit = panelsIn(request, view);
    const wrong = faults(request, fit);
    const count = wrong + (1 - view.zoom / (views[0]?.zoom ?? 1)) * 6;
    if (count < least - 1e-9) {
      least = count;
      best = fit;
    }
    if (size.width === 0 || wrong === 0) break;
  }
  return best ?? panelsIn(request, fitView(bodies.all, size.width, size.height, MOST_ZOOM, 2));
}
