import type { CircuitDocument, Note, PartLabel } from '../circuit/schema.ts';
import type { Box } from '../symbols/place.ts';
import type { Shape } from './shape.ts';

/** Notes as paper slips and part labels as small metal plates: their size and their shapes in modules. */

const NOTE_SIZE = 1.3;
const FOOT_SIZE = 1.2;
const LEADING = 1.36;
const FOLD = 1.4;
const PADDING = 1;
/** Letters in a line of a note, of the width a slip has on the Draw stage. */
const NOTE_LETTERS = 36;
const LABEL_LETTERS = 24;
/** Modules a letter takes on average, per module of its size. */
const LETTER = 0.51;

export interface Slip {
  readonly id: string;
  readonly kind: 'note' | 'label';
  readonly box: Box;
  readonly lines: readonly string[];
  /** Who wrote it and when; '' for a label. */
  readonly foot: string;
}

/** Words broken into lines; a word longer than a line is cut. */
export function wrapWords(text: string, letters: number): string[] {
  const lines: string[] = [];
  for (const part of text.split('\n')) {
    let line = '';
    for (const word of part.split(/\s+/).filter(Boolean)) {
      let rest = word;
      if (line !== '' && line.length + 1 + rest.length > letters) {
        lines.push(line);
        line = '';
      }
      while (rest.length > letters) {
        lines.push(rest.slice(0, letters));
        rest = rest.slice(letters);
      }
      line = line === '' ? rest : `${line} ${rest}`;
    }
    lines.push(line);
  }
  return lines;
}

const months = ['Jan', 'Feb', 'Mar', 'Apr', 'May', 'Jun', 'Jul', 'Aug', 'Sep', 'Oct', 'Nov', 'Dec'];

/** "2026-11-28" → "28 Nov 2026"; anything else stays as it was written. */
export function dateInWords(date: string): string {
  const [, year, month, day] = /^(\d{4})-(\d{2})-(\d{2})/.exec(date) ?? [];
  const name = months[Number(month) - 1];
  return year && name ? `${Number(day)} ${name} ${year}` : date;
}

function widest(lines: readonly string[], size: number): number {
  return Math.max(...lines.map((line) => line.length)) * size * LETTER;
}

function noteSlip(note: Note): Slip {
  const lines = wrapWords(note.text, NOTE_LETTERS);
  const foot = ['note', note.author, dateInWords(note.date)].filter(Boolean).join(', ');
  const w = Math.max(12, widest(lines, NOTE_SIZE), widest([foot], FOOT_SIZE)) + 2 * PADDING;
  const h = (lines.length * NOTE_SIZE + FOOT_SIZE) * LEADING + 1.4 * PADDING;
  return { id: note.id, kind: 'note', box: { x: note.at.x, y: note.at.y, w, h }, lines, foot };
}

function labelSlip(label: PartLabel): Slip {
  const lines = wrapWords(label.text, LABEL_LETTERS);
  const w = Math.max(6, widest(lines, FOOT_SIZE) + 2.4);
  return {
    id: label.id,
    kind: 'label',
    box: { x: label.at.x, y: label.at.y, w, h: lines.length * FOOT_SIZE * LEADING + 0.7 },
    lines,
    foot: '',
  };
}

/** All slips of a document where they were put on the Draw stage; empty ones are left out. */
export function slipsOf({ notes, labels }: Pick<CircuitDocument, 'notes' | 'labels'>): readonly Slip[] {
  return [
    ...notes.filter((note) => note.text.trim() !== '').map(noteSlip),
    ...labels.filter((label) => label.text.trim() !== '').map(labelSlip),
  ];
}

export function slipShapes({ kind, box, lines, foot }: Slip): readonly Shape[] {
  const { x, y, w, h } = box;
  if (kind === 'label') {
    return [
      { type: 'rect', x, y, w, h, fill: 'metal', stroke: 'ink2', width: 0.15, role: 'label' },
      ...lines.map(
        (text, k): Shape => ({
          type: 'text',
          x: x + w / 2,
          y: y + 0.35 + (k + 0.76) * FOOT_SIZE * LEADING,
          text,
          size: FOOT_SIZE,
          anchor: 'middle',
          weight: 620,
          fill: 'ink',
        }),
      ),
    ];
  }
  const right = x + w;
  const bottom = y + h;
  const last = y + 0.7 * PADDING + lines.length * NOTE_SIZE * LEADING;
  return [
    {
      type: 'polyline',
      points: [x, y, right, y, right, bottom - FOLD, right - FOLD, bottom, x, bottom],
      closed: true,
      fill: 'paper',
      stroke: 'edge',
      width: 0.1,
      role: 'note',
    },
    { type: 'polyline', points: [right, bottom - FOLD, right - FOLD, bottom - FOLD, right - FOLD, bottom], stroke: 'edge', width: 0.1 },
    ...lines.map(
      (text, k): Shape => ({
        type: 'text',
        x: x + PADDING,
        y: y + 0.7 * PADDING + (k + 0.76) * NOTE_SIZE * LEADING,
        text,
        size: NOTE_SIZE,
        weight: 520,
        fill: 'ink',
      }),
    ),
    { type: 'text', x: x + PADDING, y: last + 0.76 * FOOT_SIZE * LEADING, text: foot, size: FOOT_SIZE, fill: 'ink2' },
  ];
}
