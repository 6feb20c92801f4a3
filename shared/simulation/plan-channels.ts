import { nameInWords } from '../circuit/kind-lookup.ts';
import { type LineFlow, lineFlows } from '../circuit/line-flows.ts';
import { addressOf, type Nets } from '../circuit/nets.ts';
import type { CircuitDocument, Line } from '../circuit/schema.ts';
import { kindOf } from '../kinds/registry.ts';
import type { BlockPair, ChannelPlan, Column } from './circuit.ts';
import type { Problem } from './result.ts';

export interface Planned {
  readonly columns: Column[];
  readonly channels: ChannelPlan[];
  readonly notes: Problem[];
}

const nothing: Column = { kind: 'nothing', at: 0, instance: 0, reading: 0, terms: [] };

/** Ports whose flow no kernel computes: it is that of the line joined to them. */
function followsLine(kind: string, node: string | undefined): boolean {
  return kind === 'tank' || node !== undefined;
}

/** Lists what a run records: pressure and flow of every oil port, every reading, the flow of every line. Ports of one net
 *  share one column. */
export function planChannels(
  document: CircuitDocument,
  nets: Nets,
  blocks: readonly BlockPair[],
  nodeOfNet: Int32Array,
  slotOf: ReadonlyMap<string, number>,
): Planned {
  const columns: Column[] = [nothing];
  const channels: ChannelPlan[] = [];
  const add = (column: Column): number => columns.push(column) - 1;
  const notes: Problem[] = [];

  const pressureColumn = nets.oil.map((_, net) => (nodeOfNet[net]! < 0 ? 0 : add({ ...nothing, kind: 'pressure', at: nodeOfNet[net]! })));
  const lineColumn = new Map<string, number>();
  for (const flow of lineFlows(document, nets)) {
    lineColumn.set(flow.line, flow.chord ? 0 : add({ ...nothing, kind: 'line', terms: termsOf(flow, slotOf) }));
    if (flow.chord) notes.push(ringNote(flow.line));
  }
  for (const line of nets.lossLines) lineColumn.set(line.id, add({ ...nothing, kind: 'flow', at: slotOf.get(`line.${line.id}.from`)! }));

  const readingAt = new Map<string, { pair: number; instance: number }>();
  blocks.forEach(({ block }, pair) => {
    block.componentIds.forEach((id, instance) => {
      readingAt.set(id, { pair, instance });
    });
  });
  for (const component of document.components) {
    const kind = kindOf(component.kind);
    if (!kind) continue;
    const name = nameInWords(component);
    for (const port of kind.ports) {
      if (port.medium !== 'oil') continue;
      const address = `${component.id}.${port.id}`;
      const words = port.label.charAt(0).toLowerCase() + port.label.slice(1);
      channels.push({
        address: `${address}.pressure`,
        label: `${name} ${words} pressure`,
        quantity: 'pressure',
        column: pressureColumn[nets.oilNetOf.get(address)!]!,
      });
      const column = followsLine(kind.id, port.node)
        ? endOfLine(nets.ports.get(address)?.lines[0], address, lineColumn, columns)
        : add({ ...nothing, kind: 'flow', at: slotOf.get(address)! });
      channels.push({ address: `${address}.flow`, label: `${name} ${words} flow`, quantity: 'flow', column });
    }
    const at = readingAt.get(component.id);
    kind.readings.forEach((reading, r) => {
      if (!at) return;
      channels.push({
        address: `${component.id}.${reading.id}`,
        label: `${name} ${reading.label.charAt(0).toLowerCase()}${reading.label.slice(1)}`,
        quantity: reading.quantity,
        column: add({ ...nothing, kind: 'reading', at: at.pair, instance: at.instance, reading: r }),
      });
    });
  }
  for (const line of document.lines) {
    const column = lineColumn.get(line.id);
    if (column !== undefined) channels.push({ address: `line.${line.id}.flow`, label: `line ${line.id} flow`, quantity: 'flow', column });
  }
  return { columns, channels, notes };
}

function termsOf(flow: LineFlow, slotOf: ReadonlyMap<string, number>): { slot: number; sign: number }[] {
  return flow.terms.flatMap(({ key, sign }) => {
    const slot = slotOf.get(key);
    return slot === undefined ? [] : [{ slot, sign }];
  });
}

/** Column of the flow into a port through the line joined to it. */
function endOfLine(line: Line | undefined, address: string, lineColumn: ReadonlyMap<string, number>, columns: Column[]): number {
  const at = line && lineColumn.get(line.id);
  if (!line || at === undefined || at === 0) return 0;
  const column = columns[at] as Column;
  const inward = addressOf(line.to) === address;
  if (column.kind === 'flow') {
    // A line element pushes −Q into its 'from' node; the 'flow' column turns that round to +Q.
    return inward ? at : columns.push({ ...column, kind: 'line', terms: [{ slot: column.at, sign: 1 }] }) - 1;
  }
  if (inward) return at;
  return columns.push({ ...column, terms: column.terms.map(({ slot, sign }) => ({ slot, sign: -sign })) }) - 1;
}

function ringNote(line: string): Problem {
  return {
    severity: 'assumption',
    code: 'line-ring',
    message: `Line ${line} closes a ring of lines without loss: how the flow divides between them is not determined. Its flow is shown as 0; switch its loss on to have it computed.`,
    line,
  };
}
