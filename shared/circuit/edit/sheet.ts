import { valueProblem } from '../allowed-values.ts';
import type { CircuitDocument, Line, Note } from '../schema.ts';
import { type Point, snapPoint } from './components.ts';
import { freeId } from './ids.ts';

/** Everything on the sheet that is not a part: title, notes, part labels, places of tags, data and bends of lines. */

/** An empty title leaves the old one. */
export function setTitle(document: CircuitDocument, title: string): CircuitDocument {
  const text = title.trim().slice(0, 120);
  return text === '' || text === document.title ? document : { ...document, title: text };
}

/** A paper slip. `date` is given by the caller as it shall be printed (ISO 8601, UTC). */
export function addNote(
  document: CircuitDocument,
  note: { readonly at: Point; readonly text: string; readonly date: string; readonly author?: string },
): { document: CircuitDocument; noteId: string | null } {
  if (document.notes.length >= 100) return { document, noteId: null };
  const author = note.author?.trim().slice(0, 60);
  const added: Note = {
    id: freeId(document, 'note'),
    at: snapPoint(note.at),
    text: note.text.slice(0, 400),
    date: note.date.slice(0, 40),
    ...(author ? { author } : {}),
  };
  return { document: { ...document, notes: [...document.notes, added] }, noteId: added.id };
}

export function changeNote(document: CircuitDocument, id: string, text: string): CircuitDocument {
  const kept = text.slice(0, 400);
  if (!document.notes.some((note) => note.id === id && note.text !== kept)) return document;
  return { ...document, notes: document.notes.map((note) => (note.id === id ? { ...note, text: kept } : note)) };
}

/** A small plate with the shelf name of a part. */
export function addLabel(
  document: CircuitDocument,
  componentId: string,
  at: Point,
  text: string,
): { document: CircuitDocument; labelId: string | null } {
  const known = document.components.some((component) => component.id === componentId);
  if (!known || document.labels.length >= 100) return { document, labelId: null };
  const id = freeId(document, 'label');
  const label = { id, component: componentId, at: snapPoint(at), text: text.trim().slice(0, 60) };
  return { document: { ...document, labels: [...document.labels, label] }, labelId: id };
}

export function changeLabel(document: CircuitDocument, id: string, text: string): CircuitDocument {
  const kept = text.trim().slice(0, 60);
  if (!document.labels.some((label) => label.id === id && label.text !== kept)) return document;
  return { ...document, labels: document.labels.map((label) => (label.id === id ? { ...label, text: kept } : label)) };
}

/** Where a tag was dragged to: from its screw's anchor to the middle of the tag [modules]; null gives it back to the drawing. */
export function setTagPlace(
  document: CircuitDocument,
  address: string,
  place: { readonly dx: number; readonly dy: number; readonly pinned: boolean } | null,
): CircuitDocument {
  if (address.length > 120) return document;
  if (place) return { ...document, tagPlaces: { ...document.tagPlaces, [address]: place } };
  if (!(address in document.tagPlaces)) return document;
  const { [address]: _gone, ...tagPlaces } = document.tagPlaces;
  return { ...document, tagPlaces };
}

type LineData = Partial<Pick<Line, 'length' | 'bore' | 'loss'>> & {
  /** null takes the value away. */
  readonly wall?: number | null;
  readonly volume?: number | null;
  readonly laminar?: number | null;
  readonly quadratic?: number | null;
};

/** Data of a line. A value that is not allowed changes nothing and is named in `problem`. */
export function setLineData(
  document: CircuitDocument,
  lineId: string,
  patch: LineData,
): { document: CircuitDocument; problem: string | null } {
  const line = document.lines.find((entry) => entry.id === lineId);
  if (!line) return { document, problem: 'there is no such line' };
  const next: Record<string, unknown> = { ...line };
  for (const [field, value] of Object.entries(patch)) {
    if (value === undefined) continue;
    if (value === null) delete next[field];
    else if (typeof value === 'boolean') next[field] = value;
    else {
      const problem = valueProblem(document, '', lineId, field, value);
      if (problem) return { document, problem: `${field} ${problem.message}` };
      next[field] = value;
    }
  }
  return { document: { ...document, lines: document.lines.map((entry) => (entry.id === lineId ? (next as Line) : entry)) }, problem: null };
}

/** Bends of a line; an empty list lets the drawing find the way. */
export function setRoute(document: CircuitDocument, lineId: string, route: readonly Point[]): CircuitDocument {
  const line = document.lines.find((entry) => entry.id === lineId);
  if (!line || (line.route.length === 0 && route.length === 0)) return document;
  const bends = route.slice(0, 40).map(snapPoint);
  return { ...document, lines: document.lines.map((entry) => (entry.id === lineId ? { ...entry, route: bends } : entry)) };
}
