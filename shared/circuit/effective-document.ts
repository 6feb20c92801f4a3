import { findCase } from './effective.ts';
import type { CaseChange, CircuitDocument, Command, Component, Line } from './schema.ts';

/** The document as one case sees it: the case's changes written over the document's values (CONTRACTS: document < case < duty
 *  command). Structure is the same; untouched parts are shared with the original. Case A, an unknown case, and changes whose target or field
 *  does not exist change nothing (checking a document names those). */
export function effectiveDocument(document: CircuitDocument, caseId: string): CircuitDocument {
  const changes = findCase(document, caseId)?.changes ?? [];
  if (changes.length === 0) return document;
  const of = (target: string): CaseChange[] => changes.filter((change) => change.target === target);
  return {
    ...document,
    fluid: withFields(document.fluid, of('fluid')),
    reservoir: withFields(document.reservoir, of('reservoir')),
    supply: withFields(document.supply, of('supply')),
    site: withFields(document.site, of('site')),
    components: document.components.map((component) => changedComponent(component, of(component.id))),
    lines: document.lines.map((line) => changedLine(line, of(line.id))),
    duty: changedDuty(document.duty, of('duty')),
  };
}

function withFields<T extends object>(section: T, changes: readonly CaseChange[]): T {
  if (changes.length === 0) return section;
  const result = { ...section } as unknown as Record<string, unknown>;
  for (const { field, value } of changes) if (field in section && typeof result[field] === typeof value) result[field] = value;
  return result as unknown as T;
}

function changedComponent(component: Component, changes: readonly CaseChange[]): Component {
  if (changes.length === 0) return component;
  const parameters = { ...component.parameters };
  for (const { field, value, typed } of changes) parameters[field] = { value, typed, source: 'typed' };
  return { ...component, parameters };
}

const lineNumbers = ['length', 'bore', 'wall', 'volume', 'laminar', 'quadratic'] as const;

function changedLine(line: Line, changes: readonly CaseChange[]): Line {
  const result = { ...line };
  for (const { field, value } of changes) {
    if (typeof value !== 'number') continue;
    if (field === 'loss') result.loss = value >= 0.5;
    const known = lineNumbers.find((name) => name === field);
    if (known) result[known] = value;
  }
  return result;
}

function changedDuty(duty: CircuitDocument['duty'], changes: readonly CaseChange[]): CircuitDocument['duty'] {
  let { duration } = duty;
  let commands: Command[] = duty.commands;
  for (const { field, value } of changes) {
    if (typeof value !== 'number') continue;
    if (field === 'duration') duration = value;
    const [word, id, part] = field.split('.');
    if (word !== 'command' || (part !== 'value' && part !== 'time' && part !== 'ramp')) continue;
    commands = commands.map((command) => (command.id === id ? { ...command, [part]: value } : command));
  }
  return { ...duty, duration, commands };
}
