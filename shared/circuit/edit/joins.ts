import { sameNode } from '../check-references.ts';
import { findPort, kindOfComponent, portInWords, samePort } from '../kind-lookup.ts';
import type { CircuitDocument, Line, PortRef, Shaft } from '../schema.ts';
import { addComponent, type Point } from './components.ts';
import { freeId } from './ids.ts';

/** Joining ports: oil ports by a line, shaft ends by a shaft. */

/** A new line until someone says otherwise: one metre of 16 mm bore, loss off (common practice, no source). */
export const typicalLine = { length: 1, bore: 0.016 } as const;

export function lineAt(document: CircuitDocument, ref: PortRef): Line | undefined {
  return document.lines.find((line) => samePort(line.from, ref) || samePort(line.to, ref));
}

export function shaftAt(document: CircuitDocument, ref: PortRef): Shaft | undefined {
  return document.shafts.find((shaft) => shaft.members.some((member) => samePort(member, ref)));
}

export function isOpen(document: CircuitDocument, ref: PortRef): boolean {
  return lineAt(document, ref) === undefined && shaftAt(document, ref) === undefined;
}

/** Why two ports cannot be joined, in words; null when they can. A taken oil port can: the join branches off its line. */
export function joinProblem(document: CircuitDocument, a: PortRef, b: PortRef): string | null {
  const from = findPort(document, a);
  const to = findPort(document, b);
  if (!from || !to) return 'That port is not on the drawing.';
  if (samePort(a, b)) return 'A port cannot be joined to itself.';
  if (from.medium !== to.medium) {
    const [oil, shaft] = from.medium === 'oil' ? [a, b] : [b, a];
    return `${portInWords(document, oil)} carries oil, ${portInWords(document, shaft)} turns: they cannot be joined.`;
  }
  if (a.component === b.component && from.medium === 'shaft') return 'A shaft cannot be joined to itself.';
  if (sameNode(document, a, b)) return 'Both ends are on the same junction.';
  if (from.medium === 'shaft') {
    const shaft = shaftAt(document, a);
    return shaft && shaft === shaftAt(document, b) ? 'They are on one shaft already.' : null;
  }
  const line = lineAt(document, a);
  return line && line === lineAt(document, b) ? 'They are joined already.' : null;
}

/** The port itself, or, where it has a line already, an open port of the same node (a junction's next arm). */
export function openArm(document: CircuitDocument, ref: PortRef): PortRef {
  const node = findPort(document, ref)?.node;
  if (node === undefined || !lineAt(document, ref)) return ref;
  const arms = kindOfComponent(document, ref.component)?.ports.filter((port) => port.node === node) ?? [];
  const arm = arms.find((port) => isOpen(document, { component: ref.component, port: port.id }));
  return arm ? { component: ref.component, port: arm.id } : ref;
}

/** Joins two ports. An end that already has a line is branched with a junction put at `branchAt` (top-left, modules).
 *  Nothing changes, and `problem` says why, when they cannot be joined. */
export function connect(
  document: CircuitDocument,
  fromPort: PortRef,
  toPort: PortRef,
  branchAt: Point = { x: 0, y: 0 },
): { document: CircuitDocument; lineId: string | null; problem: string | null } {
  // Callers may hand over richer objects; the document holds the reference alone.
  const from = { component: fromPort.component, port: fromPort.port };
  const to = { component: toPort.component, port: toPort.port };
  const problem = joinProblem(document, from, to);
  if (problem) return { document, lineId: null, problem };
  if (findPort(document, from)?.medium === 'shaft') return { document: joinShaft(document, from, to), lineId: null, problem: null };
  let current = document;
  const ends = [openArm(document, from), openArm(document, to)].map((ref) => {
    const taken = lineAt(current, ref);
    if (!taken) return ref;
    const split = splitLine(current, taken.id, branchAt, samePort(taken.from, ref) ? 0.1 : 0.9);
    if (!split.junctionId) return null;
    current = split.document;
    return { component: split.junctionId, port: 'c' };
  });
  const [a, b] = ends;
  if (!a || !b) return { document, lineId: null, problem: 'The sheet is full: no room for a junction.' };
  if (current.lines.length >= 400) return { document, lineId: null, problem: 'The sheet is full: at most 400 lines.' };
  const line: Line = { id: freeId(current, 'l'), from: a, to: b, route: [], ...typicalLine, loss: false };
  return { document: { ...current, lines: [...current.lines, line] }, lineId: line.id, problem: null };
}

function joinShaft(document: CircuitDocument, a: PortRef, b: PortRef): CircuitDocument {
  const first = shaftAt(document, a);
  const second = shaftAt(document, b);
  const members = [...(first?.members ?? [a]), ...(second?.members ?? [b])];
  const joined: Shaft = { id: first?.id ?? second?.id ?? freeId(document, 'shaft'), members };
  const rest = document.shafts.filter((shaft) => shaft !== first && shaft !== second);
  return { ...document, shafts: [...rest, joined] };
}

/** Cuts a line in two with a junction between. `share` of its length, volume and loss stays before the junction, in the
 *  document and in every case; `bendsBefore` of its bends too. The first piece keeps the line's id. */
export function splitLine(
  document: CircuitDocument,
  lineId: string,
  at: Point,
  share = 0.5,
  bendsBefore = 0,
): { document: CircuitDocument; junctionId: string | null } {
  const line = document.lines.find((entry) => entry.id === lineId);
  if (!line || document.lines.length >= 400) return { document, junctionId: null };
  const added = addComponent(document, 'junction', at);
  const junctionId = added.componentId;
  if (!junctionId) return { document, junctionId: null };
  const before = Math.min(0.99, Math.max(0.01, share));
  const part = (factor: number) => ({
    length: line.length * factor,
    ...(line.volume === undefined ? {} : { volume: line.volume * factor }),
    ...(line.laminar === undefined ? {} : { laminar: line.laminar * factor }),
    ...(line.quadratic === undefined ? {} : { quadratic: line.quadratic * factor }),
  });
  const first: Line = { ...line, ...part(before), to: { component: junctionId, port: 'a' }, route: line.route.slice(0, bendsBefore) };
  const secondId = freeId(added.document, 'l');
  const second: Line = {
    ...line,
    ...part(1 - before),
    id: secondId,
    from: { component: junctionId, port: 'b' },
    route: line.route.slice(bendsBefore),
  };
  const lines = added.document.lines.flatMap((entry) => (entry.id === lineId ? [first, second] : [entry]));
  const shared = ['length', 'volume', 'laminar', 'quadratic'];
  const cases = added.document.cases.map((entry) => {
    if (!entry.changes.some((change) => change.target === lineId)) return entry;
    const changes = entry.changes.flatMap((change) => {
      if (change.target !== lineId) return [change];
      const scaled = (factor: number) =>
        shared.includes(change.field) && typeof change.value === 'number'
          ? { target: change.target, field: change.field, value: change.value * factor }
          : change;
      return [scaled(before), { ...scaled(1 - before), target: secondId }];
    });
    return { ...entry, changes };
  });
  return { document: { ...added.document, lines, cases }, junctionId };
}

/** Drops a port's line end on a line: splits it with a junction and joins the port to it. */
export function connectToLine(
  document: CircuitDocument,
  from: PortRef,
  lineId: string,
  at: Point,
  share = 0.5,
  bendsBefore = 0,
): { document: CircuitDocument; junctionId: string | null; problem: string | null } {
  const port = findPort(document, from);
  if (port?.medium !== 'oil') {
    return { document, junctionId: null, problem: `${portInWords(document, from)} turns: it cannot be joined to an oil line.` };
  }
  const own = lineAt(document, from);
  if (own) return { document, junctionId: null, problem: own.id === lineId ? 'They are joined already.' : 'That port already has a line.' };
  const split = splitLine(document, lineId, at, share, bendsBefore);
  if (!split.junctionId) return { document, junctionId: null, problem: 'The sheet is full: no room for a junction.' };
  const joined = connect(split.document, from, { component: split.junctionId, port: 'c' });
  if (joined.problem) return { document, junctionId: null, problem: joined.problem };
  return { document: joined.document, junctionId: split.junctionId, problem: null };
}

/** Takes one end out of its shaft; a shaft with one member left is gone. */
export function leaveShaft(document: CircuitDocument, ref: PortRef): CircuitDocument {
  const shaft = shaftAt(document, ref);
  if (!shaft) return document;
  const members = shaft.members.filter((member) => !samePort(member, ref));
  const shafts = document.shafts.flatMap((entry) => (entry !== shaft ? [entry] : members.length < 2 ? [] : [{ ...entry, members }]));
  return { ...document, shafts };
}
