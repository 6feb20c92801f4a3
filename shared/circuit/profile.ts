/** One input over the run: constant, or moved along straight ramps by commands. Times in seconds from the start of the run. */
export interface Profile {
  /** Pieces in order of time without gaps, the first from 0, the last to infinity. */
  readonly pieces: readonly Piece[];
}

export interface Piece {
  readonly from: number;
  /** Value at `from`, and change per second until the next piece. */
  readonly value: number;
  readonly slope: number;
}

export interface Move {
  readonly time: number;
  readonly ramp: number;
  readonly value: number;
}

/** A profile that starts at `rest` and follows the moves in order of time (as listed where times are equal). A move starts
 *  from the value reached when it comes, also in the middle of an earlier ramp; a ramp of 0 is a jump. */
export function profileOf(rest: number, moves: readonly Move[]): Profile {
  const ordered = moves.map((move, index) => ({ move, index })).sort((a, b) => a.move.time - b.move.time || a.index - b.index);
  let profile: Profile = { pieces: [{ from: 0, value: rest, slope: 0 }] };
  for (const { move } of ordered) profile = movedProfile(profile, move);
  return profile;
}

/** The profile with everything from `move.time` on replaced by the move. */
export function movedProfile(profile: Profile, move: Move): Profile {
  const start = profileValue(profile, move.time);
  const pieces = profile.pieces.filter((piece) => piece.from < move.time);
  if (move.ramp > 0) {
    pieces.push({ from: move.time, value: start, slope: (move.value - start) / move.ramp });
    pieces.push({ from: move.time + move.ramp, value: move.value, slope: 0 });
  } else pieces.push({ from: move.time, value: move.value, slope: 0 });
  return { pieces };
}

/** The piece that holds at a time (the later one at a corner). */
export function pieceAt(profile: Profile, time: number): Piece {
  let found = profile.pieces[0] as Piece;
  for (const piece of profile.pieces) if (piece.from <= time) found = piece;
  return found;
}

/** Value just after a time. */
export function profileValue(profile: Profile, time: number): number {
  const piece = pieceAt(profile, time);
  return piece.value + piece.slope * (time - piece.from);
}

/** Times at which any of the profiles has a corner, with 0 and `end`, ascending and without doubles, none beyond `end`. */
export function breakpoints(profiles: readonly Profile[], end: number): number[] {
  const times = new Set<number>([0, end]);
  for (const profile of profiles) for (const piece of profile.pieces) if (piece.from > 0 && piece.from < end) times.add(piece.from);
  return [...times].sort((a, b) => a - b);
}
