import { type CircuitDocument, type Component, type Line, MAX_COMPONENTS, type Note, type Shaft } from '../schema.ts';
import { type Point, snapPoint } from './components.ts';
import { freeId, idPrefix, nextCode } from './ids.ts';

/** Parts lifted off a sheet, with the lines and shafts between them. Case changes and commands stay behind: a copy starts with
 *  the document's values and at rest. */
export interface Clip {
  readonly components: readonly Component[];
  readonly lines: readonly Line[];
  readonly shafts: readonly Shaft[];
  readonly notes: readonly Note[];
}

export function copyParts(document: CircuitDocument, ids: readonly string[]): Clip {
  const chosen = new Set(ids);
  const shafts = document.shafts.flatMap((shaft) => {
    const members = shaft.members.filter((member) => chosen.has(member.component));
    return members.length < 2 ? [] : [{ ...shaft, members }];
  });
  return {
    components: document.components.filter((component) => chosen.has(component.id)),
    lines: document.lines.filter((line) => chosen.has(line.from.component) && chosen.has(line.to.component)),
    shafts,
    notes: document.notes.filter((note) => chosen.has(note.id)),
  };
}

/** Puts a copy down, shifted by `by` [modules], under new ids and item codes. Nothing changes when the sheet has no room. */
export function pasteParts(document: CircuitDocument, clip: Clip, by: Point): { document: CircuitDocument; ids: string[] } {
  const full = document.components.length + clip.components.length > MAX_COMPONENTS || document.lines.length + clip.lines.length > 400;
  if (full || clip.components.length + clip.notes.length === 0) return { document, ids: [] };
  if (document.shafts.length + clip.shafts.length > 50 || document.notes.length + clip.notes.length > 100) return { document, ids: [] };
  const shift = (point: Point) => snapPoint({ x: point.x + by.x, y: point.y + by.y });
  let next = document;
  const renamed = new Map<string, string>();
  for (const component of clip.components) {
    const id = freeId(next, idPrefix(component.kind));
    renamed.set(component.id, id);
    const { screws: marks, ...rest } = component;
    const screws = marks && Object.fromEntries(Object.entries(marks).map(([screw, state]) => [screw, { locked: state.locked }]));
    const copy: Component = {
      ...rest,
      ...(screws ? { screws } : {}),
      id,
      name: nextCode(next, component.kind) || component.name,
      at: shift(component.at),
    };
    next = { ...next, components: [...next.components, copy] };
  }
  const end = (ref: { component: string; port: string }) => ({ component: renamed.get(ref.component) as string, port: ref.port });
  for (const line of clip.lines) {
    const copy: Line = { ...line, id: freeId(next, 'l'), from: end(line.from), to: end(line.to), route: line.route.map(shift) };
    next = { ...next, lines: [...next.lines, copy] };
  }
  for (const shaft of clip.shafts) {
    next = { ...next, shafts: [...next.shafts, { id: freeId(next, 'shaft'), members: shaft.members.map(end) }] };
  }
  const ids = [...renamed.values()];
  for (const note of clip.notes) {
    const id = freeId(next, 'note');
    ids.push(id);
    next = { ...next, notes: [...next.notes, { ...note, id, at: shift(note.at) }] };
  }
  return { document: next, ids };
}

/** Copies and puts down in one go, two modules to the right and below. */
export function duplicateParts(document: CircuitDocument, ids: readonly string[], by: Point = { x: 2, y: 2 }) {
  return pasteParts(document, copyParts(document, ids), by);
}
