import { quantityInWords, rangeInWords } from '../circuit/in-words.ts';
import { nameInWords } from '../circuit/kind-lookup.ts';
import type { CircuitDocument, Command } from '../circuit/schema.ts';
import { kindOf } from '../kinds/registry.ts';
import type { Problem } from './result.ts';

/** Commands of the duty that name nothing, or a value that the input cannot take. */
export function dutyProblems(document: CircuitDocument): Problem[] {
  return document.duty.commands.flatMap((command, index) => {
    const message = commandProblem(document, command);
    if (message === null) return [];
    return [
      {
        severity: 'problem',
        code: 'bad-command',
        message,
        path: `duty.commands.${index}`,
        ...(command.target === 'supply' ? {} : { component: command.target }),
      } as Problem,
    ];
  });
}

function commandProblem(document: CircuitDocument, command: Command): string | null {
  const words = `The command at ${command.time} s`;
  if (command.target === 'supply') {
    if (command.input === 'voltage' || command.input === 'frequency') return null;
    return `${words} sets the supply's "${command.input}"; the supply has voltage and frequency.`;
  }
  const component = document.components.find((entry) => entry.id === command.target);
  if (!component) return `${words} is for "${command.target}", which is not on the sheet.`;
  const kind = kindOf(component.kind);
  if (!kind) return null;
  const fault = kind.faults.find((entry) => `fault.${entry.id}` === command.input);
  const input = kind.inputs.find((entry) => entry.id === command.input);
  if (!fault && !input) return `${words} sets "${command.input}" of ${nameInWords(component)}, which has no such input.`;
  const min = input?.min ?? 0;
  const max = input?.max ?? 1;
  if (command.value >= min && command.value <= max) return null;
  const quantity = input?.quantity ?? 'fraction';
  return `${words} sets ${(input?.label ?? fault?.label ?? command.input).toLowerCase()} of ${nameInWords(component)} to ${quantityInWords(command.value, quantity)}; allowed is ${rangeInWords(min, max, quantity)}.`;
}
