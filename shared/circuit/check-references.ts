import type { Medium } from '../kinds/kind.ts';
import type { Issue } from './issue.ts';
import { findKind, findPort, portInWords, samePort } from './kind-lookup.ts';
import type { CircuitDocument, PortRef } from './schema.ts';

/** Names that stand for themselves where a component or line id may stand. */
export const reservedTargets: readonly string[] = ['supply', 'fluid', 'reservoir', 'site', 'duty', 'line'];
const freeQuantities: readonly string[] = ['stall margin', 'rms current'];

/** Ids, joins and everything that names something else in the document. Expects a document of known kinds. */
export function referenceIssues(document: CircuitDocument): Issue[] {
  return [
    ...idIssues(document),
    ...lineIssues(document),
    ...shaftIssues(document),
    ...caseIssues(document),
    ...requirementIssues(document),
    ...document.labels.flatMap((label, index) =>
      document.components.some((component) => component.id === label.component)
        ? []
        : [{ path: `labels[${index}].component`, message: 'there is no such component', value: label.component }],
    ),
  ];
}

function idIssues(document: CircuitDocument): Issue[] {
  const issues: Issue[] = [];
  const unique = (lists: readonly (readonly [name: string, entries: readonly { readonly id: string }[]])[]) => {
    const seen = new Map<string, string>();
    for (const [name, entries] of lists) {
      for (const [index, entry] of entries.entries()) {
        const path = `${name}[${index}].id`;
        const other = seen.get(entry.id);
        if (other) issues.push({ path, message: `is used twice, also by ${other}`, value: entry.id });
        else if (reservedTargets.includes(entry.id)) issues.push({ path, message: 'is a reserved name', value: entry.id });
        else seen.set(entry.id, path);
      }
    }
  };
  unique([
    ['components', document.components],
    ['lines', document.lines],
    ['shafts', document.shafts],
    ['notes', document.notes],
    ['labels', document.labels],
  ]);
  unique([['duty.commands', document.duty.commands]]);
  unique([['cases', document.cases]]);
  unique([['requirements', document.requirements]]);
  return issues;
}

function portIssue(document: CircuitDocument, ref: PortRef, medium: Medium, path: string): Issue | null {
  const component = document.components.find((entry) => entry.id === ref.component);
  if (!component) return { path: `${path}.component`, message: 'there is no such component', value: ref.component };
  const port = findPort(document, ref);
  if (!port) {
    const ports = findKind(component.kind)?.ports.map((entry) => entry.id) ?? [];
    return { path: `${path}.port`, message: `${component.name || component.kind} has the ports ${ports.join(', ')}`, value: ref.port };
  }
  if (port.medium === medium) return null;
  const join = medium === 'oil' ? 'a line joins oil ports' : 'a shaft joins shaft ends';
  return {
    path,
    message: `${join}; ${portInWords(document, ref)} is ${port.medium === 'oil' ? 'an oil port' : 'a shaft end'}`,
    value: `${ref.component}.${ref.port}`,
  };
}

function lineIssues(document: CircuitDocument): Issue[] {
  const issues: Issue[] = [];
  const taken = new Map<string, string>();
  for (const [index, line] of document.lines.entries()) {
    for (const end of ['from', 'to'] as const) {
      const path = `lines[${index}].${end}`;
      const issue = portIssue(document, line[end], 'oil', path);
      if (issue) issues.push(issue);
      const key = `${line[end].component}.${line[end].port}`;
      const other = taken.get(key);
      if (other && !samePort(line.from, line.to)) {
        issues.push({ path, message: `one line per port: this port already has line ${other}; branch with a junction`, value: key });
      }
      taken.set(key, line.id);
    }
    if (samePort(line.from, line.to) || sameNode(document, line.from, line.to)) {
      issues.push({ path: `lines[${index}]`, message: 'joins a port to itself', value: `${line.from.component}.${line.from.port}` });
    }
  }
  return issues;
}

/** Two ports of one component that are one node, as on a junction. */
export function sameNode(document: CircuitDocument, a: PortRef, b: PortRef): boolean {
  if (a.component !== b.component) return false;
  const node = findPort(document, a)?.node;
  return node !== undefined && node === findPort(document, b)?.node;
}

function shaftIssues(document: CircuitDocument): Issue[] {
  const issues: Issue[] = [];
  const taken = new Map<string, string>();
  for (const [index, shaft] of document.shafts.entries()) {
    for (const [at, member] of shaft.members.entries()) {
      const path = `shafts[${index}].members[${at}]`;
      const issue = portIssue(document, member, 'shaft', path);
      if (issue) issues.push(issue);
      const key = `${member.component}.${member.port}`;
      const other = taken.get(key);
      if (other) {
        const message = other === shaft.id ? 'joins a shaft end to itself' : `this shaft end already belongs to shaft ${other}`;
        issues.push({ path, message, value: key });
      }
      taken.set(key, shaft.id);
    }
  }
  return issues;
}

function caseIssues(document: CircuitDocument): Issue[] {
  const issues: Issue[] = [];
  if ((document.cases[0]?.changes.length ?? 0) > 0) {
    issues.push({
      path: 'cases[0].changes',
      message: 'the first case has no changes: the document holds its values',
      value: document.cases[0]?.changes.length,
    });
  }
  for (const [index, entry] of document.cases.entries()) {
    const seen = new Set<string>();
    for (const [at, change] of entry.changes.entries()) {
      const key = `${change.target} ${change.field}`;
      if (seen.has(key)) issues.push({ path: `cases[${index}].changes[${at}]`, message: 'changes the same field twice', value: key });
      seen.add(key);
    }
  }
  return issues;
}

function requirementIssues(document: CircuitDocument): Issue[] {
  const issues: Issue[] = [];
  for (const [index, entry] of document.requirements.entries()) {
    const path = `requirements[${index}]`;
    const message = addressProblem(document, entry.quantity);
    if (message) issues.push({ path: `${path}.quantity`, message, value: entry.quantity });
    if (entry.measure === 'time to reach' && entry.at === undefined) {
      issues.push({ path: `${path}.at`, message: 'a time to reach needs the value to be reached', value: undefined });
    }
    if (entry.min === undefined && entry.max === undefined) {
      issues.push({ path, message: 'needs a least or a most value', value: entry.quantity });
    } else if (entry.min !== undefined && entry.max !== undefined && entry.min > entry.max) {
      issues.push({ path: `${path}.min`, message: `must not be above max (${entry.max})`, value: entry.min });
    }
  }
  return issues;
}

/** What is wrong with the address of a channel or a yardstick; null when something is there. */
export function addressProblem(document: CircuitDocument, address: string): string | null {
  if (freeQuantities.includes(address)) return null;
  const parts = address.split('.');
  const [head, middle, tail] = parts;
  if (head === 'line') {
    const exists = parts.length === 3 && tail === 'flow' && document.lines.some((line) => line.id === middle);
    return exists ? null : 'there is no such line; a line has line.<id>.flow';
  }
  const component = document.components.find((entry) => entry.id === head);
  const kind = component && findKind(component.kind);
  if (!kind) return "there is no such component; write component.reading, component.port.pressure, 'stall margin' or 'rms current'";
  if (parts.length === 2 && kind.readings.some((reading) => reading.id === middle)) return null;
  const port = kind.ports.find((entry) => entry.id === middle && entry.medium === 'oil');
  if (parts.length === 3 && port && (tail === 'pressure' || tail === 'flow')) return null;
  return `${component.name || kind.title} has the readings ${kind.readings.map((reading) => reading.id).join(', ')}`;
}
