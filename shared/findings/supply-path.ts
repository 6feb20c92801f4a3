import type { FindingContext } from './context.ts';

/** Which valve commands a cylinder, and which pumps feed it, read from the drawing. */

interface Neighbour {
  readonly component: string;
  readonly port: string;
}

/** Ports of other components reached from a port through lines, junctions and two-port parts (throttle, filter, check …). */
function reachedFrom(context: FindingContext, start: string): Neighbour[] {
  const ports = context.seen.components.filter((component) => component.kind !== 'junction' && component.kind !== 'tank');
  const found: Neighbour[] = [];
  const seen = new Set<string>();
  const queue = [context.reach.netOf(start)];
  while (queue.length > 0) {
    const net = queue.shift()!;
    if (seen.has(net)) continue;
    seen.add(net);
    for (const component of ports) {
      for (const port of ['P', 'T', 'A', 'B', 'M', 'outlet', 'suction', 'drain']) {
        if (context.reach.netOf(`${component.id}.${port}`) !== net) continue;
        found.push({ component: component.id, port });
        if (isTwoPort(component.kind)) queue.push(context.reach.netOf(`${component.id}.${port === 'A' ? 'B' : 'A'}`));
      }
    }
  }
  return found;
}

function isTwoPort(kind: string): boolean {
  return kind === 'throttle' || kind === 'filter' || kind === 'check-valve' || kind === 'flow-meter';
}

function isDirectional(context: FindingContext, id: string): boolean {
  return context.seen.components.find((component) => component.id === id)?.kind.startsWith('directional-valve') ?? false;
}

/** Direction in which a cylinder is commanded at each row of the run: +1 out, −1 in, 0 not at all. null when its chambers
 *  are on no valve and no pump. A cylinder that a pump feeds without a valve is always commanded. */
export function commandOf(context: FindingContext, cylinder: string): ((index: number) => 1 | 0 | -1) | null {
  const cap = reachedFrom(context, `${cylinder}.A`);
  const valve = cap.find(({ component }) => isDirectional(context, component));
  if (!valve) return cap.some(({ port }) => port === 'outlet') ? () => 1 : null;
  const spool = context.column(`${valve.component}.spool`);
  if (!spool) return null;
  const onA = valve.port === 'A';
  const fourTwo = context.seen.components.find((component) => component.id === valve.component)?.kind === 'directional-valve-4-2';
  return (i) => {
    const value = spool[i]!;
    const way = fourTwo ? (value > 0.9 ? 1 : value < 0.1 ? -1 : 0) : value > 0.9 ? 1 : value < -0.9 ? -1 : 0;
    return (onA ? way : -way) as 1 | 0 | -1;
  };
}

/** Pumps whose outlet pressure can stand on a cylinder. */
export function feedingPumps(context: FindingContext, cylinder: string): string[] {
  const nets = [context.reach.netOf(`${cylinder}.A`), context.reach.netOf(`${cylinder}.B`)];
  return context
    .ofKind('compensated-pump')
    .filter((pump) => {
      const loaded = context.reach.loaded(`${pump.id}.outlet`);
      return nets.some((net) => loaded.has(net));
    })
    .map((pump) => pump.id);
}
