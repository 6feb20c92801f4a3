import { commandValueProblem, componentProblem, valueProblem } from './allowed-values.ts';
import { effectiveNumber, screwRange } from './effective.ts';
import { quantityInWords, rangeInWords } from './in-words.ts';
import type { Issue } from './issue.ts';
import { findKind, findParameter, findScrew } from './kind-lookup.ts';
import type { CircuitDocument, Component } from './schema.ts';

/** What depends on the component kinds: names, types and ranges of every value in the document and its cases. */
export function kindIssues(document: CircuitDocument): Issue[] {
  const first = document.cases[0]?.id ?? '';
  return [
    ...document.components.flatMap((component, index) => componentIssues(document, first, component, index)),
    ...document.duty.commands.flatMap((command, index) => {
      const problem = commandValueProblem(document, command.target, command.input, command.value);
      return problem
        ? [{ path: `duty.commands[${index}].value`, message: `${command.input} ${problem.message}`, value: command.value }]
        : [];
    }),
    ...document.cases.flatMap((entry, index) => [
      ...entry.changes.flatMap((change, at) => {
        const problem = valueProblem(document, entry.id, change.target, change.field, change.value);
        return problem
          ? [{ path: `cases[${index}].changes[${at}].value`, message: `${change.field} ${problem.message}`, value: change.value }]
          : [];
      }),
      ...(index === 0 ? [] : movedRangeIssues(document, entry.id, index)),
    ]),
  ];
}

function componentIssues(document: CircuitDocument, first: string, component: Component, index: number): Issue[] {
  const path = `components[${index}]`;
  const kind = findKind(component.kind);
  if (!kind) return [{ path: `${path}.kind`, message: 'is not a component kind this version knows', value: component.kind }];
  const issues: Issue[] = [];
  if (component.kindVersion !== kind.version) {
    issues.push({ path: `${path}.kindVersion`, message: `${kind.title} is version ${kind.version} here`, value: component.kindVersion });
  }
  for (const [id, entry] of Object.entries(component.parameters)) {
    const problem = componentProblem(document, first, component.id, id, entry.value);
    if (problem) issues.push({ path: `${path}.parameters.${id}.value`, message: `${id} ${problem.message}`, value: entry.value });
  }
  for (const screw of kind.screws) {
    const range = screwRange(document, first, component.id, screw.id);
    const spec = findParameter(kind, screw.id);
    if (!range || spec?.type !== 'number') continue;
    if (range.min > range.max) {
      issues.push({
        path: `${path}.parameters.${screw.least}`,
        message: `the adjustable range of ${screw.label} is empty: ${quantityInWords(range.min, spec.quantity)} is above ${quantityInWords(range.max, spec.quantity)}`,
        value: range.min,
      });
    } else if (!component.parameters[screw.id] && spec.initial !== null && (spec.initial < range.min || spec.initial > range.max)) {
      issues.push({
        path: `${path}.parameters.${screw.id}`,
        message: `${screw.label} is not given, and its typical ${quantityInWords(spec.initial, spec.quantity)} is outside the part's ${rangeInWords(range.min, range.max, spec.quantity)}`,
        value: undefined,
      });
    }
  }
  for (const [id, state] of Object.entries(component.screws ?? {})) {
    if (!findScrew(kind, id)) {
      const has = kind.screws.map((screw) => screw.id).join(', ') || 'none';
      issues.push({ path: `${path}.screws.${id}`, message: `${kind.title} has no such screw; it has ${has}`, value: id });
    } else if (state.asFound !== undefined) {
      const spec = findParameter(kind, id);
      if (spec?.type === 'number' && (state.asFound < spec.min || state.asFound > spec.max)) {
        const words = rangeInWords(spec.min, spec.max, spec.quantity);
        issues.push({ path: `${path}.screws.${id}.asFound`, message: `must be ${words}`, value: state.asFound });
      }
    }
  }
  return issues;
}

/** A case that moves the ends of an adjustable range must still have the screw between them. */
function movedRangeIssues(document: CircuitDocument, caseId: string, index: number): Issue[] {
  const issues: Issue[] = [];
  const changes = document.cases[index]?.changes ?? [];
  for (const component of document.components) {
    for (const screw of findKind(component.kind)?.screws ?? []) {
      const changed = (field: string) => changes.some((change) => change.target === component.id && change.field === field);
      if (changed(screw.id) || !(changed(screw.least) || changed(screw.most))) continue;
      const value = effectiveNumber(document, caseId, component.id, screw.id);
      const problem = value === null ? null : componentProblem(document, caseId, component.id, screw.id, value);
      if (problem)
        issues.push({ path: `cases[${index}].changes`, message: `${screw.label} (${screw.id}): ${problem.message} in this case`, value });
    }
  }
  return issues;
}
