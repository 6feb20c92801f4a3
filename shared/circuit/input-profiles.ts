import type { ComponentKind, RunConstants } from '../kinds/kind.ts';
import { plateOf } from './plate.ts';
import { type Move, type Profile, profileOf } from './profile.ts';
import type { CircuitDocument, Component } from './schema.ts';

/** Inputs that a command to the supply drives on every component that has them. */
const supplyInputs: Readonly<Record<string, string>> = { voltage: 'supplyVoltage', frequency: 'supplyFrequency' };

/** Ids of a kind's inputs in the order of a block's `input`: its inputs, then one per fault. */
export function inputIds(kind: ComponentKind): string[] {
  return [...kind.inputs.map((input) => input.id), ...kind.faults.map((fault) => `fault.${fault.id}`)];
}

/** Every input of one component over the run, in the order of `inputIds`. `document` is the effective one of the case. */
export function inputProfiles(document: CircuitDocument, component: Component, kind: ComponentKind, run: RunConstants): Profile[] {
  const plate = plateOf(component, kind);
  return inputIds(kind).map((id) => {
    const spec = kind.inputs.find((input) => input.id === id);
    const rest = spec ? spec.rest(plate, run) : plate.number(id);
    const moves: Move[] = document.duty.commands.filter((command) =>
      command.target === 'supply' ? supplyInputs[command.input] === id : command.target === component.id && command.input === id,
    );
    return profileOf(rest, moves);
  });
}
