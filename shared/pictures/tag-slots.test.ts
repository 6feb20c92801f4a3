import { describe, expect, it } from 'vitest';
import { findKind } from '../circuit/kind-lookup.ts';
import { crowdedCircuit } from '../circuit/samples/crowded.ts';
import { demoCircuit } from '../circuit/samples/demo.ts';
import type { CircuitDocument } from '../circuit/schema.ts';
import { type Box, bodyBoxes, placePoint } from '../symbols/place.ts';
import { symbolOf } from '../symbols/registry.ts';
import { writtenValues } from './line-ends.ts';
import { overlaps } from './placement.ts';
import { routeLines } from './route.ts';
import { segmentsOf } from './route-cost.ts';
import { legMeets, segmentsCross, segmentThrough, stringCrosses } from './tag-geometry.ts';
import { placeTags, type Sheet, STRING_MOST, type TagForm, type TagPlace, type TagRequest } from './tag-slots.ts';

const sizes = { full: { w: 22.6, h: 6.4 }, compact: { w: 10.7, h: 4.4 }, chip: { w: 4.6, h: 2.4 } };

function sheetOf(document: CircuitDocument): Sheet {
  const symbols = document.components.flatMap((component) => bodyBoxes(symbolOf(component.kind)!, component, writtenValues(component)));
  const legs = [...routeLines(document).values()].flatMap((route) => segmentsOf(route.points));
  const words = document.components.flatMap((component): Box[] => {
    if (component.kind === 'junction' || component.kind === 'tank') return [];
    const code = placePoint(symbolOf(component.kind)!, component, symbolOf(component.kind)!.code);
    return [{ x: code.x - 1, y: code.y - 1, w: 2, h: 1.2 }];
  });
  return { symbols, words, legs };
}

function requestsOf(document: CircuitDocument, form: TagForm): TagRequest[] {
  return document.components.flatMap((component) => {
    const symbol = symbolOf(component.kind)!;
    return (findKind(component.kind)?.screws ?? []).map((screw) => ({
      address: `${component.id}.${screw.id}`,
      anchor: placePoint(symbol, component, symbol.anchors[screw.anchor]!),
      bodies: bodyBoxes(symbol, component, writtenValues(component)),
      form,
      sizes,
    }));
  });
}

function expectClear(places: ReadonlyMap<string, TagPlace>, sheet: Sheet, requests: readonly TagRequest[]) {
  const all = [...places.values()];
  for (const place of all) {
    const where = place.address;
    for (const box of [...sheet.symbols, ...sheet.words]) expect(overlaps(place.box, box), `${where} covers`).toBe(false);
    for (const leg of sheet.legs) expect(legMeets(leg.a, leg.b, place.box), `${where} on a line`).toBe(false);
    const own = requests.find((request) => request.address === where)!;
    const { from, to } = place.string;
    expect(to).toEqual(own.anchor);
    for (const box of sheet.symbols) {
      if (own.bodies.some((body) => body.x === box.x && body.y === box.y)) continue;
      expect(stringCrosses(place.string, box), `string of ${where} over a symbol`).toBe(false);
    }
    const nearest = {
      x: Math.min(place.box.x + place.box.w, Math.max(place.box.x, to.x)),
      y: Math.min(place.box.y + place.box.h, Math.max(place.box.y, to.y)),
    };
    expect(Math.hypot(nearest.x - to.x, nearest.y - to.y)).toBeLessThanOrEqual(STRING_MOST);
    expect(Math.hypot(from.x - to.x, from.y - to.y)).toBeLessThan(STRING_MOST + sizes.full.w);
    for (const other of all) {
      if (other === place) continue;
      expect(overlaps(place.box, other.box), `${where} on ${other.address}`).toBe(false);
      expect(stringCrosses(place.string, other.box), `string of ${where} over ${other.address}`).toBe(false);
    }
  }
}

describe.each([
  ['demo', demoCircuit],
  ['crowded', crowdedCircuit],
] as const)('tags of the %s circuit', (_, document) => {
  const sheet = sheetOf(document);
  for (const form of ['compact', 'chip'] as const) {
    const requests = requestsOf(document, form);
    const places = placeTags(requests, sheet);
    it(`finds free slots for ${form} tags`, () => {
      expect(requests.length).toBeGreaterThan(3);
      expect(places.size).toBe(requests.length);
      for (const place of places.values()) expect(place.free).toBe(true);
      expectClear(places, sheet, requests);
    });
  }
  it('never lets a full tag cover anything: what finds no slot becomes smaller', () => {
    const requests = requestsOf(document, 'full');
    const places = placeTags(requests, sheet);
    expectClear(places, sheet, requests);
    expect([...places.values()].some((place) => place.form === 'full')).toBe(true);
  });
  it('keeps every tag where it stood when placed again', () => {
    const requests = requestsOf(document, 'compact');
    const first = placeTags(requests, sheet);
    const again = placeTags(
      requests.map((request) => ({ ...request, before: first.get(request.address) })),
      sheet,
    );
    for (const [address, place] of first) expect(again.get(address)?.box).toEqual(place.box);
  });
  it('moves only the tag whose slot is taken', () => {
    const requests = requestsOf(document, 'compact');
    const first = placeTags(requests, sheet);
    const taken = first.get(requests[0]!.address)!;
    const word = { x: taken.box.x + 1, y: taken.box.y + 1, w: 2, h: 1 };
    const again = placeTags(
      requests.map((request) => ({ ...request, before: first.get(request.address) })),
      { ...sheet, words: [...sheet.words, word] },
    );
    expect(again.get(taken.address)?.box).not.toEqual(taken.box);
    for (const [address, place] of first) if (address !== taken.address) expect(again.get(address)?.box).toEqual(place.box);
  });
});

describe('one tag', () => {
  const body = { x: 0, y: 0, w: 8, h: 8 };
  const request: TagRequest = { address: 'a.b', anchor: { x: 8, y: 2 }, bodies: [body], form: 'full', sizes };
  const open: Sheet = { symbols: [body], words: [], legs: [] };
  const only = (changes: Partial<TagRequest>, sheet: Sheet = open) => placeTags([{ ...request, ...changes }], sheet).get('a.b')!;

  it('stands two modules clear of the outline, on the side of its screw', () => {
    const place = only({});
    expect(place.box.x).toBeCloseTo(10, 9);
    expect(place.form).toBe('full');
    expect(place.eyelet).toBe('left');
  });
  it('avoids the side on which a line leaves', () => {
    const leg = { a: { x: 8, y: 2 }, b: { x: 40, y: 2 } };
    const place = only({}, { ...open, legs: [leg] });
    expect(legMeets(leg.a, leg.b, place.box)).toBe(false);
    expect(segmentsCross(place.string.from, place.string.to, leg.a, leg.b)).toBe(false);
  });
  it('becomes compact, then a chip, as room gets scarce', () => {
    const walls = (room: number): Box[] => [
      { x: -60, y: -60, w: 120, h: 60 - room },
      { x: -60, y: 8 + room, w: 120, h: 60 },
      { x: -60, y: -60, w: 60 - room, h: 120 },
      { x: 8 + room, y: -60, w: 60, h: 120 },
    ];
    expect(only({}, { ...open, symbols: [body, ...walls(9.5)] }).form).toBe('full');
    expect(only({}, { ...open, symbols: [body, ...walls(6.9)] }).form).toBe('compact');
    expect(only({}, { ...open, symbols: [body, ...walls(4.9)] }).form).toBe('chip');
    expect(only({}, { ...open, symbols: [body, ...walls(1)] }).free).toBe(false);
  });
  it('stays where it was dragged, whatever lies there', () => {
    const place = only({ dragged: { dx: -4, dy: 2 } });
    expect(place).toMatchObject({ dragged: true, form: 'full' });
    expect(place.box.x + place.box.w / 2).toBeCloseTo(4, 9);
    expect(place.box.y + place.box.h / 2).toBeCloseTo(4, 9);
  });
  it('stays inside the frame', () => {
    const frame = { x: -30, y: -20, w: 40, h: 40 };
    const { box } = only({}, { ...open, frame });
    expect(box.x).toBeGreaterThanOrEqual(frame.x);
    expect(box.x + box.w).toBeLessThanOrEqual(frame.x + frame.w);
  });
  it('in hand keeps its full form even where it must cover lines', () => {
    const legs = Array.from({ length: 60 }, (_, k) => ({ a: { x: -40, y: -40 + k * 1.5 }, b: { x: 60, y: -40 + k * 1.5 } }));
    expect(only({ insist: true }, { ...open, legs }).form).toBe('full');
    expect(only({}, { ...open, legs }).form).toBe('chip');
  });
});

describe('geometry', () => {
  const box = { x: 0, y: 0, w: 4, h: 2 };
  it('tells passing through from touching', () => {
    expect(segmentThrough({ x: -1, y: 1 }, { x: 5, y: 1 }, box)).toBe(true);
    expect(segmentThrough({ x: -1, y: 2 }, { x: 5, y: 2 }, box)).toBe(false);
    expect(segmentThrough({ x: -1, y: 3 }, { x: 5, y: 5 }, box)).toBe(false);
    expect(segmentsCross({ x: 0, y: 0 }, { x: 2, y: 2 }, { x: 0, y: 2 }, { x: 2, y: 0 })).toBe(true);
    expect(segmentsCross({ x: 0, y: 0 }, { x: 2, y: 2 }, { x: 2, y: 2 }, { x: 4, y: 0 })).toBe(false);
  });
});
