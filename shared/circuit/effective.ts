import type { ComponentKind } from '../kinds/kind.ts';
import { findKind, findParameter } from './kind-lookup.ts';
import type { CaseChange, CircuitCase, CircuitDocument, Component } from './schema.ts';

/** Values as a case sees them: the document's, unless the case changes them. Duty commands come on top of these while a run
 *  goes and are not part of this. */

export function findCase(document: CircuitDocument, caseId: string): CircuitCase | undefined {
  return document.cases.find((entry) => entry.id === caseId);
}

/** Case A: its values are the document's own. */
export function firstCase(document: CircuitDocument): CircuitCase {
  return document.cases[0] as CircuitCase;
}

export function findChange(document: CircuitDocument, caseId: string, target: string, field: string): CaseChange | undefined {
  return findCase(document, caseId)?.changes.find((change) => change.target === target && change.field === field);
}

/** The document's own value of a component's parameter: given, else typical, else null; a fault that is not given is 0. */
export function documentParameter(component: Component, kind: ComponentKind | undefined, field: string): number | string | null {
  const given = component.parameters[field];
  if (given) return given.value;
  if (field.startsWith('fault.')) return 0;
  return (kind && findParameter(kind, field)?.initial) ?? null;
}

/** The document's own value of any field that a case may change; null = not given; undefined = there is no such field. */
export function documentValue(document: CircuitDocument, target: string, field: string): number | string | null | undefined {
  if (target === 'supply' || target === 'fluid' || target === 'reservoir' || target === 'site') {
    return (document[target] as Readonly<Record<string, number | string>>)[field];
  }
  if (target === 'duty') return dutyValue(document, field);
  const component = document.components.find((entry) => entry.id === target);
  if (component) return documentParameter(component, findKind(component.kind), field);
  const line = document.lines.find((entry) => entry.id === target);
  if (!line) return undefined;
  if (field === 'loss') return line.loss ? 1 : 0;
  return (line as unknown as Readonly<Record<string, number | undefined>>)[field] ?? null;
}

function dutyValue(document: CircuitDocument, field: string): number | undefined {
  if (field === 'duration') return document.duty.duration;
  const [word, id, part] = field.split('.');
  if (word !== 'command' || (part !== 'value' && part !== 'time' && part !== 'ramp')) return undefined;
  return document.duty.commands.find((command) => command.id === id)?.[part];
}

/** The value a case runs with, before duty commands. */
export function effectiveValue(document: CircuitDocument, caseId: string, target: string, field: string): number | string | null {
  const change = findChange(document, caseId, target, field);
  return change ? change.value : (documentValue(document, target, field) ?? null);
}

/** The same, as a number; null where it is not given or not a number. */
export function effectiveNumber(document: CircuitDocument, caseId: string, target: string, field: string): number | null {
  const value = effectiveValue(document, caseId, target, field);
  return typeof value === 'number' ? value : null;
}

/** Adjustable range of a screw in a case [SI], from the part's least and most; the parameter's own bounds where not given. */
export function screwRange(
  document: CircuitDocument,
  caseId: string,
  componentId: string,
  screwId: string,
): { min: number; max: number } | undefined {
  const component = document.components.find((entry) => entry.id === componentId);
  const kind = component && findKind(component.kind);
  const screw = kind?.screws.find((entry) => entry.id === screwId);
  const spec = kind && findParameter(kind, screwId);
  if (!screw || spec?.type !== 'number') return undefined;
  const least = effectiveNumber(document, caseId, componentId, screw.least) ?? spec.min;
  const most = effectiveNumber(document, caseId, componentId, screw.most) ?? spec.max;
  return { min: Math.max(spec.min, least), max: Math.min(spec.max, most) };
}
