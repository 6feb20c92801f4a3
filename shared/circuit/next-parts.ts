import type { ComponentKind, PortSpec } from '../kinds/kind.ts';
import { kinds } from '../kinds/registry.ts';
import { isOpen } from './edit/joins.ts';
import { findComponent, findKind, findPort, kindOfComponent, portInWords, samePort } from './kind-lookup.ts';
import type { CircuitDocument, PortRef } from './schema.ts';

/** What may follow an open port, by the order in which oil flows. Rules of the trade (common practice, no source): a pump line
 *  reaches a relief first; what comes back goes to tank; a valve's work ports go to an actuator. */
export interface NextPart {
  readonly kind: string;
  readonly word: string;
  /** Port of the new part that is joined. */
  readonly port: string;
  /** The likeliest, marked; exactly one. */
  readonly likely: boolean;
}

export interface NextParts {
  /** 'What follows the pump line?' */
  readonly question: string;
  readonly parts: readonly NextPart[];
}

type Place = 'drive-end' | 'driven-end' | 'suction' | 'drain' | 'pump-line' | 'return' | 'work' | 'actuator' | 'inlet' | 'plain';

const order: Record<Place, readonly string[]> = {
  'drive-end': ['compensated-pump'],
  'driven-end': ['electric-motor'],
  suction: ['filter', 'junction', 'tank'],
  drain: ['filter', 'flow-meter', 'junction', 'tank'],
  'pump-line': [
    'relief-valve',
    'check-valve',
    'filter',
    'flow-meter',
    'pressure-gauge',
    'directional-valve-4-3',
    'directional-valve-4-2',
    'throttle',
    'cylinder',
    'junction',
  ],
  return: ['filter', 'check-valve', 'flow-meter', 'throttle', 'junction', 'tank'],
  work: ['relief-valve', 'check-valve', 'pressure-gauge', 'throttle', 'flow-meter', 'cylinder', 'junction'],
  actuator: ['pressure-gauge', 'throttle', 'check-valve', 'directional-valve-4-3', 'directional-valve-4-2', 'junction', 'tank'],
  inlet: ['compensated-pump', 'check-valve', 'filter', 'directional-valve-4-3', 'throttle', 'junction', 'tank'],
  plain: ['relief-valve', 'check-valve', 'filter', 'pressure-gauge', 'directional-valve-4-3', 'throttle', 'cylinder', 'junction', 'tank'],
};

/** What the strip offers at a port. Only kinds that exist; the likeliest is marked. */
export function nextParts(document: CircuitDocument, ref: PortRef): NextParts {
  const port = findPort(document, ref);
  if (!port) return { question: 'What follows?', parts: [] };
  const fromKind = kindOfComponent(document, ref.component);
  const place = placeOf(document, ref, port);
  const likely = likelyKind(document, ref, place);
  const offered = order[place].flatMap((id) => {
    const kind = findKind(id);
    const entry = kind && entryPort(port, kind, fromKind);
    return kind && entry ? [{ kind: id, word: kind.word, port: entry.id, likely: false }] : [];
  });
  const marked = offered.some((part) => part.kind === likely) ? likely : offered[0]?.kind;
  return { question: questionOf(document, ref, place), parts: offered.map((part) => ({ ...part, likely: part.kind === marked })) };
}

/** A port that is open already and that a person would most likely join to this one: a valve's A to a cylinder's A, a motor's
 *  shaft to a pump that has none; null where there is no such obvious pair. */
export function likelyJoin(document: CircuitDocument, ref: PortRef): PortRef | null {
  const port = findPort(document, ref);
  const kind = kindOfComponent(document, ref.component);
  if (!port || !kind || !isOpen(document, ref)) return null;
  for (const component of document.components) {
    const other = findKind(component.kind);
    if (component.id === ref.component || !other || (other.stage === kind.stage && port.medium === 'oil')) continue;
    for (const entry of other.ports) {
      const match =
        port.medium === 'shaft'
          ? entry.medium === 'shaft' && other.stage !== kind.stage
          : isWorkPort(kind, port) && isWorkPort(other, entry) && entry.letter === port.letter;
      if (match && isOpen(document, { component: component.id, port: entry.id })) return { component: component.id, port: entry.id };
    }
  }
  return null;
}

/** Every kind that has a port of the same medium, in the registry's order: behind "all parts". */
export function allNextParts(document: CircuitDocument, ref: PortRef): NextPart[] {
  const port = findPort(document, ref);
  if (!port) return [];
  const fromKind = kindOfComponent(document, ref.component);
  return kinds.flatMap((kind) => {
    const entry = entryPort(port, kind, fromKind);
    return entry ? [{ kind: kind.id, word: kind.word, port: entry.id, likely: false }] : [];
  });
}

/** Port of a new part that an open port would be joined to: the counterpart in flow direction; between the work ports of a
 *  valve and an actuator the one with the same letter. */
export function entryPort(from: PortSpec, kind: ComponentKind, fromKind: ComponentKind | undefined): PortSpec | undefined {
  const ports = kind.ports.filter((port) => port.medium === from.medium);
  if (fromKind && isWorkPort(fromKind, from)) {
    const same = ports.find((port) => port.letter === from.letter && isWorkPort(kind, port));
    if (same) return same;
  }
  const wanted = from.role === 'inlet' ? ['outlet', 'either', 'inlet'] : ['inlet', 'either', 'outlet'];
  for (const role of wanted) {
    const found = ports.find((port) => port.role === role);
    if (found) return found;
  }
  return ports[0];
}

/** Ports A and B of an actuator or of a valve that also has P and T. */
function isWorkPort(kind: ComponentKind, port: PortSpec): boolean {
  if (port.letter !== 'A' && port.letter !== 'B') return false;
  return kind.stage === 'act' || ['P', 'T'].every((letter) => kind.ports.some((entry) => entry.letter === letter));
}

function placeOf(document: CircuitDocument, ref: PortRef, port: PortSpec): Place {
  const kind = findKind(findComponent(document, ref.component)?.kind ?? '');
  if (port.medium === 'shaft') return kind?.stage === 'drive' ? 'drive-end' : 'driven-end';
  if (port.role === 'drain') return 'drain';
  if (kind?.stage === 'pump' && port.role === 'inlet') return 'suction';
  const upstream = upstreamOf(document, ref);
  if (upstream.pump) return 'pump-line';
  if (kind?.stage === 'act') return 'actuator';
  if (port.letter === 'T' && kind?.stage !== 'return') return 'return';
  if (upstream.return) return 'return';
  if (upstream.work || (kind?.stage === 'direct' && port.role === 'either')) return 'work';
  if (upstream.actuator) return 'actuator';
  return port.role === 'inlet' ? 'inlet' : 'plain';
}

interface Upstream {
  readonly pump: boolean;
  readonly return: boolean;
  readonly work: boolean;
  readonly actuator: boolean;
  readonly relief: boolean;
  readonly valve: boolean;
}

/** What hangs on the same line: walks lines, junctions and parts oil simply passes through (check, filter, meter, throttle). */
function upstreamOf(document: CircuitDocument, start: PortRef): Upstream {
  const found = { pump: false, return: false, work: false, actuator: false, relief: false, valve: false };
  const seen = new Set<string>();
  const queue: PortRef[] = [start];
  for (let ref = queue.shift(); ref; ref = queue.shift()) {
    const key = `${ref.component}.${ref.port}`;
    if (seen.has(key)) continue;
    seen.add(key);
    const kind = findKind(findComponent(document, ref.component)?.kind ?? '');
    const port = findPort(document, ref);
    if (!kind || !port) continue;
    if (port.source) found.pump = true;
    if (kind.id === 'relief-valve' && port.letter === 'P') found.relief = true;
    if (kind.stage === 'direct' && kind.ports.length > 2 && port.letter === 'P') found.valve = true;
    if (kind.stage === 'direct' && kind.ports.length > 2 && port.role === 'either') found.work = true;
    if (port.letter === 'T' && port.role !== 'inlet') found.return = true;
    if (kind.stage === 'act') found.actuator = true;
    const oil = kind.ports.filter((entry) => entry.medium === 'oil');
    const passes = oil.length === 2 && kind.id !== 'relief-valve' && kind.stage !== 'act';
    for (const other of oil) {
      if (passes || (other.node !== undefined && other.node === port.node)) queue.push({ component: ref.component, port: other.id });
    }
    for (const line of document.lines) {
      if (samePort(line.from, ref)) queue.push(line.to);
      else if (samePort(line.to, ref)) queue.push(line.from);
    }
  }
  return found;
}

function likelyKind(document: CircuitDocument, ref: PortRef, place: Place): string {
  const around = upstreamOf(document, ref);
  if (place === 'drive-end') return 'compensated-pump';
  if (place === 'driven-end') return 'electric-motor';
  if (place === 'suction' || place === 'drain' || place === 'return') return 'tank';
  // At the pump itself first a junction's worth of protection, then the valve that directs.
  if (place === 'pump-line') return !around.relief ? 'relief-valve' : !around.valve ? 'directional-valve-4-3' : 'pressure-gauge';
  if (place === 'work') return around.actuator ? 'pressure-gauge' : 'cylinder';
  if (place === 'actuator') return 'directional-valve-4-3';
  return place === 'inlet' ? 'compensated-pump' : 'junction';
}

function questionOf(document: CircuitDocument, ref: PortRef, place: Place): string {
  const component = findComponent(document, ref.component);
  const end = component?.kind === 'junction' ? 'this junction' : portInWords(document, ref);
  if (place === 'drive-end') return `What does ${component?.name ?? 'it'} drive?`;
  if (place === 'driven-end') return `What drives ${component?.name ?? 'it'}?`;
  if (place === 'pump-line') return 'What follows the pump line?';
  if (place === 'suction') return `Where does ${component?.name ?? 'the pump'} draw from?`;
  if (place === 'drain') return 'Where does the case drain go?';
  if (place === 'return') return 'Where does the return line go?';
  if (place === 'inlet') return `What feeds ${end}?`;
  return `What follows ${end}?`;
}
