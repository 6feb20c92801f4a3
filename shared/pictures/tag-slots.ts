import type { Box, Point } from '../symbols/place.ts';
import { unionBox } from '../symbols/place.ts';
import { overlaps } from './placement.ts';
import { legMeets, nearestOn, type StringLine, segmentsCross, stringCrosses } from './tag-geometry.ts';

/** Where screw tags stand (UI.md section 6). Eight slots per symbol: corners and mid-sides, two modules clear of its outline;
 *  along a side a tag may slide, so that its string stays short. The first free slot in the order away from the symbol's
 *  lines is taken; a slot is free if the tag covers no symbol, line, reading or other tag. The string is at most 12 modules
 *  (at desk scale), crosses no tag and no symbol, and crosses a working line only if no slot avoids it. Nothing free: the tag
 *  becomes compact, then a chip. Placement is stable: a tag moves only when its slot is taken, and a dragged tag stays. */

export type TagForm = 'full' | 'compact' | 'chip';
type Size = { readonly w: number; readonly h: number };

export interface TagRequest {
  readonly address: string;
  /** Where the string is tied on. */
  readonly anchor: Point;
  /** What its own symbol covers. */
  readonly bodies: readonly Box[];
  readonly form: TagForm;
  readonly sizes: Readonly<Record<TagForm, Size>>;
  /** Dragged: from the anchor to the middle of the tag. */
  readonly dragged?: { readonly dx: number; readonly dy: number };
  readonly inHand?: boolean;
  /** Shown in the wanted form even where it must cover lines. */
  readonly insist?: boolean;
  /** Where it stood before. */
  readonly before?: TagPlace;
}

export interface TagPlace {
  readonly address: string;
  readonly form: TagForm;
  readonly box: Box;
  readonly string: StringLine;
  /** Side of the tag at which its eyelet is. */
  readonly eyelet: 'left' | 'right';
  /** False where even a chip covers something: the drawing is too full. */
  readonly free: boolean;
  readonly dragged: boolean;
}

export interface Sheet {
  /** What every symbol covers: neither tags nor strings lie on it. */
  readonly symbols: readonly Box[];
  /** Readings, item codes, the key: tags do not cover them, strings may. */
  readonly words: readonly Box[];
  /** Legs of working lines. */
  readonly legs: readonly { readonly a: Point; readonly b: Point }[];
  /** Tags stay inside; absent = anywhere. */
  readonly frame?: Box;
  /** Modules per desk module: 1 / zoom below full size. String and clearance grow with it. */
  readonly grow?: number;
}

export const STRING_MOST = 12;
export const SLOT_CLEAR = 2;
/** Room kept between a tag and anything else, and half the width of a line. */
const ROOM = 0.4;
const forms: readonly TagForm[] = ['full', 'compact', 'chip'];

/** Middle of a tag's eyelet, or the nearest edge point of a small tag. */
export function stringStart(box: Box, form: TagForm, eyelet: 'left' | 'right', anchor: Point): Point {
  if (form !== 'full') return nearestOn(box, anchor);
  const inset = Math.min(1.05, box.h * 0.17);
  return { x: eyelet === 'left' ? box.x + inset : box.x + box.w - inset, y: box.y + box.h / 2 };
}

function placeOf(request: TagRequest, form: TagForm, box: Box, free: boolean, dragged: boolean): TagPlace {
  const eyelet = request.anchor.x < box.x + box.w / 2 ? 'left' : 'right';
  const from = stringStart(box, form, eyelet, request.anchor);
  return { address: request.address, form, box, eyelet, free, dragged, string: { from, to: request.anchor } };
}

interface Candidate {
  readonly box: Box;
  readonly cost: number;
}

/** Boxes at the eight slots, slid along the sides and pushed out, cheapest first. */
function candidates(request: TagRequest, size: Size, sheet: Sheet): Candidate[] {
  const outline = unionBox(request.bodies) ?? { ...request.anchor, w: 0, h: 0 };
  const grow = sheet.grow ?? 1;
  const near = legSides(outline, sheet);
  const found: Candidate[] = [];
  const { anchor } = request;
  const right = outline.x + outline.w;
  const bottom = outline.y + outline.h;
  const offer = (x: number, y: number, slot: number, pushed: number) => {
    // Nearer than two modules only where nothing else is free.
    const out = pushed < 0 ? 5 : pushed;
    const box = { x, y, w: size.w, h: size.h };
    const start = nearestOn(box, anchor);
    const length = Math.hypot(start.x - anchor.x, start.y - anchor.y);
    if (length > STRING_MOST * grow) return;
    found.push({ box, cost: length + 0.5 * slot + out + (near[slot] ?? 0) });
  };
  for (const out of [0, -1.5, 1.5, 3, 5, 7]) {
    const clear = (SLOT_CLEAR + out) * (out <= 0 ? 1 : grow);
    const slides = [0, 2, -2, 4, -4, 6, -6, 8, -8, 10, -10, 12, -12];
    for (const slide of slides) {
      const y = held(anchor.y - size.h / 2 + slide * grow, sheet.frame?.y, sheet.frame?.h, size.h);
      const x = held(anchor.x - size.w / 2 + slide * grow, sheet.frame?.x, sheet.frame?.w, size.w);
      offer(right + clear, y, 0, out);
      offer(outline.x - clear - size.w, y, 1, out);
      offer(x, outline.y - clear - size.h, 2, out);
      offer(x, bottom + clear, 3, out);
    }
    offer(right + clear, outline.y - clear - size.h, 4, out);
    offer(outline.x - clear - size.w, outline.y - clear - size.h, 5, out);
    offer(right + clear, bottom + clear, 6, out);
    offer(outline.x - clear - size.w, bottom + clear, 7, out);
  }
  return found.sort((a, b) => a.cost - b.cost);
}

/** A tag slides along a side no further than the frame. */
function held(value: number, from: number | undefined, room: number | undefined, size: number): number {
  return from === undefined || room === undefined ? value : Math.max(from, Math.min(from + room - size, value));
}

/** Extra cost of the slots on whose side a line leaves: right, left, top, bottom, then the corners. */
function legSides(outline: Box, sheet: Sheet): readonly number[] {
  const middle = { x: outline.x + outline.w / 2, y: outline.y + outline.h / 2 };
  const reach = 4;
  const touches = (x: number, y: number, w: number, h: number) =>
    sheet.legs.some((leg) => legMeets(leg.a, leg.b, { x, y, w, h })) ? 2 : 0;
  const right = touches(outline.x + outline.w, middle.y - outline.h / 2, reach, outline.h);
  const left = touches(outline.x - reach, middle.y - outline.h / 2, reach, outline.h);
  const top = touches(outline.x, outline.y - reach, outline.w, reach);
  const bottom = touches(outline.x, outline.y + outline.h, outline.w, reach);
  return [right, left, top, bottom, (top + right) / 2, (top + left) / 2, (bottom + right) / 2, (bottom + left) / 2];
}

function inside(box: Box, frame: Box | undefined): boolean {
  if (!frame) return true;
  return box.x >= frame.x && box.y >= frame.y && box.x + box.w <= frame.x + frame.w && box.y + box.h <= frame.y + frame.h;
}

/** True when a tag would cover something here. */
function covers(request: TagRequest, box: Box, sheet: Sheet, others: readonly TagPlace[]): boolean {
  if (!inside(box, sheet.frame)) return true;
  const around = grown(box, ROOM + 0.1);
  return (
    request.bodies.some((body) => overlaps(box, body, 0.1)) ||
    sheet.symbols.some((other) => overlaps(box, other, ROOM)) ||
    sheet.words.some((other) => overlaps(box, other, ROOM)) ||
    others.some((other) => overlaps(box, other.box, ROOM)) ||
    sheet.legs.some((leg) => legMeets(leg.a, leg.b, around))
  );
}

/** True when a tag may stand here; `crossing` = its string crosses a working line. */
function judge(request: TagRequest, place: TagPlace, sheet: Sheet, others: readonly TagPlace[]): { free: boolean; crossing: boolean } {
  const { box, string } = place;
  if (covers(request, box, sheet, others)) return { free: false, crossing: true };
  const own = new Set(request.bodies.map(key));
  const strings =
    others.some((other) => stringCrosses(string, other.box)) ||
    others.some((other) => stringCrosses(other.string, box)) ||
    sheet.symbols.some((other) => !own.has(key(other)) && stringCrosses(string, other));
  if (strings) return { free: false, crossing: true };
  const end = beforeAnchor(string);
  const crossing =
    sheet.legs.some((leg) => segmentsCross(string.from, end, leg.a, leg.b)) ||
    request.bodies.some((body) => stringCrosses({ from: string.from, to: end }, grown(body, -0.3)));
  return { free: true, crossing };
}

function key(box: Box): string {
  return `${box.x},${box.y},${box.w},${box.h}`;
}

function grown(box: Box, by: number): Box {
  return { x: box.x - by, y: box.y - by, w: box.w + 2 * by, h: box.h + 2 * by };
}

/** The string's end without its last stretch, which may touch its own symbol's line. */
function beforeAnchor({ from, to }: StringLine): Point {
  return { x: from.x + (to.x - from.x) * 0.92, y: from.y + (to.y - from.y) * 0.92 };
}

/** Where the hand is: a tag that is taken in hand stays under it, pushed into the frame at most, and lies above what it covers.
 *  One that opens from a smaller form does so only where it covers no symbol and no other tag. */
function underTheHand(request: TagRequest, sheet: Sheet, others: readonly TagPlace[]): TagPlace | null {
  const { before, form } = request;
  if (!before || before.dragged) return null;
  const size = request.sizes[form];
  const y = before.form === form ? before.box.y : before.box.y - (sheet.grow ?? 1);
  const box = {
    x: held(before.box.x, sheet.frame?.x, sheet.frame?.w, size.w),
    y: held(y, sheet.frame?.y, sheet.frame?.h, size.h),
    ...size,
  };
  const hides = (other: Box) => overlaps(box, other, ROOM);
  if (before.form !== form && (sheet.symbols.some(hides) || others.some((other) => hides(other.box)))) return null;
  return placeOf(request, form, box, true, false);
}

/** The place it had before, while that is still free; null when it is taken or the form changed. */
function sameAgain(request: TagRequest, sheet: Sheet, others: readonly TagPlace[]): TagPlace | null {
  const { before, form } = request;
  if (request.insist) return underTheHand(request, sheet, others);
  if (!before || before.dragged || before.form !== form || !before.free) return null;
  const same = placeOf(request, form, { ...before.box, ...request.sizes[form] }, true, false);
  return judge(request, same, sheet, others).free ? same : null;
}

function seat(request: TagRequest, sheet: Sheet, others: readonly TagPlace[]): TagPlace {
  const wanted = forms.slice(forms.indexOf(request.form));
  for (const form of wanted) {
    const size = request.sizes[form];
    let second: TagPlace | null = null;
    for (const candidate of candidates(request, size, sheet)) {
      if (covers(request, candidate.box, sheet, others)) continue;
      const place = placeOf(request, form, candidate.box, true, false);
      const verdict = judge(request, place, sheet, others);
      if (verdict.free && !verdict.crossing) return place;
      if (verdict.free) second ??= place;
    }
    if (second) return second;
    if (request.insist && form === request.form) return leastBad(request, form, sheet, others);
  }
  return leastBad(request, 'chip', sheet, others);
}

/** Where no slot is free: the one that covers least, symbols and tags before lines. */
function leastBad(request: TagRequest, form: TagForm, sheet: Sheet, others: readonly TagPlace[]): TagPlace {
  const size = request.sizes[form];
  let best: Box | null = null;
  let least = Number.POSITIVE_INFINITY;
  for (const { box, cost } of candidates(request, size, { ...sheet, grow: (sheet.grow ?? 1) * 1.5 })) {
    let over = cost * 0.05 + (inside(box, sheet.frame) ? 0 : 200);
    for (const other of sheet.symbols) over += shared(box, other);
    for (const other of sheet.words) over += shared(box, other);
    for (const other of others) over += 4 * shared(box, other.box);
    for (const leg of sheet.legs) if (legMeets(leg.a, leg.b, box)) over += 2;
    if (over < least) {
      least = over;
      best = box;
    }
  }
  const box = best ?? { x: request.anchor.x + 1, y: request.anchor.y + 1, ...size };
  return placeOf(request, form, box, false, false);
}

function shared(a: Box, b: Box): number {
  const w = Math.min(a.x + a.w, b.x + b.w) - Math.max(a.x, b.x);
  const h = Math.min(a.y + a.h, b.y + b.h) - Math.max(a.y, b.y);
  return w > 0 && h > 0 ? w * h : 0;
}

/** Places of all tags by address. Dragged tags stay where they were put; then the one in hand is seated; then those that stood
 *  somewhere before stay there while it is free; then the rest: large ones first, in the order given (flow order). */
export function placeTags(requests: readonly TagRequest[], sheet: Sheet): ReadonlyMap<string, TagPlace> {
  const placed: TagPlace[] = [];
  const due: TagRequest[] = [];
  for (const request of requests) {
    if (!request.dragged) continue;
    const size = request.sizes[request.form];
    const x = request.anchor.x + request.dragged.dx - size.w / 2;
    const y = request.anchor.y + request.dragged.dy - size.h / 2;
    placed.push(placeOf(request, request.form, { x, y, ...size }, true, true));
  }
  const held = requests.find((request) => request.inHand && !request.dragged);
  if (held) placed.push(sameAgain(held, sheet, placed) ?? seat(held, sheet, placed));
  for (const request of requests) {
    if (request.dragged || request === held) continue;
    const same = sameAgain(request, sheet, placed);
    if (same) placed.push(same);
    else due.push(request);
  }
  const size = (request: TagRequest) => forms.indexOf(request.form);
  const order = due.map((request, index) => ({ request, index }));
  order.sort((a, b) => size(a.request) - size(b.request) || a.index - b.index);
  for (const { request } of order) placed.push(seat(request, sheet, placed));
  return new Map(placed.map((place) => [place.address, place]));
}
