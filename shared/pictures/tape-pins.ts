import type { VerdictId } from '../findings/finding.ts';
import type { RunEvent, RunResult } from '../simulation/result.ts';
import { type Box, freePlace, overlaps, textWidth } from './placement.ts';

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
}

/** Which verdict's shape an event wears: by what the event says happened, not by its component's name. */
export function pinVerdict(event: Pick<RunEvent, 'signal' | 'label' | 'rising'>): VerdictId | null {
  const said = `${event.signal} ${event.label}`.toLowerCase();
  if (/stall|pull-?out/.test(said)) return event.rising && /recover|above pull/.test(said) ? null : 'motor-stalls';
  if (/\btrip/.test(said)) return 'trips';
  if (/relief|crack/.test(said)) return 'relief-passing';
  return null;
}

export function pinsOf(cases: readonly PinnedCase[], until: (caseId: string) => number): Pin[] {
  const pins: Pin[] = [];
  for (const entry of cases) {
    for (const event of entry.run.events) {
      if (event.label === '' || event.time > until(entry.id)) continue;
      pins.push({
        caseId: entry.id,
        letter: entry.letter,
        ink: entry.ink,
        time: event.time,
        words: event.label,
        kind: `${event.component}.${event.signal}.${event.rising ? 'up' : 'down'}`,
        verdict: pinVerdict(event),
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

export interface PlacedPin {
  readonly group: PinGroup;
  /** Middle of the mark. */
  readonly x: number;
  readonly row: number;
  /** Words that fit beside the mark, or '' where there is no room. */
  readonly words: string;
  readonly side: 'left' | 'right';
}

/** Words of a group: 'A stalls', '12x relief C'. */
export function groupWords(group: PinGroup): string {
  const pin = group.pins[0] as Pin;
  const n = group.pins.length;
  return n > 1 ? `${n}× ${pin.words}, ${pin.letter}` : `${pin.letter} ${pin.words}`;
}

/** Puts the marks into rows so that none covers another, then words where they fit, the gravest first.
 *  @param taken boxes that words must not cover (finding numerals, flags); x in pixels, y in rows times `rowHeight` */
export function placePins(
  groups: readonly PinGroup[],
  frame: {
    readonly from: number;
    readonly to: number;
    readonly rows: number;
    readonly rowHeight: number;
  },
  taken: readonly Box[],
  size: number,
): PlacedPin[] {
  const MARK = 16;
  const boxes: Box[] = [...taken];
  const h = frame.rowHeight;
  const placed = groups.map((group) => {
    const x = (group.from + group.to) / 2;
    const w = Math.max(MARK, group.to - group.from + MARK);
    let row = 0;
    let box: Box = { x: x - w / 2, y: 0, w, h };
    for (; row < frame.rows; row += 1) {
      box = { x: x - w / 2, y: row * h, w, h };
      if (!boxes.some((other) => overlaps(box, other))) break;
    }
    if (row === frame.rows) {
      row = 0;
      box = { x: x - w / 2, y: 0, w, h };
    }
    boxes.push(box);
    return { group, x, row, words: '', side: 'right' as 'left' | 'right', box };
  });
  const grave = (entry: { group: PinGroup }) => ((entry.group.pins[0] as Pin).verdict ? 0 : 1);
  for (const entry of [...placed].sort((a, b) => grave(a) - grave(b))) {
    const words = groupWords(entry.group);
    const w = textWidth(words, size, 600) + 6;
    const right = { x: entry.box.x + entry.box.w + 1, y: entry.box.y, w, h };
    const left = { x: entry.box.x - w - 1, y: entry.box.y, w, h };
    const room = {
      x: frame.from,
      y: 0,
      w: frame.to - frame.from,
      h: frame.rows * h,
    };
    const box = freePlace([right, left], boxes, room);
    if (!box) continue;
    boxes.push(box);
    entry.words = words;
    entry.side = box === left ? 'left' : 'right';
  }
  return placed.map(({ group, x, row, words, side }) => ({
    group,
    x,
    row,
    words,
    side,
  }));
}
