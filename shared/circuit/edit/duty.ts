import { commandValueProblem, type ValueProblem } from '../allowed-values.ts';
import { addressProblem } from '../check-references.ts';
import { kindOfComponent } from '../kind-lookup.ts';
import type { CircuitDocument, Command, Requirement } from '../schema.ts';
import { firstFree } from './ids.ts';

/** The duty's commands and the requirements that a run is measured by. Refused edits give the same document back and a
 *  `problem` that says what is allowed. */
export interface DutyEdit {
  readonly document: CircuitDocument;
  readonly id: string | null;
  readonly problem: ValueProblem | null;
}

const clampTime = (time: number) => (Number.isFinite(time) ? Math.min(3600, Math.max(0, time)) : 0);
/** Times on the tape lie on whole milliseconds, so that 0.1 + 0.2 is 0.3. */
const roundTime = (time: number) => Math.round(clampTime(time) * 1000) / 1000;

/** A command with the input's own ramp and word unless given. */
export function addCommand(
  document: CircuitDocument,
  command: Pick<Command, 'time' | 'target' | 'input' | 'value'> & Partial<Pick<Command, 'ramp' | 'label'>>,
): DutyEdit {
  const problem = commandValueProblem(document, command.target, command.input, command.value);
  if (problem) return { document, id: null, problem };
  if (document.duty.commands.length >= 400) return { document, id: null, problem: { message: 'a duty holds at most 400 commands' } };
  const spec = kindOfComponent(document, command.target)?.inputs.find((entry) => entry.id === command.input);
  const id = firstFree(new Set(document.duty.commands.map((entry) => entry.id)), 'c');
  const label = command.label ?? spec?.words?.find((word) => word.value === command.value)?.label ?? spec?.label ?? command.input;
  const added: Command = {
    id,
    time: roundTime(command.time),
    ramp: roundTime(command.ramp ?? spec?.ramp ?? 0),
    target: command.target,
    input: command.input,
    value: command.value,
    label: label.slice(0, 60),
  };
  return { document: withCommands(document, [...document.duty.commands, added]), id, problem: null };
}

/** Commands in the order of their times; equal times keep their order. */
function withCommands(document: CircuitDocument, commands: readonly Command[]): CircuitDocument {
  return { ...document, duty: { ...document.duty, commands: [...commands].sort((a, b) => a.time - b.time) } };
}

/** Moves a flag in time, within the duty. */
export function moveCommand(document: CircuitDocument, id: string, time: number): CircuitDocument {
  const to = Math.min(document.duty.duration, roundTime(time));
  const found = document.duty.commands.find((entry) => entry.id === id);
  if (!found || found.time === to) return document;
  return withCommands(
    document,
    document.duty.commands.map((entry) => (entry.id === id ? { ...entry, time: to } : entry)),
  );
}

export function changeCommand(document: CircuitDocument, id: string, patch: Partial<Omit<Command, 'id'>>): DutyEdit {
  const found = document.duty.commands.find((entry) => entry.id === id);
  if (!found) return { document, id: null, problem: { message: 'there is no such command' } };
  const next: Command = { ...found, ...patch, id };
  const problem = commandValueProblem(document, next.target, next.input, next.value);
  if (problem) return { document, id, problem };
  const tidy = { ...next, time: roundTime(next.time), ramp: roundTime(next.ramp), label: next.label.slice(0, 60) };
  const changed = withCommands(
    document,
    document.duty.commands.map((entry) => (entry.id === id ? tidy : entry)),
  );
  // A case may hold a value for this command: it must still fit the new target.
  for (const entry of changed.cases) {
    for (const change of entry.changes) {
      if (change.target !== 'duty' || change.field !== `command.${id}.value`) continue;
      const kept = commandValueProblem(changed, tidy.target, tidy.input, change.value);
      if (kept) return { document, id, problem: { message: `case ${entry.name} changes this command: ${kept.message}` } };
    }
  }
  return { document: changed, id, problem: null };
}

/** Deletes a command and the case changes that name it. */
export function removeCommand(document: CircuitDocument, id: string): CircuitDocument {
  if (!document.duty.commands.some((entry) => entry.id === id)) return document;
  const names = (field: string) => field.split('.')[1] === id;
  const cases = document.cases.map((entry) =>
    entry.changes.some((change) => change.target === 'duty' && names(change.field))
      ? { ...entry, changes: entry.changes.filter((change) => change.target !== 'duty' || !names(change.field)) }
      : entry,
  );
  return {
    ...withCommands(
      document,
      document.duty.commands.filter((entry) => entry.id !== id),
    ),
    cases,
  };
}

/** Length of the duty [s], 0.05 to 3600, and whether it repeats. */
export function setDuty(document: CircuitDocument, patch: { readonly duration?: number; readonly repeat?: boolean }): CircuitDocument {
  const wanted = patch.duration;
  const duration = wanted === undefined || !Number.isFinite(wanted) ? document.duty.duration : Math.max(0.05, roundTime(wanted));
  const repeat = patch.repeat ?? document.duty.repeat;
  if (duration === document.duty.duration && repeat === document.duty.repeat) return document;
  return { ...document, duty: { ...document.duty, duration, repeat } };
}

export function addRequirement(
  document: CircuitDocument,
  requirement: Omit<Requirement, 'id'>,
): { document: CircuitDocument; id: string | null } {
  if (document.requirements.length >= 40 || requirementProblem(document, requirement)) return { document, id: null };
  const id = firstFree(new Set(document.requirements.map((entry) => entry.id)), 'r');
  return { document: { ...document, requirements: [...document.requirements, { ...requirement, id }] }, id };
}

export function changeRequirement(document: CircuitDocument, id: string, patch: Partial<Omit<Requirement, 'id'>>): CircuitDocument {
  const found = document.requirements.find((entry) => entry.id === id);
  if (!found) return document;
  const next: Requirement = { ...found, ...patch, id };
  if (requirementProblem(document, next)) return document;
  return { ...document, requirements: document.requirements.map((entry) => (entry.id === id ? next : entry)) };
}

export function removeRequirement(document: CircuitDocument, id: string): CircuitDocument {
  if (!document.requirements.some((entry) => entry.id === id)) return document;
  return { ...document, requirements: document.requirements.filter((entry) => entry.id !== id) };
}

/** Why a requirement cannot be kept, in words; null when it can. */
export function requirementProblem(document: CircuitDocument, requirement: Omit<Requirement, 'id'>): string | null {
  const address = addressProblem(document, requirement.quantity);
  if (address) return address;
  if (requirement.min === undefined && requirement.max === undefined) return 'Give a least or a most value.';
  if (requirement.min !== undefined && requirement.max !== undefined && requirement.min > requirement.max) {
    return 'The least value is above the most.';
  }
  if (requirement.measure === 'time to reach' && requirement.at === undefined) return 'A time to reach needs the value to be reached.';
  return null;
}
