import { inputIds, inputProfiles } from '../circuit/input-profiles.ts';
import { nameInWords } from '../circuit/kind-lookup.ts';
import { addressOf, type Nets } from '../circuit/nets.ts';
import { plateOf } from '../circuit/plate.ts';
import type { Profile } from '../circuit/profile.ts';
import type { CircuitDocument, Component, Line } from '../circuit/schema.ts';
import { lineLoss } from '../fluid/line.ts';
import type { Block, ComponentKind, RunConstants } from '../kinds/kind.ts';
import { kindOf } from '../kinds/registry.ts';
import { type SparsePattern, sparsePattern } from '../numerics/sparse-pattern.ts';
import type { BlockPair, StateLabel } from './circuit.ts';
import { lineElement } from './line-element.ts';
import type { Problem } from './result.ts';

/** Least laminar loss of a line [Pa·s/m³], so that its flow has a slope at standstill: under 1 Pa at 60 L/min. */
const LEAST_LAMINAR = 1e3;

interface Instance {
  readonly id: string;
  readonly coefficients: Readonly<Record<string, number>>;
  /** State index of each port. */
  readonly ports: readonly number[];
  readonly profiles: readonly Profile[];
  readonly start: readonly number[];
  readonly names: string;
}

export interface Layout {
  /** State index of each hydraulic net (−1 = tank) and shaft net. */
  readonly nodeOfNet: Int32Array;
  readonly shaftOfNet: Int32Array;
  /** Number of nodes and shafts. */
  readonly shared: number;
}

export interface Built {
  readonly size: number;
  readonly blocks: BlockPair[];
  readonly slotOf: ReadonlyMap<string, number>;
  readonly nodeOfSlot: Int32Array;
  readonly profiles: Profile[];
  readonly start: number[];
  readonly nominal: number[];
  readonly labels: StateLabel[];
  readonly pattern: SparsePattern;
  readonly problems: Problem[];
}

function coefficientProblem(component: Component, kind: ComponentKind, bad: readonly string[]): Problem {
  return {
    severity: 'problem',
    code: 'coefficient-missing',
    message: `${nameInWords(component)} cannot be computed: ${bad.join(', ')} ${bad.length === 1 ? 'does' : 'do'} not follow from its nameplate. Check the nameplate of this ${kind.word}.`,
    component: component.id,
    cure: { label: 'Open the nameplate', action: 'open-nameplate', component: component.id },
  };
}

/** Coefficients, port places, inputs and start values of one component. */
function instanceOf(
  document: CircuitDocument,
  component: Component,
  kind: ComponentKind,
  nets: Nets,
  layout: Layout,
  run: RunConstants,
): Instance {
  const coefficients = kind.prepare(plateOf(component, kind), run);
  return {
    id: component.id,
    names: nameInWords(component),
    coefficients,
    ports: kind.ports.map((port) => {
      const address = `${component.id}.${port.id}`;
      if (port.medium === 'shaft') return layout.shaftOfNet[nets.shaftNetOf.get(address) as number]!;
      return layout.nodeOfNet[nets.oilNetOf.get(address) as number]!;
    }),
    profiles: inputProfiles(document, component, kind, run),
    start: kind.states.map((state) => state.start(coefficients)),
  };
}

function lineInstance(line: Line, nets: Nets, layout: Layout, run: RunConstants): Instance {
  const loss = lineLoss(line.length, line.bore, run.density, run.viscosity);
  const node = (address: string): number => layout.nodeOfNet[nets.oilNetOf.get(address) as number]!;
  return {
    id: `line.${line.id}`,
    names: `line ${line.id}`,
    coefficients: { laminar: Math.max(line.laminar ?? loss.laminar, LEAST_LAMINAR), quadratic: line.quadratic ?? loss.quadratic },
    ports: [node(addressOf(line.from)), node(addressOf(line.to))],
    profiles: [],
    start: [],
  };
}

/** Turns components and lines with loss into blocks of flat arrays, one per kind, and works out the pattern of the Jacobian
 *  from the entries that the kinds declare. */
export function buildBlocks(document: CircuitDocument, nets: Nets, layout: Layout, run: RunConstants): Built {
  const problems: Problem[] = [];
  const byKind = new Map<ComponentKind, Instance[]>();
  const put = (kind: ComponentKind, instance: Instance): void => {
    const there = byKind.get(kind);
    if (there) there.push(instance);
    else byKind.set(kind, [instance]);
  };
  for (const component of document.components) {
    const kind = kindOf(component.kind);
    if (!kind) continue;
    const instance = instanceOf(document, component, kind, nets, layout, run);
    const bad = kind.coefficients.filter((id) => !Number.isFinite(instance.coefficients[id]));
    if (bad.length > 0 || instance.start.some((value) => !Number.isFinite(value))) problems.push(coefficientProblem(component, kind, bad));
    put(kind, instance);
  }
  for (const line of nets.lossLines) put(lineElement, lineInstance(line, nets, layout, run));

  let size = layout.shared;
  for (const [kind, instances] of byKind) size += kind.states.length * instances.length;

  const blocks: BlockPair[] = [];
  const slotOf = new Map<string, number>();
  const nodeOfSlot: number[] = [];
  const profiles: Profile[] = [];
  const start: number[] = [];
  const nominal: number[] = [];
  const labels: StateLabel[] = [];
  const pairs: [number, number][] = [];
  for (const [kind, instances] of byKind) {
    const count = instances.length;
    const inputCount = inputIds(kind).length;
    const ports: number[] = [];
    const slots: number[] = [];
    const states: number[] = [];
    const inputs: number[] = [];
    for (const instance of instances) {
      kind.ports.forEach((port, p) => {
        const at = instance.ports[p]!;
        const state = at < 0 ? size : at;
        slotOf.set(`${instance.id}.${port.id}`, nodeOfSlot.length);
        ports.push(state);
        slots.push(nodeOfSlot.length);
        nodeOfSlot.push(state);
      });
      kind.states.forEach((state, s) => {
        states.push(layout.shared + start.length);
        start.push(instance.start[s]!);
        nominal.push(state.nominal);
        labels.push({ component: instance.id, words: `${instance.names} (${state.label.toLowerCase()})` });
      });
      for (const profile of instance.profiles) {
        inputs.push(profiles.length);
        profiles.push(profile);
      }
    }
    const place = (ref: string, i: number): number =>
      ref.startsWith('state:')
        ? states[i * kind.states.length + kind.states.findIndex((state) => `state:${state.id}` === ref)]!
        : ports[i * kind.ports.length + kind.ports.findIndex((port) => port.id === ref)]!;
    const entries = instances.flatMap((_, i) => kind.entries.map(([row, column]): [number, number] => [place(row, i), place(column, i)]));
    pairs.push(...entries);
    const block: Block & { slot: Int32Array } = {
      kind: kind.id,
      count,
      componentIds: instances.map((instance) => instance.id),
      c: Float64Array.from(instances.flatMap((instance) => kind.coefficients.map((id) => instance.coefficients[id] ?? Number.NaN))),
      coefficientCount: kind.coefficients.length,
      port: Int32Array.from(ports),
      balance: Int32Array.from(ports),
      portCount: kind.ports.length,
      state: Int32Array.from(states),
      stateCount: kind.states.length,
      input: Int32Array.from(inputs),
      inputCount,
      slot: Int32Array.from(entries, (_, k) => k),
      entryCount: kind.entries.length,
    };
    blocks.push({ kind, block, reading: { ...block, balance: Int32Array.from(slots) } });
  }
  const pattern = sparsePattern(size, pairs);
  let next = 0;
  for (const { block } of blocks) {
    for (let k = 0; k < block.slot.length; k++) {
      const [row, column] = pairs[next++] as [number, number];
      block.slot[k] = pattern.slot(row, column);
    }
  }
  return { size, blocks, slotOf, nodeOfSlot: Int32Array.from(nodeOfSlot), profiles, start, nominal, labels, pattern, problems };
}
