import type { CircuitDocument } from '#shared/circuit/schema.ts';
import { endOf, segmentBox } from '#shared/pictures/line-ends.ts';
import type { Slip } from '#shared/pictures/paper-slips.ts';
import { overlaps } from '#shared/pictures/placement.ts';
import type { RoutedLine } from '#shared/pictures/route.ts';
import { segmentsOf } from '#shared/pictures/route-cost.ts';
import { shaftPath } from '#shared/pictures/shaft-shapes.ts';
import { symbolValues } from '#shared/pictures/symbol-values.ts';
import { legMeets } from '#shared/pictures/tag-geometry.ts';
import { placeTags, type TagForm, type TagPlace, type TagRequest } from '#shared/pictures/tag-slots.ts';
import { type Box, bodyBoxes, type Point, placePoint, unionBox } from '#shared/symbols/place.ts';
import { symbolOf } from '#shared/symbols/registry.ts';
import type { ReadingSpec } from './reading-specs.ts';
import type { TagSpec } from './tag-specs.ts';

/** Where everything on the bench's sheet stands; in modules. */

export interface View {
  /** Pixels per module ÷ 10. */
  readonly zoom: number;
  /** Left-top of the visible part, in modules. */
  readonly left: number;
  readonly top: number;
}

export interface Leg {
  readonly a: Point;
  readonly b: Point;
}

export interface Bodies {
  readonly byComponent: ReadonlyMap<string, readonly Box[]>;
  /** Item codes and shafts' arrows, which tags leave free too. */
  readonly words: readonly Box[];
  readonly all: Box | null;
}

/** What every symbol covers, with its item code. */
export function bodiesOf(document: CircuitDocument, caseId: string, routes: ReadonlyMap<string, RoutedLine>): Bodies {
  const byComponent = new Map<string, readonly Box[]>();
  const words: Box[] = [];
  for (const component of document.components) {
    const symbol = symbolOf(component.kind);
    if (!symbol) continue;
    byComponent.set(component.id, bodyBoxes(symbol, component, symbolValues(document, caseId, component)));
    if (component.kind === 'junction' || component.kind === 'tank') continue;
    const code = placePoint(symbol, component, symbol.code);
    words.push({ x: code.x - 1, y: code.y - 1, w: 2, h: 1.2 });
  }
  const byId = new Map(document.components.map((component) => [component.id, component]));
  for (const shaft of document.shafts) {
    shaft.members.slice(1).forEach((member, k) => {
      const before = shaft.members[k];
      const from = before && endOf(byId.get(before.component), before.port);
      const to = endOf(byId.get(member.component), member.port);
      if (from && to) words.push(...shaftBoxes(shaftPath(from, to)));
    });
  }
  const ends = [...routes.values()].flatMap((route) => route.points.map((point) => ({ x: point.x - 0.5, y: point.y - 0.5, w: 1, h: 1 })));
  return { byComponent, words, all: unionBox([...[...byComponent.values()].flat(), ...words, ...ends]) };
}

/** Boxes of a shaft and of its arrow of rotation. */
function shaftBoxes(points: readonly Point[]): readonly Box[] {
  const boxes = points.slice(1).map((point, k) => segmentBox(points[k] as Point, point, 0.6));
  const a = points[0];
  const b = points[points.length - 1];
  if (a && b && points.length === 2) boxes.push({ x: (a.x + b.x) / 2 - 1.2, y: (a.y + b.y) / 2 - 2.1, w: 2.2, h: 3.9 });
  return boxes;
}

/** Pixels of the three forms. A chip is small, but takes presses from around it. */
export function tagSizes(touch: boolean, chipText: string): Record<TagForm, { readonly width: number; readonly height: number }> {
  return {
    full: { width: 226, height: touch ? 68 : 64 },
    compact: { width: 107, height: touch ? 48 : 44 },
    chip: { width: Math.max(30, 13 + chipText.length * 8.6), height: 24 },
  };
}

/** Modules per pixel-at-desk-scale × 10: words keep their size on the screen down to small zooms, and grow with large ones. */
export function growth(zoom: number): number {
  return 1 / Math.min(1.2, Math.max(0.3, zoom));
}

/** Places the readings: each as near as may be to where it would best stand, off symbols, lines and other readings. */
export function placeReadings(
  specs: readonly ReadingSpec[],
  bodies: Bodies,
  legs: readonly Leg[],
  grow: number,
  blocked: readonly Box[],
  frame: Box | undefined,
): ReadonlyMap<string, Box> {
  const taken: Box[] = [...[...bodies.byComponent.values()].flat(), ...bodies.words, ...blocked];
  const placed = new Map<string, Box>();
  for (const spec of specs) {
    const w = (spec.width / 10) * grow;
    const h = (spec.height / 10) * grow;
    const chosen = spiral.find(({ dx, dy }) => {
      const box = { x: spec.wish.x + dx - w / 2, y: spec.wish.y + dy - h / 2, w, h };
      if (frame && !within(box, frame)) return false;
      const grown = { x: box.x - 0.2, y: box.y - 0.2, w: w + 0.4, h: h + 0.4 };
      const over = { ...grown, y: grown.y - 0.4, h: grown.h + 0.8 };
      return !taken.some((other) => overlaps(grown, other)) && !legs.some((leg) => legMeets(leg.a, leg.b, over));
    });
    if (!chosen) continue;
    const box = { x: spec.wish.x + chosen.dx - w / 2, y: spec.wish.y + chosen.dy - h / 2, w, h };
    taken.push(box);
    placed.set(spec.id, box);
  }
  return placed;
}

const spiral: readonly { readonly dx: number; readonly dy: number }[] = (() => {
  const steps: { dx: number; dy: number }[] = [];
  for (let dx = -14; dx <= 14; dx += 1) for (let dy = -8; dy <= 8; dy += 1) steps.push({ dx, dy });
  return steps.sort((a, b) => Math.hypot(a.dx, a.dy * 1.3) - Math.hypot(b.dx, b.dy * 1.3));
})();

function within(box: Box, frame: Box): boolean {
  return box.x >= frame.x && box.y >= frame.y && box.x + box.w <= frame.x + frame.w && box.y + box.h <= frame.y + frame.h;
}

/** Legs of working lines and of shafts. */
export function legsOf(routes: ReadonlyMap<string, RoutedLine>): Leg[] {
  return [...routes.values()].flatMap((route) => segmentsOf(route.points));
}

/** Slips of notes and labels: where they were put or as near as may be, but never on anything else; those without room stay on the
 *  Draw stage. Words keep their size on the screen, so a slip grows as the sheet shrinks. */
export function placeSlips(
  slips: readonly Slip[],
  taken: readonly Box[],
  legs: readonly Leg[],
  grow: number,
  frame: Box | undefined,
): readonly PlacedSlip[] {
  const covered = [...taken];
  return slips.flatMap((slip): PlacedSlip[] => {
    const w = slip.box.w * grow;
    const h = slip.box.h * grow;
    const at = ({ dx, dy }: { readonly dx: number; readonly dy: number }): Box => ({ x: slip.box.x + dx, y: slip.box.y + dy, w, h });
    const free = spiral.find((step) => {
      const box = at(step);
      const grown = { x: box.x - 0.4, y: box.y - 0.4, w: w + 0.8, h: h + 0.8 };
      return (
        (!frame || within(box, frame)) &&
        !covered.some((other) => overlaps(grown, other)) &&
        !legs.some((leg) => legMeets(leg.a, leg.b, grown))
      );
    });
    if (!free) return [];
    const box = at(free);
    covered.push(box);
    return [{ slip, box }];
  });
}

export interface PlacedSlip {
  readonly slip: Slip;
  readonly box: Box;
}

export interface TagWish {
  readonly spec: TagSpec;
  readonly form: TagForm;
  readonly chipText: string;
  readonly inHand: boolean;
}

/** Places all tags; those that were seated before stay while their slot is free. */
export function seatTags(
  wishes: readonly TagWish[],
  document: CircuitDocument,
  bodies: Bodies,
  legs: readonly Leg[],
  readings: ReadonlyMap<string, Box>,
  options: {
    readonly grow: number;
    readonly touch: boolean;
    readonly frame: Box | undefined;
    readonly blocked: readonly Box[];
    readonly wheel?: boolean;
  },
  before: ReadonlyMap<string, TagPlace> | null,
): ReadonlyMap<string, TagPlace> {
  const { grow, touch, frame, blocked, wheel } = options;
  const requests = wishes.map(({ spec, form, chipText, inHand }): TagRequest => {
    const pixels = tagSizes(touch, chipText);
    const size = (name: TagForm) => ({ w: (pixels[name].width / 10) * grow, h: (pixels[name].height / 10) * grow });
    const dragged = document.tagPlaces[spec.address];
    return {
      address: spec.address,
      anchor: spec.anchor,
      bodies: bodies.byComponent.get(spec.component) ?? [],
      form,
      sizes: { full: size('full'), compact: size('compact'), chip: size('chip') },
      dragged: dragged ? { dx: dragged.dx, dy: dragged.dy } : undefined,
      inHand,
      insist: inHand && form === 'full' && !wheel,
      before: before?.get(spec.address),
    };
  });
  const symbols = [...bodies.byComponent.values()].flat();
  return placeTags(requests, { symbols, words: [...bodies.words, ...readings.values(), ...blocked], legs, frame, grow });
}

/** The view that shows everything: the whole drawing with some room, centred.
 *  @param room around the drawing, in modules */
export function fitView(all: Box | null, width: number, height: number, most: number, room: number): View {
  const box = all ?? { x: 0, y: 0, w: 60, h: 30 };
  const zoom = Math.min(most, width / 10 / (box.w + 2 * room), height / 10 / (box.h + 2 * room));
  const safe = Math.max(0.1, Number.isFinite(zoom) ? zoom : 1);
  return { zoom: safe, left: box.x + box.w / 2 - width / 20 / safe, top: box.y + box.h / 2 - height / 20 / safe };
}

/** The visible part of the sheet, in modules. */
export function visibleBox(view: View, width: number, height: number): Box {
  const inset = 0.6 / view.zoom;
  return { x: view.left + inset, y: view.top + inset, w: width / 10 / view.zoom - 2 * inset, h: height / 10 / view.zoom - 2 * inset };
}
