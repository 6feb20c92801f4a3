import type { VerdictId } from '../findings/finding.ts';
import type { RunEvent, RunResult } from '../simulation/result.ts';
import { type Box, freePlace, overlaps, textWidth } from './placement.ts';
import type { TapeStall } from './tape-references.ts';

/** What the run did, marked on the tape: one pin per event with words, in the ink of its case. */
export interface Pin {
  readonly caseId: string;
  readonly letter: string;
  readonly ink: number;
  readonly time: number;
  /** Words of the event, without the case: 'relief cracks'. */
  readonly words: string;
  /** Events of one kind share this. */
  readonly kind: string;
  /** Verdict whose shape the pin wears; null = a plain diamond. */
  readonly verdict: VerdictId | null;
}

/** Pins of one kind that lie closer than the gap, as one mark with a bar over their span. */
export interface PinGroup {
  readonly pins: readonly Pin[];
  /** Pixels. */
  readonly from: number;
  readonly to: number;
}

/** Pins of one kind closer than this merge [px]. */
export const PIN_GAP = 14;

export interface PinnedCase {
  readonly id: string;
  readonly letter: string;
  readonly ink: number;
  readonly run: RunResult;
  /** Moment of the stall by the assessment [s]; a fall below pull-out speed at any other time is a dip or a stop. */
  readonly stall?: Pick<TapeStall, 'motor' | 'time' | 'traceEnd' | 'resumes'> | null;
}

/** A stall is logged at the fall below pull-out speed; the assessment may date it a little later [s]. */
const STALL_NEAR = 0.05;

/** Signals that only repeat a command's flag, come with every start, or follow from another that is pinned. */
const quiet = new Set(['switched-on', 'up-to-speed', 'open', 'bypass', 'passing']);
/** What is true as the run begins did not happen in it [s]. */
const BEGINNING = 0.002;

/** Worth a place on the tape: what sets in, not what ends again. The table of events lists all. */
function isPinned(event: RunEvent): boolean {
  return event.label !== '' && event.rising && event.time > BEGINNING && !quiet.has(event.signal);
}

/** Which verdict's shape an event wears: by what it says happened. */
export function pinVerdict(event: Pick<RunEvent, 'signal' | 'label'>, isStall: boolean): VerdictId | null {
  if (isStall) return 'motor-stalls';
  const said = `${event.signal} ${event.label}`.toLowerCase();
  if (/\btrips?\b/.test(said)) return 'trips';
  if (/relief|crack/.test(said)) return 'relief-passing';
  return null;
}

export function pinsOf(cases: readonly PinnedCase[]): Pin[] {
  const pins: Pin[] = [];
  for (const entry of cases) {
    for (const event of entry.run.events) {
      const { stall } = entry;
      const isStall = !!stall && event.component === stall.motor && !event.rising && Math.abs(event.time - stall.time) < STALL_NEAR;
      if (!isStall && !isPinned(event)) continue;
      if (
        event.time > (entry.stall?.traceEnd ?? Number.POSITIVE_INFINITY) &&
        !(entry.stall?.resumes != null && event.time >= entry.stall.resumes)
      )
        continue;
      pins.push({
        caseId: entry.id,
        letter: entry.letter,
        ink: entry.ink,
        time: event.time,
        words: isStall ? 'stalls' : event.label,
        kind: `${event.component}.${event.signal}.${event.rising ? 'up' : 'down'}`,
        verdict: pinVerdict(event, isStall),
      });
    }
  }
  return pins.sort((a, b) => a.time - b.time);
}

/** Merges pins of one case and kind whose marks would be closer than the gap. Groups come in order of their first mark. */
export function mergePins(pins: readonly Pin[], x: (time: number) => number, gap: number = PIN_GAP): PinGroup[] {
  const open = new Map<string, { pins: Pin[]; from: number; to: number }>();
  const groups: { pins: Pin[]; from: number; to: number }[] = [];
  for (const pin of [...pins].sort((a, b) => a.time - b.time)) {
    const key = `${pin.caseId} ${pin.kind}`;
    const at = x(pin.time);
    const group = open.get(key);
    if (group && at - group.to < gap) {
      group.pins.push(pin);
      group.to = at;
    } else {
      const fresh = { pins: [pin], from: at, to: at };
      open.set(key, fresh);
      groups.push(fresh);
    }
  }
  return groups;
}

/** A finding's number on the tape. */
export interface Numeral {
  readonly number: number;
  readonly caseId: string;
  /** [s] */
  readonly time: number;
}

/** What stands at one place on the top edge: a group of pins, numerals of findings, or both. */
export interface TapeMark {
  readonly group: PinGroup | null;
  readonly numerals: readonly Numeral[];
  readonly x: number;
}

/** Numerals stand beside the pin of their case and moment, otherwise on their own. */
export function joinNumerals(groups: readonly PinGroup[], numerals: readonly Numeral[], x: (time: number) => number): TapeMark[] {
  const marks = groups.map((group) => ({ group, numerals: [] as Numeral[], x: (group.from + group.to) / 2 }));
  const alone: TapeMark[] = [];
  for (const numeral of numerals) {
    const at = x(numeral.time);
    const near = (mark: { group: PinGroup }) => (mark.group.pins[0] as Pin).caseId === numeral.caseId && reach(mark.group, at) < PIN_GAP;
    const candidates = marks.filter(near);
    const best = candidates.find((mark) => (mark.group.pins[0] as Pin).verdict !== null) ?? candidates[0];
    if (best) best.numerals.push(numeral);
    else alone.push({ group: null, numerals: [numeral], x: at });
  }
  return [...marks, ...alone].sort((a, b) => a.x - b.x);
}

function reach(group: PinGroup, x: number): number {
  return Math.max(0, group.from - x, x - group.to);
}

/** Words of a group: 'A stalls', '12× relief cracks, C'. */
export function groupWords(group: PinGroup): string {
  const pin = group.pins[0] as Pin;
  const n = group.pins.length;
  return n > 1 ? `${n}× ${pin.words}, ${pin.letter}` : `${pin.letter} ${pin.words}`;
}

export interface PlacedMark extends TapeMark {
  readonly row: number;
  /** Words that fit beside the mark, or '' where there is no room. */
  readonly words: string;
  readonly side: 'left' | 'right';
  /** False where no row had room: it lies over another. */
  readonly free: boolean;
}

export interface MarkBand {
  readonly from: number;
  readonly to: number;
  /** Rows in the order in which they are tried. */
  readonly rows: readonly number[];
  readonly rowHeight: number;
}

const MARK = 16;
const NUMERAL = 20;

/** Puts the marks into rows so that none covers another, then words where they fit, the gravest first.
 *  @param taken boxes that nothing may cover (flags); x in pixels, y = row × rowHeight
 *  @param poles boxes that words may not cover
 *  @param size of the words [px] */
export function placeMarks(
  marks: readonly TapeMark[],
  band: MarkBand,
  taken: readonly Box[],
  poles: readonly Box[],
  size: number,
): PlacedMark[] {
  const boxes: Box[] = [...taken];
  const h = band.rowHeight;
  const last = band.rows[0] ?? 0;
  const placed = marks.map((mark) => {
    const span = mark.group ? mark.group.to - mark.group.from + MARK : 0;
    const left = mark.x - (mark.group ? span / 2 : NUMERAL / 2);
    const w = span + mark.numerals.length * NUMERAL;
    const at = (row: number): Box => ({ x: left, y: row * h, w, h: h - 1 });
    const row = band.rows.find((candidate) => !boxes.some((other) => overlaps(at(candidate), other)));
    const box = at(row ?? last);
    boxes.push(box);
    return { mark, row: row ?? last, free: row !== undefined, box, words: '', side: 'right' as 'left' | 'right' };
  });
  boxes.push(...poles);
  const rank = (entry: (typeof placed)[number]) => (entry.mark.numerals.length > 0 ? 0 : entry.mark.group?.pins[0]?.verdict ? 1 : 2);
  const room = { x: band.from, y: Math.min(...band.rows) * h, w: band.to - band.from, h: band.rows.length * h };
  for (const entry of [...placed].sort((a, b) => rank(a) - rank(b))) {
    if (!entry.mark.group || !entry.free) continue;
    const words = groupWords(entry.mark.group);
    const w = textWidth(words, size, 600) + 6;
    const right = { x: entry.box.x + entry.box.w + 1, y: entry.box.y, w, h: h - 1 };
    const left = { x: entry.box.x - w - 1, y: entry.box.y, w, h: h - 1 };
    const box = freePlace([right, left], boxes, room);
    if (!box) continue;
    boxes.push(box);
    entry.words = words;
    entry.side = box === left ? 'left' : 'right';
  }
  return placed.map(({ mark, row, words, side, free }) => ({ ...mark, row, words, side, free }));
}
