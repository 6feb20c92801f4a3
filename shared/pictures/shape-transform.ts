/** How a group's shapes land in its parent: mirror (x → −x), then turn clockwise about the origin by 90° × turn, then shift. */

export interface GroupPlace {
  readonly dx: number;
  readonly dy: number;
  readonly turn?: number;
  readonly mirror?: boolean;
}

/** The place as the six numbers of an SVG matrix(a b c d e f). */
export function groupMatrix(place: GroupPlace): readonly [number, number, number, number, number, number] {
  const m = place.mirror ? -1 : 1;
  const turn = (((place.turn ?? 0) % 4) + 4) % 4;
  if (turn === 1) return [0, m, -1, 0, place.dx, place.dy];
  if (turn === 2) return [-m, 0, 0, -1, place.dx, place.dy];
  if (turn === 3) return [0, -m, 1, 0, place.dx, place.dy];
  return [m, 0, 0, 1, place.dx, place.dy];
}

/** Turn and mirror of a group inside a turned and mirrored one, for keeping words upright. */
export function combine(outer: { readonly turn: number; readonly mirror: boolean }, inner: GroupPlace): { turn: number; mirror: boolean } {
  const innerTurn = inner.turn ?? 0;
  const turn = (((outer.turn + (outer.mirror ? -innerTurn : innerTurn)) % 4) + 4) % 4;
  return { turn, mirror: outer.mirror !== (inner.mirror ?? false) };
}

/** SVG matrix that undoes turn and mirror about a point, so that words in a turned symbol read upright. null = nothing to undo. */
export function uprightMatrix(turn: number, mirror: boolean, x: number, y: number): string | null {
  if (turn === 0 && !mirror) return null;
  const [a, b, c, d] = groupMatrix({ dx: 0, dy: 0, turn, mirror });
  // The linear part is orthogonal: its inverse is its transpose.
  const e = x - (a * x + b * y);
  const f = y - (c * x + d * y);
  return `matrix(${a} ${c} ${b} ${d} ${short(e)} ${short(f)})`;
}

/** At most three decimals, no trailing zeros, no minus zero. */
export function short(value: number): string {
  const rounded = Math.round(value * 1000) / 1000;
  return String(rounded === 0 ? 0 : rounded);
}
