import { type Box, stackFlags, textWidth } from './placement.ts';
import { joinNumerals, mergePins, type Numeral, type Pin, type PlacedMark, placeMarks } from './tape-pins.ts';

/** The top edge of the tape: command flags in at most two rows, marks of the runs between and below them. */

export interface FlagIn {
  readonly id: string;
  /** [s] */
  readonly time: number;
  readonly words: string;
  readonly short: string;
}

export interface PlacedFlag {
  readonly id: string;
  readonly time: number;
  readonly x: number;
  readonly width: number;
  /** 0 or 1; −1 = a tick that unfolds on focus. */
  readonly row: number;
  /** Words that fit: full or short. */
  readonly words: string;
  /** The cloth hangs to the left of its pole, where there is no room on the right. */
  readonly mirrored: boolean;
}

export interface TapeBand {
  readonly rowHeight: number;
  readonly rows: number;
  readonly height: number;
  readonly flags: readonly PlacedFlag[];
  readonly marks: readonly PlacedMark[];
}

/** So many plain pins may lie over others before a third row is worth its height. */
const CROWD = 2;

function isGrave(mark: PlacedMark): boolean {
  return mark.numerals.length > 0 || (mark.group?.pins.some((pin) => pin.verdict !== null) ?? false);
}

/** Swallow tail and padding of a flag beside its words [px]. */
const FLAG_EXTRA = 22;
const TICK = 8;

export function tapeBand(
  flags: readonly FlagIn[],
  pins: readonly Pin[],
  numerals: readonly Numeral[],
  view: {
    readonly x: (time: number) => number;
    readonly width: number;
    readonly size: number;
    readonly rowHeight: number;
    /** Words are cut down to their short form (tablet, phone). */
    readonly short: boolean;
    /** Marks without words (phone). */
    readonly bare: boolean;
    /** Rows at most: 2 or 3. */
    readonly mostRows: 2 | 3;
  },
): TapeBand {
  const sized = [...flags]
    .sort((a, b) => a.time - b.time)
    .map((flag) => {
      const words = view.short ? flag.short : flag.words;
      const width = textWidth(words, view.size, 650) + FLAG_EXTRA;
      const x = view.x(flag.time);
      const mirrored = x + width > view.width + FLAG_EXTRA && x > width;
      return { flag, words, x, width, mirrored };
    })
    .filter((entry) => entry.x >= -0.5 && entry.x <= view.width + 0.5);
  const rows = stackFlags(
    sized.map(({ x, width, mirrored }) => ({ x: mirrored ? x - width : x, width })),
    2,
    2,
  );
  const placed = sized.map(({ flag, words, x, width, mirrored }, i): PlacedFlag => {
    const row = rows[i] as number;
    return { id: flag.id, time: flag.time, x, width: row < 0 ? TICK : width, row, words, mirrored: row >= 0 && mirrored };
  });
  const h = view.rowHeight;
  const groups = mergePins(pins, view.x);
  const marks = joinNumerals(groups, numerals, view.x).filter((mark) => mark.x >= 0 && mark.x <= view.width);
  const attempt = (count: number): PlacedMark[] => {
    const taken = placed
      .filter((flag) => flag.row >= 0)
      .map((flag): Box => ({ x: flag.mirrored ? flag.x - flag.width : flag.x, y: flag.row * h, w: flag.width, h: h - 1 }));
    const poles = placed.map((flag): Box => ({ x: flag.x - 1, y: 0, w: 3, h: count * h }));
    const order = Array.from({ length: count - 1 }, (_, k) => k + 1);
    return placeMarks(marks, { from: 0, to: view.width, rows: [...order, 0], rowHeight: h }, taken, poles, view.bare ? 1e6 : view.size);
  };
  let count = 2;
  let found = attempt(count);
  const left = found.filter((mark) => !mark.free);
  if (view.mostRows > 2 && (left.length > CROWD || left.some(isGrave))) {
    count = 3;
    found = attempt(count);
  }
  return { rowHeight: h, rows: count, height: count * h, flags: placed, marks: found };
}
