import { findCase } from '../effective.ts';
import type { CircuitCase, CircuitDocument } from '../schema.ts';

/** Cases: flat lists of changes against the document. The first, A, is the document itself and cannot be deleted. */

export const MAX_CASES = 10;

/** The case's letter: A for the first ink, B for the second … */
export function caseLetter(entry: Pick<CircuitCase, 'ink'>): string {
  return String.fromCharCode(65 + entry.ink);
}

/** A new case with the changes of another (of A: none). `caseId` is null when there are ten already. */
export function addCase(
  document: CircuitDocument,
  fromCaseId: string,
  name?: string,
): { document: CircuitDocument; caseId: string | null } {
  const from = findCase(document, fromCaseId) ?? document.cases[0];
  if (!from || document.cases.length >= MAX_CASES) return { document, caseId: null };
  const inks = new Set(document.cases.map((entry) => entry.ink));
  let ink = 0;
  while (inks.has(ink) && ink < 9) ink++;
  const ids = new Set(document.cases.map((entry) => entry.id));
  let id = caseLetter({ ink }).toLowerCase();
  for (let number = 2; ids.has(id); number++) id = `${caseLetter({ ink }).toLowerCase()}${number}`;
  const text = (name ?? (from === document.cases[0] ? `Case ${caseLetter({ ink })}` : `${from.name}, again`)).trim().slice(0, 60);
  const added: CircuitCase = { id, name: text, ink, changes: from === document.cases[0] ? [] : from.changes };
  return { document: { ...document, cases: [...document.cases, added] }, caseId: id };
}

export function duplicateCase(document: CircuitDocument, caseId: string) {
  return addCase(document, caseId);
}

function replaceCase(document: CircuitDocument, caseId: string, edit: (entry: CircuitCase) => CircuitCase): CircuitDocument {
  const cases = document.cases.map((entry) => (entry.id === caseId ? edit(entry) : entry));
  return cases.every((entry, index) => entry === document.cases[index]) ? document : { ...document, cases };
}

/** An empty name leaves the old one. */
export function renameCase(document: CircuitDocument, caseId: string, name: string): CircuitDocument {
  const text = name.trim().slice(0, 60);
  return replaceCase(document, caseId, (entry) => (text === '' || text === entry.name ? entry : { ...entry, name: text }));
}

/** Index of the case ink, 0 to 9; two cases never share one: the other takes the ink this one leaves. */
export function setCaseInk(document: CircuitDocument, caseId: string, ink: number): CircuitDocument {
  const chosen = findCase(document, caseId);
  if (!chosen || !Number.isInteger(ink) || ink < 0 || ink > 9 || chosen.ink === ink) return document;
  const cases = document.cases.map((entry) =>
    entry.id === caseId ? { ...entry, ink } : entry.ink === ink ? { ...entry, ink: chosen.ink } : entry,
  );
  return { ...document, cases };
}

/** Deletes a case; A stays. */
export function deleteCase(document: CircuitDocument, caseId: string): CircuitDocument {
  const index = document.cases.findIndex((entry) => entry.id === caseId);
  return index < 1 ? document : { ...document, cases: document.cases.filter((entry) => entry.id !== caseId) };
}
