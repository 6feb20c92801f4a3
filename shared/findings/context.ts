import { nameInWords } from '../circuit/kind-lookup.ts';
import { plateOf } from '../circuit/plate.ts';
import type { CircuitDocument, Component, Requirement } from '../circuit/schema.ts';
import type { Plate, RunConstants } from '../kinds/kind.ts';
import { kindOf } from '../kinds/registry.ts';
import type { CompiledCircuit } from '../simulation/circuit.ts';
import { type RunResult, valueAt } from '../simulation/result.ts';
import type { Yardsticks } from './finding.ts';
import type { MotorFacts } from './motor-facts.ts';
import { findReach, type Reach } from './reach.ts';
import type { Window } from './series.ts';

/** Everything a rule may look at: the drawing as this case sees it, the run, and what was worked out once from both. */

/** What findings need of a compiled circuit. */
export type SeenCircuit = Pick<CompiledCircuit, 'document' | 'run'>;

export interface Base {
  /** As drawn, with all its cases. */
  readonly document: CircuitDocument;
  readonly caseId: string;
  /** As this case sees it. */
  readonly seen: CircuitDocument;
  readonly constants: RunConstants;
  readonly run: RunResult;
  readonly reach: Reach;
  readonly times: Float64Array;
  readonly end: number;
  /** Column of a channel; null when the run has none of that name. */
  readonly column: (address: string) => Float64Array | null;
  /** Value of a channel at a time; 0 when there is none. */
  readonly at: (address: string, time: number) => number;
  /** Plate of a component of a known kind; everything reads as not given for any other. */
  readonly plate: (componentId: string) => Plate;
  readonly name: (componentId: string) => string;
  readonly ofKind: (...kinds: readonly string[]) => readonly Component[];
}

/** One motor with its plate facts, what it did in the run, and the pumps on its shaft. */
export interface DriveLoad {
  readonly component: Component;
  readonly facts: MotorFacts;
  readonly yardsticks: Yardsticks;
  readonly pumps: readonly Component[];
  /** From the end of run-up to the end of the run: verdicts look only here. null = never came up to speed. */
  readonly running: Window | null;
  /** Below pull-out and not back within half a second. */
  readonly stall: Window | null;
  readonly dips: readonly Window[];
  /** Lowest and highest terminal voltage while switched on [V]. */
  readonly voltage: { readonly low: number; readonly high: number };
  /** Pull-out torque at the lowest voltage [N·m]. */
  readonly lowestPullOut: number;
}

export interface RequirementResult {
  readonly requirement: Requirement;
  readonly met: boolean;
  readonly value: number | null;
}

export interface FindingContext extends Base {
  readonly drives: readonly DriveLoad[];
  readonly requirements: readonly RequirementResult[];
}

const nothingGiven: Plate = { number: () => 0, given: () => null, choice: () => '' };

export function baseOf(document: CircuitDocument, caseId: string, circuit: SeenCircuit, run: RunResult): Base {
  const seen = circuit.document;
  const columns = new Map(run.channels.map((channel) => [channel.address, channel.values]));
  const column = (address: string) => columns.get(address) ?? null;
  const componentOf = (id: string) => seen.components.find((entry) => entry.id === id);
  return {
    document,
    caseId,
    seen,
    constants: circuit.run,
    run,
    reach: findReach(seen),
    times: run.times,
    end: run.times[run.times.length - 1] ?? 0,
    column,
    at: (address, time) => {
      const values = column(address);
      return values ? valueAt(run.times, values, time) : 0;
    },
    plate: (id) => {
      const component = componentOf(id);
      const kind = component && kindOf(component.kind);
      return component && kind ? plateOf(component, kind) : nothingGiven;
    },
    name: (id) => {
      const component = componentOf(id);
      return component ? nameInWords(component) : id;
    },
    ofKind: (...kinds) => seen.components.filter((component) => kinds.includes(component.kind)),
  };
}

/** Reliefs whose pressure port is always reached from a pump's outlet. */
export function reliefsOf(base: Base, pumpId: string): readonly Component[] {
  const nets = base.reach.always(`${pumpId}.outlet`);
  return base.ofKind('relief-valve').filter((relief) => nets.has(base.reach.netOf(`${relief.id}.P`)));
}
