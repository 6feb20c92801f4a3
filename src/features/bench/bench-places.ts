import type { TagPlace } from '#shared/pictures/tag-slots.ts';

/** Where the tags stand now, for pinning: kept by the drawing each time it seats them. */
let places: ReadonlyMap<string, TagPlace> = new Map();

export function keepPlaces(next: ReadonlyMap<string, TagPlace>): void {
  places = next;
}

/** From the anchor to the middle of the tag [modules]; null for a tag that is not on the sheet. */
export function tagPlaceNow(address: string): { readonly dx: number; readonly dy: number } | null {
  const place = places.get(address);
  if (!place) return null;
  const { box, string } = place;
  return { dx: box.x + box.w / 2 - string.to.x, dy: box.y + box.h / 2 - string.to.y };
}
