import type * as z from 'zod/mini';
import type { ParameterSpec } from '../kinds/kind.ts';
import { screwRange } from './effective.ts';
import { allowedInWords, plainNumber, rangeInWords } from './in-words.ts';
import { findKind, findParameter, findScrew, nameInWords } from './kind-lookup.ts';
import { type CircuitDocument, circuitDocument, command, duty, fluid, line, reservoir, supply } from './schema.ts';

/** What a field may be: one answer for the nameplate (which refuses with the nearest value) and for files (which list it). */
export interface ValueProblem {
  /** What is wrong and what is allowed, without the value itself. */
  readonly message: string;
  /** Nearest value that is allowed [SI], where there is one. */
  readonly nearest?: number;
}

const groups = { supply, fluid, reservoir, site: circuitDocument.shape.site } as const;
const lineFields = ['length', 'bore', 'wall', 'volume', 'laminar', 'quadratic'] as const;

/** Null when a case or the document may hold this value there. Screws are also held to the part's own adjustable range. */
export function valueProblem(
  document: CircuitDocument,
  caseId: string,
  target: string,
  field: string,
  value: number | string,
): ValueProblem | null {
  if (target in groups) {
    const shape = groups[target as keyof typeof groups].shape as Readonly<Record<string, z.ZodMiniType>>;
    const type = shape[field];
    if (!type) return { message: `${target} has no '${field}'; it has ${Object.keys(shape).join(', ')}` };
    return schemaProblem(type, value);
  }
  if (target === 'duty') return dutyProblem(document, field, value);
  const component = document.components.find((entry) => entry.id === target);
  if (component) return componentProblem(document, caseId, component.id, field, value);
  if (document.lines.some((entry) => entry.id === target)) return lineProblem(field, value);
  return { message: `there is no component or line '${target}'` };
}

/** Parameters of a component: name, type, range, and a screw's adjustable range. */
export function componentProblem(
  document: CircuitDocument,
  caseId: string,
  componentId: string,
  field: string,
  value: number | string,
): ValueProblem | null {
  const component = document.components.find((entry) => entry.id === componentId);
  const kind = component && findKind(component.kind);
  if (!component || !kind) return { message: `there is no component '${componentId}' of a known kind` };
  const name = nameInWords(component);
  if (field.startsWith('fault.')) {
    const fault = kind.faults.find((entry) => `fault.${entry.id}` === field);
    if (!fault) return { message: `${name} has no fault '${field.slice(6)}'${orNone(kind.faults.map((entry) => entry.id))}` };
    return numberProblem(value, 0, 1, '0 to 1');
  }
  const spec = findParameter(kind, field);
  if (!spec) return { message: `${name} (${kind.title}) has no '${field}'; it has ${kind.parameters.map((entry) => entry.id).join(', ')}` };
  const problem = parameterProblem(spec, value);
  if (problem || !findScrew(kind, field) || spec.type !== 'number' || typeof value !== 'number') return problem;
  const range = screwRange(document, caseId, componentId, field);
  // An entered range that is empty is reported at its own fields; the screw cannot be inside it.
  if (!range || (value >= range.min && value <= range.max)) return null;
  const words = rangeInWords(range.min, range.max, spec.quantity);
  return { message: `the screw goes from ${words}`, nearest: Math.min(range.max, Math.max(range.min, value)) };
}

export function parameterProblem(spec: ParameterSpec, value: number | string): ValueProblem | null {
  if (spec.type === 'choice') {
    return spec.choices.some((choice) => choice.value === value) ? null : { message: `must be ${allowedInWords(spec)}` };
  }
  return numberProblem(value, spec.min, spec.max, allowedInWords(spec));
}

function numberProblem(value: number | string, min: number, max: number, words: string): ValueProblem | null {
  if (typeof value !== 'number' || !Number.isFinite(value)) return { message: `must be a finite number, ${words}` };
  if (value >= min && value <= max) return null;
  return { message: `must be ${words}`, nearest: Math.min(max, Math.max(min, value)) };
}

function lineProblem(field: string, value: number | string): ValueProblem | null {
  if (field === 'loss') return value === 0 || value === 1 ? null : { message: 'must be 1 (loss on) or 0 (off)' };
  if (!(lineFields as readonly string[]).includes(field))
    return { message: `a line has no '${field}'; it has loss, ${lineFields.join(', ')}` };
  return schemaProblem(line.shape[field as (typeof lineFields)[number]], value);
}

function dutyProblem(document: CircuitDocument, field: string, value: number | string): ValueProblem | null {
  if (field === 'duration') return schemaProblem(duty.shape.duration, value);
  const [word, id, part] = field.split('.');
  const entry = document.duty.commands.find((candidate) => candidate.id === id);
  if (word !== 'command' || !entry) return { message: `the duty has no '${field}'; it has duration and command.<id>.value, time or ramp` };
  if (part === 'time') return schemaProblem(command.shape.time, value);
  if (part === 'ramp') return schemaProblem(command.shape.ramp, value);
  if (part === 'value') return commandValueProblem(document, entry.target, entry.input, value);
  return { message: `a command has value, time and ramp, not '${part ?? ''}'` };
}

/** A command's input must be declared by its target and its value inside the input's range. */
export function commandValueProblem(document: CircuitDocument, target: string, input: string, value: number | string): ValueProblem | null {
  if (target === 'supply') {
    if (input !== 'voltage' && input !== 'frequency') return { message: 'the supply takes commands to voltage or frequency' };
    return schemaProblem(supply.shape[input], value);
  }
  const component = document.components.find((entry) => entry.id === target);
  const kind = component && findKind(component.kind);
  if (!component || !kind) return { message: `there is no component '${target}'` };
  if (input.startsWith('fault.')) return componentProblem(document, '', target, input, value);
  const spec = kind.inputs.find((entry) => entry.id === input);
  if (!spec) return { message: `${nameInWords(component)} takes no command '${input}'${orNone(kind.inputs.map((entry) => entry.id))}` };
  return numberProblem(value, spec.min, spec.max, rangeInWords(spec.min, spec.max, spec.quantity));
}

function orNone(ids: readonly string[]): string {
  return ids.length === 0 ? '; it has none' : `; it has ${ids.join(', ')}`;
}

/** Bounds written in the schema, as one message with the nearest value. */
function schemaProblem(type: z.ZodMiniType, value: number | string): ValueProblem | null {
  const result = type.safeParse(value);
  if (result.success && value !== undefined) return null;
  for (const issue of result.error?.issues ?? []) {
    if (issue.code === 'too_small')
      return { message: `must be at least ${plainNumber(Number(issue.minimum))}`, nearest: Number(issue.minimum) };
    if (issue.code === 'too_big')
      return { message: `must be at most ${plainNumber(Number(issue.maximum))}`, nearest: Number(issue.maximum) };
    if (issue.code === 'invalid_value') return { message: `must be one of ${issue.values.map(String).join(', ')}` };
  }
  return { message: 'must be a finite number' };
}
