import { findCase } from '../circuit/effective.ts';
import { effectiveDocument } from '../circuit/effective-document.ts';
import { nameInWords, portInWords } from '../circuit/kind-lookup.ts';
import { addressOf, findNets, isOpen, type NetPort, type Nets } from '../circuit/nets.ts';
import { plateOf } from '../circuit/plate.ts';
import type { CircuitDocument, Line } from '../circuit/schema.ts';
import { lineVolume, tubeCompliance } from '../fluid/line.ts';
import { oilModel, runConstants } from '../fluid/run-constants.ts';
import { kindOf } from '../kinds/registry.ts';
import { analyse } from '../numerics/symbolic-lu.ts';
import { type Built, buildBlocks, type Layout } from './build-blocks.ts';
import { type CompiledCircuit, LEAST_VOLUME, type StateLabel } from './circuit.ts';
import { joiningProblems, openPorts, tankProblems } from './drawing-problems.ts';
import { dutyProblems } from './duty-problems.ts';
import { planChannels } from './plan-channels.ts';
import type { Problem } from './result.ts';

/** Inertia taken for a shaft on which nothing has any [kg·m²]. */
const LEAST_INERTIA = 1e-4;
/** Scales for absolute tolerances: pressure [Pa], shaft speed [rad/s]. */
const NOMINAL_PRESSURE = 2e5;
const NOMINAL_SPEED = 10;

export type Compiled =
  | { readonly ok: true; readonly circuit: CompiledCircuit; readonly notes: readonly Problem[] }
  | { readonly ok: false; readonly problems: readonly Problem[] };

/** Turns a checked document and one of its cases into a circuit that can run, or says in words what is missing. `notes` are
 *  what was taken for granted; `problems` hold every problem found and the notes. Throws nothing for any document that fits
 *  the schema. */
export function compileCircuit(document: CircuitDocument, caseId: string): Compiled {
  if (!findCase(document, caseId)) {
    return {
      ok: false,
      problems: [{ severity: 'problem', code: 'unknown-case', message: `There is no case "${caseId}" in this circuit.` }],
    };
  }
  const effective = effectiveDocument(document, caseId);
  const nets = findNets(effective);
  const found = [
    ...joiningProblems(effective, nets),
    ...openPorts(effective, nets),
    ...tankProblems(effective, nets),
    ...dutyProblems(effective),
    ...plateNotes(effective),
  ];
  if (found.some((problem) => problem.severity === 'problem')) return { ok: false, problems: found };

  const layout = layOut(nets);
  const run = runConstants(effective.fluid, effective.supply, effective.site);
  const built = buildBlocks(effective, nets, layout, run);
  if (built.problems.length > 0) return { ok: false, problems: [...found, ...built.problems] };
  const planned = planChannels(effective, nets, built.blocks, layout.nodeOfNet, built.slotOf);
  const volumes = nodeVolumes(effective, nets, layout);
  const notes = [...found, ...planned.notes, ...volumes.notes, ...inertiaNotes(effective, nets)];
  const circuit: CompiledCircuit = {
    document: effective,
    caseId,
    duration: effective.duty.duration,
    run,
    oil: oilModel(effective.fluid, effective.site),
    nets,
    nodeOfNet: layout.nodeOfNet.map((node) => (node < 0 ? built.size : node)),
    netOfNode: layout.netOfNode,
    size: built.size,
    nodes: layout.netOfNode.length,
    shafts: nets.shafts.length,
    blocks: built.blocks,
    slots: built.nodeOfSlot.length,
    nodeOfSlot: built.nodeOfSlot,
    sourceSlots: sourceSlots(nets, built),
    volume: padded(volumes.volume, built.size + 1),
    compliance: volumes.compliance,
    inertia: inertias(effective, nets),
    profiles: built.profiles,
    start: padded([...new Array<number>(layout.shared).fill(0), ...built.start], built.size + 1),
    nominal: padded(
      [
        ...new Array<number>(layout.netOfNode.length).fill(NOMINAL_PRESSURE),
        ...new Array<number>(nets.shafts.length).fill(NOMINAL_SPEED),
        ...built.nominal,
      ],
      built.size + 1,
    ),
    labels: [...sharedLabels(effective, nets, layout), ...built.labels],
    pattern: built.pattern,
    symbolic: analyse(built.pattern),
    columns: planned.columns,
    channels: planned.channels,
    notes,
  };
  return { ok: true, circuit, notes };
}

function padded(values: ArrayLike<number>, length: number): Float64Array {
  const result = new Float64Array(length);
  result.set(values);
  return result;
}

/** A net is fixed at tank pressure when it holds a tank, or is an open port that is taken to lead to one. */
function leadsToTank(nets: Nets, net: { readonly tank: boolean; readonly ports: readonly NetPort[] }): boolean {
  return net.tank || net.ports.every(({ port, address }) => port.whenOpen === 'tank' && isOpen(nets, address));
}

function layOut(nets: Nets): Layout & { readonly netOfNode: Int32Array } {
  const netOfNode: number[] = [];
  const nodeOfNet = Int32Array.from(nets.oil, (net, i) => (leadsToTank(nets, net) ? -1 : netOfNode.push(i) - 1));
  return {
    nodeOfNet,
    netOfNode: Int32Array.from(netOfNode),
    shaftOfNet: Int32Array.from(nets.shafts, (_, i) => netOfNode.length + i),
    shared: netOfNode.length + nets.shafts.length,
  };
}

/** Fixed oil volume of every node: lines (half of a line with loss to each end) and dead volumes of components. */
function nodeVolumes(
  document: CircuitDocument,
  nets: Nets,
  layout: Layout,
): { volume: number[]; compliance: Float64Array; notes: Problem[] } {
  const nodes = nets.oil.length - layout.nodeOfNet.filter((node) => node < 0).length;
  const volume = new Array<number>(nodes).fill(0);
  const compliance = new Float64Array(nodes);
  const add = (address: string, line: Line, share: number): void => {
    const node = layout.nodeOfNet[nets.oilNetOf.get(address)!]!;
    if (node < 0) return;
    const amount = share * (line.volume ?? lineVolume(line.length, line.bore));
    volume[node]! += amount;
    if (line.wall !== undefined) compliance[node]! += amount * tubeCompliance(line.bore, line.wall);
  };
  for (const net of nets.oil) for (const line of net.lines) add(addressOf(line.from), line, 1);
  for (const line of nets.lossLines) {
    add(addressOf(line.from), line, 0.5);
    add(addressOf(line.to), line, 0.5);
  }
  for (const { address, component, port } of nets.ports.values()) {
    if (port.medium !== 'oil' || !port.deadVolume) continue;
    const owner = document.components.find((entry) => entry.id === component)!;
    const node = layout.nodeOfNet[nets.oilNetOf.get(address)!]!;
    if (node >= 0) volume[node]! += port.deadVolume(plateOf(owner, kindOf(owner.kind)!));
  }
  const notes: Problem[] = [];
  nets.oil.forEach((net, i) => {
    const node = layout.nodeOfNet[i]!;
    if (node < 0 || volume[node]! >= LEAST_VOLUME) return;
    volume[node] = LEAST_VOLUME;
    const first = net.ports[0] as NetPort;
    if (net.ports.every((port) => port.lines.length === 0)) return;
    notes.push({
      severity: 'assumption',
      code: 'least-volume',
      message: `The oil at ${portInWords(document, { component: first.component, port: first.port.id })} is taken as 1 cm³: its lines give less.`,
      component: first.component,
      port: first.port.id,
    });
  });
  return { volume, compliance, notes };
}

function shaftInertia(document: CircuitDocument, ports: readonly NetPort[]): number {
  let sum = 0;
  for (const { component } of ports) {
    const owner = document.components.find((entry) => entry.id === component)!;
    const kind = kindOf(owner.kind)!;
    sum += kind.inertia?.(plateOf(owner, kind)) ?? 0;
  }
  return sum;
}

function inertias(document: CircuitDocument, nets: Nets): Float64Array {
  return Float64Array.from(nets.shafts, (net) => Math.max(shaftInertia(document, net.ports), LEAST_INERTIA));
}

function inertiaNotes(document: CircuitDocument, nets: Nets): Problem[] {
  return nets.shafts
    .filter((net) => !(shaftInertia(document, net.ports) >= LEAST_INERTIA))
    .map((net) => ({
      severity: 'assumption',
      code: 'least-inertia',
      message: `The shaft at ${portInWords(document, { component: (net.ports[0] as NetPort).component, port: (net.ports[0] as NetPort).port.id })} has next to no inertia; 1 kg·cm² is taken.`,
      component: (net.ports[0] as NetPort).component,
    }));
}

/** What components say about their own values. */
function plateNotes(document: CircuitDocument): Problem[] {
  return document.components.flatMap((component) => {
    const kind = kindOf(component.kind);
    const words = kind?.checks?.(plateOf(component, kind)) ?? [];
    return words.map(
      (message): Problem => ({
        severity: 'caution',
        code: 'plate',
        message: `${nameInWords(component)}: ${message}`,
        component: component.id,
        cure: { label: 'Open the nameplate', action: 'open-nameplate', component: component.id },
      }),
    );
  });
}

function sharedLabels(document: CircuitDocument, nets: Nets, layout: { readonly netOfNode: Int32Array }): StateLabel[] {
  const named = ({ component, port }: NetPort): string => portInWords(document, { component, port: port.id });
  const label = (ports: readonly NetPort[], what: string): StateLabel => ({
    component: (ports[0] as NetPort).component,
    words: `${named(ports[0] as NetPort)} (${what})`,
  });
  return [
    ...Array.from(layout.netOfNode, (net) => label(nets.oil[net]!.ports, 'pressure')),
    ...nets.shafts.map((net) => label(net.ports, 'speed')),
  ];
}

function sourceSlots(nets: Nets, built: Built): Int32Array {
  const slots: number[] = [];
  for (const { address, port } of nets.ports.values()) {
    const slot = built.slotOf.get(address);
    if (port.source && slot !== undefined) slots.push(slot);
  }
  return Int32Array.from(slots);
}
