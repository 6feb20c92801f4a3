import { reservedTargets } from '../check-references.ts';
import { findKind } from '../kind-lookup.ts';
import type { CircuitDocument } from '../schema.ts';

/** Ids and item codes. Made from the document alone (no clock, no chance), so equal edits give equal documents. An id is
 *  never given twice in one document as it stands; item codes are the trade's letter and the next number. */

function idsOf(document: CircuitDocument): Set<string> {
  const ids = new Set(reservedTargets);
  for (const list of [document.components, document.lines, document.shafts, document.notes, document.labels]) {
    for (const entry of list) ids.add(entry.id);
  }
  return ids;
}

/** The first unused prefix1, prefix2, … among everything that lies on the sheet. */
export function freeId(document: CircuitDocument, prefix: string): string {
  return firstFree(idsOf(document), prefix);
}

export function firstFree(taken: ReadonlySet<string>, prefix: string): string {
  for (let number = 1; ; number++) {
    const id = `${prefix}${number}`;
    if (!taken.has(id)) return id;
  }
}

/** M1, P1, V1 …: the kind's letter and one more than the highest number in use; '' for kinds without item code. */
export function nextCode(document: CircuitDocument, kindId: string): string {
  const letter = findKind(kindId)?.letter ?? '';
  if (!/^[A-Z]$/.test(letter)) return '';
  let highest = 0;
  for (const component of document.components) {
    const match = /^([A-Z])([0-9]{1,6})$/.exec(component.name);
    if (match?.[1] === letter) highest = Math.max(highest, Number(match[2]));
  }
  return `${letter}${highest + 1}`;
}

/** Prefix of a component's id: its letter in lower case, 'j' for junctions. */
export function idPrefix(kindId: string): string {
  const letter = findKind(kindId)?.letter ?? '';
  return /^[A-Z]$/.test(letter) ? letter.toLowerCase() : 'j';
}
