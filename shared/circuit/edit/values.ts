import { valueProblem } from '../allowed-values.ts';
import { documentParameter, documentValue, effectiveValue, findChange, firstCase } from '../effective.ts';
import { quantityInWords } from '../in-words.ts';
import { findComponent, findKind, findParameter, findScrew, kindOfComponent } from '../kind-lookup.ts';
import type { CaseChange, CircuitDocument, Component, ParameterValue, ValueSource } from '../schema.ts';
import { screwOutside } from '../screw-ranges.ts';
import { addCase } from './cases.ts';
import { replaceComponent } from './components.ts';

/** Values: what is typed, turned or taken from a plate, seen through the case on the drawing.
 *  Case A is the document itself; other cases keep what differs. */
export interface ValueEdit {
  readonly document: CircuitDocument;
  /** The case the value went into: another one than asked when A's as-found values are frozen. */
  readonly caseId: string;
  /** Why nothing was changed, with the nearest value that would have been taken. */
  readonly refused?: { readonly target: string; readonly field: string; readonly message: string; readonly nearest?: number };
}

/** True once "take as found" has marked the screws: from then on a what-if goes into a case of its own. */
export function asFoundTaken(document: CircuitDocument): boolean {
  return document.components.some((component) => Object.values(component.screws ?? {}).some((screw) => screw.asFound !== undefined));
}

/** What a person would turn to try something, against plate data that is simply right or wrong: screws, settings, faults and
 *  the supply. */
function isWhatIf(document: CircuitDocument, target: string, field: string): boolean {
  if (target === 'supply') return true;
  const kind = kindOfComponent(document, target);
  if (!kind) return false;
  return field.startsWith('fault.') || findScrew(kind, field) !== undefined || findParameter(kind, field)?.group === 'setting';
}

/** Sets one value in the case on the drawing. Outside the allowed range nothing changes and `refused` says why.
 *  In case A the document takes it, unless as-found is frozen and it is a what-if: then the next case is made from A. */
export function setValue(
  document: CircuitDocument,
  caseId: string,
  target: string,
  field: string,
  value: number | string,
  typed?: string,
  source: ValueSource = 'typed',
): ValueEdit {
  const problem = valueProblem(document, caseId, target, field, value);
  if (problem) return { document, caseId, refused: { target, field, ...problem } };
  if (effectiveValue(document, caseId, target, field) === value && typed === undefined) return { document, caseId };
  if (caseId !== firstCase(document).id) {
    const next = setChange(document, caseId, change(target, field, value, typed));
    return held(document, next, caseId, target, field);
  }
  if (!asFoundTaken(document) || !isWhatIf(document, target, field)) {
    return held(document, setDocumentValue(document, target, field, value, typed, source), caseId, target, field);
  }
  if (effectiveValue(document, caseId, target, field) === value) return { document, caseId };
  const made = addCase(document, caseId, whatIfName(document, target, field, value));
  if (!made.caseId) {
    return { document, caseId, refused: { target, field, message: 'there are ten cases already: delete one first' } };
  }
  return { document: setChange(made.document, made.caseId, change(target, field, value, typed)), caseId: made.caseId };
}

/** Gives the edit back, or refuses it where it would leave a screw of any case outside its part's adjustable range. */
function held(before: CircuitDocument, after: CircuitDocument, caseId: string, target: string, field: string): ValueEdit {
  const message = screwOutside(after, target);
  return message ? { document: before, caseId, refused: { target, field, message } } : { document: after, caseId };
}

function change(target: string, field: string, value: number | string, typed: string | undefined): CaseChange {
  return { target, field, value, ...(typed === undefined ? {} : { typed: typed.slice(0, 40) }) };
}

/** Writes a change into a case; a change back to the document's own value is no change and goes. */
export function setChange(document: CircuitDocument, caseId: string, entry: CaseChange): CircuitDocument {
  const same = documentValue(document, entry.target, entry.field) === entry.value;
  return replaceChanges(document, caseId, (changes) => {
    const index = changes.findIndex((candidate) => candidate.target === entry.target && candidate.field === entry.field);
    if (same) return index < 0 ? changes : changes.filter((_, at) => at !== index);
    if (index < 0) return changes.length >= 400 ? changes : [...changes, entry];
    return changes.map((candidate, at) => (at === index ? entry : candidate));
  });
}

export function removeChange(document: CircuitDocument, caseId: string, target: string, field: string): CircuitDocument {
  if (!findChange(document, caseId, target, field)) return document;
  const next = replaceChanges(document, caseId, (changes) => changes.filter((entry) => entry.target !== target || entry.field !== field));
  return screwOutside(next, target) ? document : next;
}

function replaceChanges(document: CircuitDocument, caseId: string, edit: (changes: CaseChange[]) => CaseChange[]): CircuitDocument {
  const cases = document.cases.map((entry, index) => {
    if (index === 0 || entry.id !== caseId) return entry;
    const changes = edit(entry.changes);
    return changes === entry.changes ? entry : { ...entry, changes };
  });
  return cases.every((entry, index) => entry === document.cases[index]) ? document : { ...document, cases };
}

/** Writes a value into the document itself. Cases that said the same keep saying it: they are absolute. */
function setDocumentValue(
  document: CircuitDocument,
  target: string,
  field: string,
  value: number | string,
  typed: string | undefined,
  source: ValueSource,
): CircuitDocument {
  if (target === 'supply' || target === 'fluid' || target === 'reservoir' || target === 'site') {
    return { ...document, [target]: { ...document[target], [field]: value } };
  }
  if (target === 'duty') {
    const [, id, part] = field.split('.');
    if (field === 'duration') return { ...document, duty: { ...document.duty, duration: value as number } };
    const commands = document.duty.commands.map((entry) => (entry.id === id ? { ...entry, [part as string]: value } : entry));
    return { ...document, duty: { ...document.duty, commands } };
  }
  if (findComponent(document, target)) {
    const entry: ParameterValue = { value, source, ...(typed === undefined ? {} : { typed: typed.slice(0, 40) }) };
    return replaceComponent(document, target, (component) => ({ ...component, parameters: { ...component.parameters, [field]: entry } }));
  }
  const lines = document.lines.map((line) =>
    line.id === target ? { ...line, [field]: field === 'loss' ? value === 1 : (value as number) } : line,
  );
  return { ...document, lines };
}

/** Takes a given value off the plate: the typical one counts again. Cases keep their own. Nothing changes where a screw would
 *  then lie outside its part's adjustable range. */
export function clearValue(document: CircuitDocument, componentId: string, field: string): CircuitDocument {
  const next = replaceComponent(document, componentId, (component) => {
    if (!component.parameters[field]) return component;
    const { [field]: _gone, ...parameters } = component.parameters;
    return { ...component, parameters };
  });
  return next !== document && screwOutside(next, componentId) ? document : next;
}

/** 'Vol. stop turned in', 'Compensator lowered', 'Supply voltage lowered': the name of a case made by one turn. */
function whatIfName(document: CircuitDocument, target: string, field: string, value: number | string): string {
  const before = documentValue(document, target, field);
  const higher = typeof value === 'number' && typeof before === 'number' && value > before;
  if (target === 'supply') return `Supply ${field} ${higher ? 'raised' : 'lowered'}`;
  const component = findComponent(document, target);
  const kind = component && findKind(component.kind);
  const screw = kind && findScrew(kind, field);
  if (screw?.inward === 'lowers') return `${screw.short} turned ${higher ? 'out' : 'in'}`;
  if (screw) return `${screw.short} ${higher ? 'raised' : 'lowered'}`;
  if (field.startsWith('fault.')) return kind?.faults.find((fault) => `fault.${fault.id}` === field)?.label ?? field;
  const spec = kind && findParameter(kind, field);
  if (spec?.type === 'number' && typeof value === 'number') return `${spec.label} ${quantityInWords(value, spec.quantity)}`.slice(0, 60);
  return `${spec?.label ?? field} changed`.slice(0, 60);
}

/** Freezes the document's present values as the as-found marks of every screw. Lock nuts stay as they are. */
export function takeAsFound(document: CircuitDocument): CircuitDocument {
  let next = document;
  for (const component of document.components) {
    const kind = findKind(component.kind);
    if (!kind || kind.screws.length === 0) continue;
    next = replaceComponent(next, component.id, (entry) => {
      const screws: NonNullable<Component['screws']> = { ...entry.screws };
      for (const screw of kind.screws) {
        const value = documentParameter(entry, kind, screw.id);
        if (typeof value === 'number') screws[screw.id] = { locked: screws[screw.id]?.locked ?? false, asFound: value };
      }
      return { ...entry, screws };
    });
  }
  return next;
}

/** The mark a screw is compared with: as found once taken, else the document's own value. */
export function asFoundValue(document: CircuitDocument, componentId: string, screwId: string): number | null {
  const component = findComponent(document, componentId);
  const value = component?.screws?.[screwId]?.asFound ?? (component && documentParameter(component, findKind(component.kind), screwId));
  return typeof value === 'number' ? value : null;
}

/** Turns a screw back to its as-found mark in the case on the drawing. */
export function resetToAsFound(document: CircuitDocument, caseId: string, componentId: string, screwId: string): ValueEdit {
  const value = asFoundValue(document, componentId, screwId);
  return value === null ? { document, caseId } : setValue(document, caseId, componentId, screwId, value);
}

/** Corrects what was noted as found: the document's value and its mark together, without making a case. */
export function correctAsFound(document: CircuitDocument, componentId: string, screwId: string, value: number, typed?: string): ValueEdit {
  const caseId = firstCase(document).id;
  const problem = valueProblem(document, caseId, componentId, screwId, value);
  if (problem) return { document, caseId, refused: { target: componentId, field: screwId, ...problem } };
  const next = setDocumentValue(document, componentId, screwId, value, typed, 'typed');
  const outside = screwOutside(next, componentId);
  if (outside) return { document, caseId, refused: { target: componentId, field: screwId, message: outside } };
  const marked = replaceComponent(next, componentId, (component) => {
    const state = component.screws?.[screwId];
    return state?.asFound === undefined
      ? component
      : { ...component, screws: { ...component.screws, [screwId]: { ...state, asFound: value } } };
  });
  return { document: marked, caseId };
}

export function isLocked(document: CircuitDocument, componentId: string, screwId: string): boolean {
  return findComponent(document, componentId)?.screws?.[screwId]?.locked ?? false;
}

/** Tightens or loosens a lock nut. */
export function lockScrew(document: CircuitDocument, componentId: string, screwId: string, locked: boolean): CircuitDocument {
  const kind = kindOfComponent(document, componentId);
  if (!kind || !findScrew(kind, screwId) || isLocked(document, componentId, screwId) === locked) return document;
  return replaceComponent(document, componentId, (component) => ({
    ...component,
    screws: { ...component.screws, [screwId]: { ...component.screws?.[screwId], locked } },
  }));
}
