import { nameInWords, portInWords } from '../circuit/kind-lookup.ts';
import { addressOf, isOpen, type NetPort, type Nets } from '../circuit/nets.ts';
import { netsReached, waysBetweenNets } from '../circuit/reach.ts';
import type { CircuitDocument, Component, PortRef } from '../circuit/schema.ts';
import { kindOf } from '../kinds/registry.ts';
import type { Problem } from './result.ts';

/** What is wrong or taken for granted about how a circuit is joined up, each in words with a cure. Nothing is repaired. */

/** 'the relief V2' */
function called(component: Component): string {
  const word = kindOf(component.kind)?.word.toLowerCase();
  return word && component.name ? `the ${word} ${component.name}` : `the ${nameInWords(component).toLowerCase()}`;
}

function Called(component: Component): string {
  const words = called(component);
  return words.charAt(0).toUpperCase() + words.slice(1);
}

/** References that lead nowhere, doubled ports and unlike media. */
export function joiningProblems(document: CircuitDocument, nets: Nets): Problem[] {
  const problems: Problem[] = [];
  if (document.components.length === 0) {
    problems.push({
      severity: 'problem',
      code: 'empty-circuit',
      message: 'There is nothing on the sheet yet. Place a pump, its motor and a tank to begin.',
    });
  }
  for (const component of document.components) {
    if (kindOf(component.kind)) continue;
    problems.push({
      severity: 'problem',
      code: 'unknown-kind',
      message: `${component.name || component.id} is a "${component.kind}": this version knows no such component.`,
      component: component.id,
    });
  }
  for (const line of document.lines) {
    const cure = { label: 'Delete the line', action: 'delete-line', line: line.id } as const;
    const ends = [line.from, line.to];
    const missing = ends.filter((end) => !nets.ports.has(addressOf(end)));
    for (const end of missing) {
      problems.push({
        severity: 'problem',
        code: 'unknown-port',
        message: `Line ${line.id} ends at ${addressOf(end)}, which does not exist.`,
        line: line.id,
        cure,
      });
    }
    if (missing.length > 0) continue;
    if (addressOf(line.from) === addressOf(line.to)) {
      problems.push({
        severity: 'problem',
        code: 'line-to-itself',
        message: `Line ${line.id} joins ${portInWords(document, line.from)} to itself.`,
        line: line.id,
        cure,
      });
    }
    const shaft = ends.find((end) => nets.ports.get(addressOf(end))?.port.medium === 'shaft');
    if (shaft) {
      problems.push({
        severity: 'problem',
        code: 'unlike-media',
        message: `Line ${line.id} joins oil to a shaft at ${portInWords(document, shaft)}. A line carries oil only.`,
        component: shaft.component,
        port: shaft.port,
        line: line.id,
        cure,
      });
    }
  }
  problems.push(...doubledPorts(document, nets), ...shaftProblems(document, nets));
  return problems;
}

function doubledPorts(document: CircuitDocument, nets: Nets): Problem[] {
  const problems: Problem[] = [];
  for (const { component, port, lines } of nets.ports.values()) {
    if (lines.length < 2 || (lines.length === 2 && lines[0] === lines[1])) continue;
    const last = lines[lines.length - 1]!;
    problems.push({
      severity: 'problem',
      code: 'port-joined-twice',
      message: `${portInWords(document, { component, port: port.id })} is joined by ${lines.length} lines. A port takes one line; put a junction where lines branch.`,
      component,
      port: port.id,
      line: last.id,
      cure: { label: 'Delete the later line', action: 'delete-line', line: last.id },
    });
  }
  return problems;
}

function shaftProblems(document: CircuitDocument, nets: Nets): Problem[] {
  const problems: Problem[] = [];
  const seen = new Set<string>();
  for (const shaft of document.shafts) {
    for (const member of shaft.members) {
      const address = addressOf(member);
      const entry = nets.ports.get(address);
      const where = { component: member.component, port: member.port };
      if (!entry) {
        problems.push({
          severity: 'problem',
          code: 'unknown-port',
          message: `Shaft ${shaft.id} names ${address}, which does not exist.`,
          ...where,
        });
      } else if (entry.port.medium === 'oil') {
        problems.push({
          severity: 'problem',
          code: 'unlike-media',
          message: `Shaft ${shaft.id} joins ${portInWords(document, member)}, which carries oil.`,
          ...where,
        });
      } else if (seen.has(address)) {
        problems.push({
          severity: 'problem',
          code: 'shaft-joined-twice',
          message: `${portInWords(document, member)} is joined to itself or to two shafts. A shaft end takes one coupling.`,
          ...where,
        });
      }
      seen.add(address);
    }
  }
  return problems;
}

/** Open ports: a problem or an assumption, as the kind says. */
export function openPorts(document: CircuitDocument, nets: Nets): Problem[] {
  const problems: Problem[] = [];
  for (const entry of nets.ports.values()) {
    if (!isOpen(nets, entry.address)) continue;
    const component = document.components.find(({ id }) => id === entry.component);
    if (component) problems.push(...openPort(document, component, entry));
  }
  return problems;
}

function openPort(document: CircuitDocument, component: Component, entry: NetPort): Problem[] {
  const ref: PortRef = { component: component.id, port: entry.port.id };
  const words = portInWords(document, ref);
  if (component.kind === 'relief-valve' && entry.port.role === 'outlet') return [noWayToTank(component, entry.port.id)];
  if (entry.port.whenOpen === 'plugged') return [];
  if (entry.port.whenOpen === 'tank') {
    return [
      {
        severity: 'assumption',
        code: 'open-to-tank',
        message: `${words} is not joined; it is taken to lead straight to tank.`,
        ...ref,
        cure: { label: 'Draw the line to tank', action: 'add-tank', ...ref },
      },
    ];
  }
  const problem = (code: string, message: string, label: string, action: 'add-drive' | 'join'): Problem[] => [
    { severity: 'problem', code, message, ...ref, cure: { label, action, ...ref } },
  ];
  if (entry.port.medium === 'shaft') {
    return entry.port.role === 'outlet'
      ? problem('drives-nothing', `${Called(component)} drives nothing: its shaft is not coupled.`, 'Couple it', 'join')
      : problem('no-drive', `${Called(component)} has no drive: nothing turns its shaft.`, 'Add a motor', 'add-drive');
  }
  return problem('open-port', `${words} is open: nothing is joined to it.`, 'Join it', 'join');
}

/** A relief that passes nowhere protects nothing: never taken for granted, whatever its kind says about open ports. */
function noWayToTank(component: Component, port: string): Problem {
  return {
    severity: 'problem',
    code: 'relief-no-tank',
    message: `${Called(component)} has no way to tank.`,
    component: component.id,
    port,
    cure: { label: 'Join it to a tank here', action: 'add-tank', component: component.id, port },
  };
}

/** Reliefs whose joined outlet leads to no tank. */
export function tankProblems(document: CircuitDocument, nets: Nets): Problem[] {
  const ways = waysBetweenNets(document, nets);
  const problems: Problem[] = [];
  const leadsToTank = (address: string): boolean => {
    const start = nets.oilNetOf.get(address);
    return start === undefined || [...netsReached(start, ways)].some((net) => nets.oil[net]?.tank);
  };
  for (const component of document.components) {
    const outlet = component.kind === 'relief-valve' ? kindOf(component.kind)?.ports.find((port) => port.role === 'outlet') : undefined;
    if (!outlet) continue;
    const address = `${component.id}.${outlet.id}`;
    if (isOpen(nets, address) || leadsToTank(address)) continue;
    problems.push(noWayToTank(component, outlet.id));
  }
  return problems;
}
