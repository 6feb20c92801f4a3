import type { PortSpec } from '../kinds/kind.ts';
import { kindOf } from '../kinds/registry.ts';
import type { CircuitDocument, Line, PortRef } from './schema.ts';

/** Hydraulic nets and shaft nets of a drawing. A hydraulic net is what lines without loss and junctions join: one pressure.
 *  A line with loss separates two nets. Ports and lines that do not exist or do not fit are left out (compiling names them). */

/** 'component.port' of a port. */
export function addressOf(ref: PortRef): string {
  return `${ref.component}.${ref.port}`;
}

export interface NetPort {
  readonly address: string;
  readonly component: string;
  readonly port: PortSpec;
  /** Kind id of the component. */
  readonly kind: string;
  /** Lines joined here (more than one is an error of the drawing). */
  readonly lines: readonly Line[];
}

export interface OilNet {
  /** Smallest port address. */
  readonly id: string;
  readonly ports: readonly NetPort[];
  /** Holds a tank: its pressure is fixed at zero. */
  readonly tank: boolean;
  /** Lines without loss inside the net. */
  readonly lines: readonly Line[];
}

export interface ShaftNet {
  readonly id: string;
  readonly ports: readonly NetPort[];
}

export interface Nets {
  readonly oil: readonly OilNet[];
  readonly shafts: readonly ShaftNet[];
  /** Index into `oil` by port address. */
  readonly oilNetOf: ReadonlyMap<string, number>;
  /** Index into `shafts` by port address. */
  readonly shaftNetOf: ReadonlyMap<string, number>;
  /** Every port of every component of a known kind, by address. */
  readonly ports: ReadonlyMap<string, NetPort>;
  /** Lines with loss whose ends exist and are oil. */
  readonly lossLines: readonly Line[];
}

class Groups {
  private readonly parent = new Map<string, string>();

  add(key: string): void {
    if (!this.parent.has(key)) this.parent.set(key, key);
  }

  root(key: string): string {
    let at = key;
    for (let up = this.parent.get(at) as string; up !== at; up = this.parent.get(at) as string) {
      this.parent.set(at, this.parent.get(up) as string);
      at = up;
    }
    return at;
  }

  join(a: string, b: string): void {
    this.parent.set(this.root(a), this.root(b));
  }
}

function collectPorts(document: CircuitDocument): Map<string, NetPort> {
  const linesAt = new Map<string, Line[]>();
  for (const line of document.lines) {
    for (const end of [line.from, line.to]) {
      const address = addressOf(end);
      const there = linesAt.get(address);
      if (there) there.push(line);
      else linesAt.set(address, [line]);
    }
  }
  const ports = new Map<string, NetPort>();
  for (const component of document.components) {
    for (const port of kindOf(component.kind)?.ports ?? []) {
      const address = `${component.id}.${port.id}`;
      ports.set(address, { address, component: component.id, port, kind: component.kind, lines: linesAt.get(address) ?? [] });
    }
  }
  return ports;
}

/** Ports sorted into groups, each group's ports by address, groups by their smallest address. */
function grouped(ports: readonly NetPort[], groups: Groups): NetPort[][] {
  const byRoot = new Map<string, NetPort[]>();
  for (const port of ports) {
    const root = groups.root(port.address);
    const there = byRoot.get(root);
    if (there) there.push(port);
    else byRoot.set(root, [port]);
  }
  const result = [...byRoot.values()];
  for (const group of result) group.sort((a, b) => (a.address < b.address ? -1 : 1));
  return result.sort((a, b) => ((a[0] as NetPort).address < (b[0] as NetPort).address ? -1 : 1));
}

function indexOf(nets: readonly { readonly ports: readonly NetPort[] }[]): Map<string, number> {
  const index = new Map<string, number>();
  nets.forEach((net, i) => {
    for (const port of net.ports) index.set(port.address, i);
  });
  return index;
}

/** Sorts a drawing's ports into nets. */
export function findNets(document: CircuitDocument): Nets {
  const ports = collectPorts(document);
  const oilPorts = [...ports.values()].filter((entry) => entry.port.medium === 'oil');
  const shaftPorts = [...ports.values()].filter((entry) => entry.port.medium === 'shaft');

  const groups = new Groups();
  for (const port of ports.values()) groups.add(port.address);
  const shared = new Map<string, string>();
  for (const { address, component, port } of oilPorts) {
    if (port.node === undefined) continue;
    const key = `${component} ${port.node}`;
    const first = shared.get(key);
    if (first === undefined) shared.set(key, address);
    else groups.join(first, address);
  }
  const isOil = (ref: PortRef): boolean => ports.get(addressOf(ref))?.port.medium === 'oil';
  const fitting = document.lines.filter((line) => isOil(line.from) && isOil(line.to));
  for (const line of fitting) if (!line.loss) groups.join(addressOf(line.from), addressOf(line.to));
  for (const shaft of document.shafts) {
    const members = shaft.members.filter((member) => ports.get(addressOf(member))?.port.medium === 'shaft');
    for (const member of members.slice(1)) groups.join(addressOf(members[0] as PortRef), addressOf(member));
  }

  const oilGroups = grouped(oilPorts, groups);
  const oilNetOf = indexOf(oilGroups.map((group) => ({ ports: group })));
  const oil = oilGroups.map(
    (group, i): OilNet => ({
      id: (group[0] as NetPort).address,
      ports: group,
      tank: group.some((port) => port.kind === 'tank'),
      lines: fitting.filter((line) => !line.loss && oilNetOf.get(addressOf(line.from)) === i),
    }),
  );
  const shafts = grouped(shaftPorts, groups).map((group): ShaftNet => ({ id: (group[0] as NetPort).address, ports: group }));
  return { oil, shafts, oilNetOf, shaftNetOf: indexOf(shafts), ports, lossLines: fitting.filter((line) => line.loss) };
}

/** Nothing is joined to this port: no line (or shaft partner), and no fellow port of its node has one. */
export function isOpen(nets: Nets, address: string): boolean {
  const port = nets.ports.get(address);
  if (!port) return false;
  if (port.port.medium === 'shaft') return (nets.shafts[nets.shaftNetOf.get(address) ?? -1]?.ports.length ?? 0) < 2;
  return port.lines.length === 0;
}
