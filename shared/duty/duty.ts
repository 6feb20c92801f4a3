import type { ComponentKind } from '../kinds/kind.ts';
import type { QuantityId } from '../units/quantities.ts';

/** What the duty's functions need of a document: a circuit document fits. Times in seconds, values in SI. */

export interface DutyCommand {
  readonly id: string;
  readonly time: number;
  readonly ramp: number;
  /** Component id, or 'supply'. */
  readonly target: string;
  readonly input: string;
  readonly value: number;
  readonly label: string;
}

export interface DutyComponent {
  readonly id: string;
  readonly kind: string;
  readonly name: string;
}

export interface DutyDocument {
  readonly components: readonly DutyComponent[];
  readonly supply: { readonly voltage: number; readonly frequency: number };
  readonly duty: {
    readonly duration: number;
    readonly repeat: boolean;
    readonly commands: readonly DutyCommand[];
  };
}

/** Looks a kind up by its id; undefined for a kind this version does not know. */
export type KindOf = (kind: string) => ComponentKind | undefined;

/** A value in the reader's unit, with the unit: '340 V'. */
export type Show = (value: number, quantity: QuantityId) => string;

/** Commands in the order in which they act: by time, then as listed. */
export function inOrder<C extends DutyCommand>(commands: readonly C[]): C[] {
  return commands
    .map((command, index) => ({ command, index }))
    .sort((a, b) => a.command.time - b.command.time || a.index - b.index)
    .map((entry) => entry.command);
}

/** The input of a target as its kind declares it, faults included; null where there is none. */
export interface TargetInput {
  readonly label: string;
  readonly quantity: QuantityId;
  readonly min: number;
  readonly max: number;
  readonly ramp: number;
  readonly role: 'command' | 'setting' | 'load' | 'fault';
  readonly words: readonly { readonly value: number; readonly label: string }[];
}

/** Bounds of supply commands, the same as the document's own (schema.ts). */
export const supplyInputs: Readonly<Record<string, TargetInput>> = {
  voltage: {
    label: 'Supply voltage',
    quantity: 'voltage',
    min: 0,
    max: 1000,
    ramp: 0.02,
    role: 'setting',
    words: [],
  },
  frequency: {
    label: 'Supply frequency',
    quantity: 'frequency',
    min: 10,
    max: 100,
    ramp: 0.5,
    role: 'setting',
    words: [],
  },
};

export function targetInput(document: DutyDocument, kindOf: KindOf, target: string, input: string): TargetInput | null {
  if (target === 'supply') return supplyInputs[input] ?? null;
  const component = document.components.find((entry) => entry.id === target);
  const kind = component && kindOf(component.kind);
  if (!kind) return null;
  if (input.startsWith('fault.')) {
    const fault = kind.faults.find((entry) => `fault.${entry.id}` === input);
    return fault
      ? {
          label: fault.label,
          quantity: 'fraction',
          min: 0,
          max: 1,
          ramp: 0,
          role: 'fault',
          words: [],
        }
      : null;
  }
  const spec = kind.inputs.find((entry) => entry.id === input);
  if (!spec) return null;
  return {
    label: spec.label,
    quantity: spec.quantity,
    min: spec.min,
    max: spec.max,
    ramp: spec.ramp,
    role: spec.role,
    words: spec.words ?? [],
  };
}
