import { addressOf, type NetPort, type Nets, type OilNet } from './nets.ts';
import type { CircuitDocument, Line } from './schema.ts';

/** How the flow of a line without loss follows from the flows that components push into its net: the sum of `sign` × flow
 *  over the terms, positive from the line's `from` to its `to`. */
export interface LineFlow {
  readonly line: string;
  /** `key` is a port address, or 'line.<id>.from' / 'line.<id>.to' for the end of a line with loss. Flow into the net. */
  readonly terms: readonly { readonly key: string; readonly sign: 1 | -1 }[];
  /** The line closes a ring of lines without loss: how the flow divides is not determined, 0 is shown. */
  readonly chord: boolean;
}

const TANK = 'tank';

/** Point of the drawing at which flows add up: a port, the shared node of a junction, or the reservoir. */
function vertexOf({ address, component, port, kind }: NetPort): string {
  if (kind === 'tank') return TANK;
  return port.node === undefined ? address : `${component} ${port.node}`;
}

interface Edge {
  readonly line: Line;
  readonly from: string;
  readonly to: string;
}

/** Eliminates the tree of every net from its leaves inwards. The tree hangs on the tank if the net has one, else on the point
 *  where most lines meet; what the oil there takes up by compression is not attributed to a line. */
export function lineFlows(document: CircuitDocument, nets: Nets): LineFlow[] {
  const flows = new Map<string, LineFlow>();
  for (const net of nets.oil) for (const flow of netFlows(net, nets)) flows.set(flow.line, flow);
  return document.lines.flatMap((line) => flows.get(line.id) ?? []);
}

function netFlows(net: OilNet, nets: Nets): LineFlow[] {
  if (net.lines.length === 0) return [];
  const injections = new Map<string, string[]>();
  for (const entry of net.ports) {
    const vertex = vertexOf(entry);
    const keys = injections.get(vertex) ?? [];
    keys.push(entry.address);
    for (const line of entry.lines) {
      if (!nets.lossLines.includes(line)) continue;
      if (addressOf(line.from) === entry.address) keys.push(`line.${line.id}.from`);
      if (addressOf(line.to) === entry.address) keys.push(`line.${line.id}.to`);
    }
    injections.set(vertex, keys);
  }
  const vertexAt = (ref: { component: string; port: string }): string => vertexOf(nets.ports.get(addressOf(ref)) as NetPort);
  const edges = net.lines.map((line): Edge => ({ line, from: vertexAt(line.from), to: vertexAt(line.to) }));
  const touching = new Map<string, Edge[]>([...injections.keys()].map((vertex) => [vertex, []]));
  for (const edge of edges) {
    touching.get(edge.from)?.push(edge);
    if (edge.to !== edge.from) touching.get(edge.to)?.push(edge);
  }
  const parent = spanningTree(rootOf(touching), touching);
  const flows: LineFlow[] = [];
  const inTree = new Set<Line>();
  const carried = new Map<string, string[]>([...injections].map(([vertex, keys]) => [vertex, [...keys]]));
  for (const [vertex, edge] of [...parent].reverse()) {
    const keys = carried.get(vertex) as string[];
    const outward = edge.from === vertex;
    carried.get(outward ? edge.to : edge.from)?.push(...keys);
    flows.push({ line: edge.line.id, chord: false, terms: keys.map((key) => ({ key, sign: outward ? 1 : -1 })) });
    inTree.add(edge.line);
  }
  for (const { line } of edges) if (!inTree.has(line)) flows.push({ line: line.id, chord: true, terms: [] });
  return flows;
}

function rootOf(touching: ReadonlyMap<string, readonly Edge[]>): string {
  if (touching.has(TANK)) return TANK;
  let root = '';
  let most = -1;
  for (const [vertex, edges] of touching) {
    if (edges.length > most) {
      root = vertex;
      most = edges.length;
    }
  }
  return root;
}

/** Edge towards the root of every other vertex, in order of discovery (parents before children). */
function spanningTree(root: string, touching: ReadonlyMap<string, readonly Edge[]>): Map<string, Edge> {
  const parent = new Map<string, Edge>();
  const queue = [root];
  for (let next = queue.shift(); next !== undefined; next = queue.shift()) {
    for (const edge of touching.get(next) ?? []) {
      const other = edge.from === next ? edge.to : edge.from;
      if (other === root || parent.has(other)) continue;
      parent.set(other, edge);
      queue.push(other);
    }
  }
  return parent;
}
