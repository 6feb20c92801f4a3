import type { CircuitDocument } from '#shared/circuit/schema.ts';
import { overlaps } from '#shared/pictures/placement.ts';
import { legMeets } from '#shared/pictures/tag-geometry.ts';
import type { Box } from '#shared/symbols/place.ts';
import { type Bodies, fitView, growth, type Leg, placeReadings, seatTags, type TagWish, type View, visibleBox } from './bench-layout.ts';
import type { ReadingSpec } from './reading-specs.ts';

/** How the whole drawing is fitted into its region: as large as may be, with room for its tags, its readings and the key. */

/** Left-top corner of a panel in its region [px]. */
export interface PanelPlace {
  readonly left: number;
  readonly top: number;
}
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
  /** An arrangement made for its region: it takes the whole width. */
  readonly tight?: boolean;
}

export interface Fit {
  readonly view: View;
  /** null = there is no free place. */
  readonly keyPlace: PanelPlace | null;
  readonly wheelPlace: PanelPlace | null;
  readonly blocked: readonly Box[];
}

/** Room around the drawing that is tried [modules at full size]. */
const rooms = [2, 3, 4, 5.5, 7] as const;
const tightRooms = [0.6] as const;
const MOST_ZOOM = 1.35;

function panelBox(place: PanelPlace, view: View, panel: Size): Box {
  const unit = 10 * view.zoom;
  return { x: view.left + place.left / unit, y: view.top + place.top / unit, w: panel.width / unit, h: panel.height / unit };
}

/** Places along the edge of the region: top left, along the bottom, then the rest. */
function edgePlaces(size: Size, panel: Size): PanelPlace[] {
  const right = size.width - panel.width;
  const bottom = size.height - panel.height;
  const places: PanelPlace[] = [
    { left: 0, top: 0 },
    { left: 0, top: bottom },
  ];
  for (let left = 20; left < right; left += 20) places.push({ left, top: bottom });
  places.push({ left: right, top: bottom }, { left: right, top: 0 });
  for (let left = 20; left < right; left += 20) places.push({ left, top: 0 });
  for (let top = 20; top < bottom; top += 20) places.push({ left: 0, top });
  return places;
}

function freeEdge(request: FitRequest, view: View, panel: Size, taken: readonly Box[]): PanelPlace | null {
  const { bodies, legs, size } = request;
  const covered = [...[...bodies.byComponent.values()].flat(), ...bodies.words, ...taken];
  for (const place of edgePlaces(size, panel)) {
    const box = panelBox(place, view, panel);
    if (!covered.some((other) => overlaps(box, other)) && !legs.some((leg) => legMeets(leg.a, leg.b, box))) return place;
  }
  return null;
}

function panelsIn(request: FitRequest, view: View): Fit {
  const { size, key, wheel, buttons } = request;
  const corner = { left: size.width - buttons.width, top: size.height - buttons.height };
  const blocked = [panelBox(corner, view, buttons)];
  const wheelPlace = wheel ? freeEdge(request, view, wheel, blocked) : null;
  if (wheel && wheelPlace) blocked.push(panelBox(wheelPlace, view, wheel));
  const keyPlace = key ? freeEdge(request, view, key, blocked) : null;
  if (key && keyPlace) blocked.push(panelBox(keyPlace, view, key));
  return { view, keyPlace, wheelPlace, blocked };
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
  return count + (request.key && !fit.keyPlace ? 2 : 0) + (request.wheel && !fit.wheelPlace ? 2 : 0);
}

/** The largest view in which everything finds its place; where none does, the one with the fewest faults. */
export function chooseFit(request: FitRequest): Fit {
  const { bodies, size, key } = request;
  const views = (request.tight ? tightRooms : rooms).map((room) => fitView(bodies.all, size.width, size.height, MOST_ZOOM, room));
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
