import type { CircuitDocument, Command, Component, Line, ParameterValue } from '#shared/circuit/schema.ts';
import type { ComponentKind, NumberParameter } from '#shared/kinds/kind.ts';
import { kindOf } from '#shared/kinds/registry.ts';

/** Seeded random circuits of every kind this version knows: one drive and pump, a relief, branches with valves, cylinders,
 *  throttles, filters, gauges and meters, values spread over decades, a duty with commands, loads and faults. */

/** Repeatable numbers in [0, 1). */
export function randomSequence(seed: number): () => number {
  let a = (seed * 2654435761) >>> 0;
  return () => {
    a = (a + 0x6d2b79f5) >>> 0;
    let t = a;
    t = Math.imul(t ^ (t >>> 15), t | 1);
    t ^= t + Math.imul(t ^ (t >>> 7), t | 61);
    return ((t ^ (t >>> 14)) >>> 0) / 4294967296;
  };
}

class Builder {
  readonly components: Component[] = [];
  readonly lines: Line[] = [];
  readonly commands: Command[] = [];
  private readonly next: () => number;
  /** How wild values are: decades around the typical value. */
  private readonly decades: number;
  readonly duration: number;

  constructor(seed: number) {
    this.next = randomSequence(seed);
    this.decades = this.between(0.1, 1.2);
    this.duration = this.between(1, 4);
  }

  chance(share: number): boolean {
    return this.next() < share;
  }

  between(low: number, high: number): number {
    return low + (high - low) * this.next();
  }

  pick<T>(list: readonly T[]): T {
    return list[Math.floor(this.next() * list.length)] as T;
  }

  private number(spec: NumberParameter): number | null {
    if (spec.group === 'raw') return this.chance(0.03) ? this.logBetween(spec) : null;
    if (!this.chance(0.5)) return null;
    if (spec.initial === null) return null;
    if (spec.initial <= 0) return spec.min < 0 ? this.between(spec.min, spec.max) * this.pick([0, 1e-5, 1e-4]) : spec.initial;
    const value = spec.initial * 10 ** this.between(-this.decades, this.decades);
    return Math.min(spec.max, Math.max(spec.min, value));
  }

  private logBetween(spec: NumberParameter): number {
    const low = Math.max(spec.min, spec.max * 1e-8);
    return low * (spec.max / low) ** this.next();
  }

  private parameters(kind: ComponentKind): Record<string, ParameterValue> {
    const values: Record<string, ParameterValue> = {};
    for (const spec of kind.parameters) {
      if (spec.type === 'choice') {
        if (this.chance(0.4)) values[spec.id] = { value: this.pick(spec.choices).value, source: 'typed' };
        continue;
      }
      const value = this.number(spec);
      if (value !== null) values[spec.id] = { value, source: 'typed' };
    }
    for (const fault of kind.faults) {
      if (this.chance(0.04)) values[`fault.${fault.id}`] = { value: this.pick([0.3, 1]), source: 'typed' };
    }
    return values;
  }

  add(kindId: string, change: Record<string, number | string> = {}): string {
    const kind = kindOf(kindId);
    if (!kind) throw new Error(`no kind ${kindId}`);
    const id = `${kind.letter || 'J'}${this.components.length + 1}`;
    const parameters = this.parameters(kind);
    for (const [name, value] of Object.entries(change)) parameters[name] = { value, source: 'typed' };
    this.components.push({
      id,
      kind: kindId,
      kindVersion: kind.version,
      name: id,
      at: { x: 6 * this.components.length, y: 0 },
      turn: 0,
      mirror: false,
      parameters,
    });
    return id;
  }

  join(from: string, to: string, lossShare = 0.25): void {
    const [a = '', pa = ''] = from.split('.');
    const [b = '', pb = ''] = to.split('.');
    this.lines.push({
      id: `l${this.lines.length + 1}`,
      from: { component: a, port: pa },
      to: { component: b, port: pb },
      route: [],
      length: this.between(0, 4),
      bore: this.pick([0.006, 0.01, 0.016, 0.025]),
      ...(this.chance(0.3) ? { wall: 0.002 } : {}),
      loss: this.chance(lossShare),
    });
  }

  tankAt(from: string): void {
    this.join(from, `${this.add('tank')}.T`, 0.15);
  }

  command(target: string, input: string, value: number, ramps: readonly number[] = [0, 0.03, 0.2]): void {
    const time = this.pick([this.between(0, this.duration), 0.5]);
    this.commands.push({ id: `c${this.commands.length + 1}`, time, ramp: this.pick(ramps), target, input, value, label: '' });
  }

  /** Puts an element into a run of line with the chance given, and returns the port the run goes on from. */
  through(from: string, kindId: string, inlet: string, outlet: string, share: number): string {
    if (!this.chance(share)) return from;
    const id = this.add(kindId);
    this.join(from, `${id}.${inlet}`);
    return `${id}.${outlet}`;
  }
}

function branch(b: Builder, from: string): void {
  const four = b.chance(0.7) ? 'directional-valve-4-3' : 'directional-valve-4-2';
  const valve = b.add(four);
  b.join(b.through(from, 'throttle', 'A', 'B', 0.3), `${valve}.P`);
  b.tankAt(b.through(`${valve}.T`, 'filter', 'A', 'B', 0.3));
  const cylinder = b.add('cylinder', b.chance(0.5) ? { workForce: b.between(0, 6e4), workContact: 0.1 } : {});
  b.join(b.through(`${valve}.A`, 'throttle', 'A', 'B', 0.2), `${cylinder}.A`);
  b.join(b.through(`${valve}.B`, 'check-valve', 'B', 'A', 0.1), `${cylinder}.B`);
  for (let k = 0; k < 3; k++) b.command(valve, 'spool', b.pick(four === 'directional-valve-4-3' ? [-1, 0, 0.4, 1] : [0, 0.5, 1]));
  if (b.chance(0.6)) b.command(cylinder, 'load', b.pick([-8e3, 0, 5e3, 3e4, 1e5]));
}

/** Circuit number `seed`; same seed, same circuit. */
export function randomCircuit(seed: number): CircuitDocument {
  const b = new Builder(seed);
  const motor = b.add('electric-motor');
  const pump = b.add('compensated-pump');
  b.tankAt(`${pump}.suction`);
  if (b.chance(0.7)) b.tankAt(`${pump}.drain`);
  let at = b.through(`${pump}.outlet`, 'check-valve', 'A', 'B', 0.6);
  at = b.through(at, 'filter', 'A', 'B', 0.2);
  at = b.through(at, 'flow-meter', 'A', 'B', 0.2);
  const manifold = b.add('junction', { shape: 'cross' });
  b.join(at, `${manifold}.a`);
  const relief = b.add('relief-valve');
  b.join(`${manifold}.b`, `${relief}.P`);
  b.tankAt(`${relief}.T`);
  if (b.chance(0.4)) {
    const tee = b.add('junction');
    b.join(`${manifold}.d`, `${tee}.a`);
    if (b.chance(0.7)) b.join(`${tee}.b`, `${b.add('pressure-gauge')}.M`, 0);
    branch(b, `${tee}.c`);
  }
  branch(b, `${manifold}.c`);
  if (b.chance(0.2)) b.command(motor, 'contactor', b.pick([0, 1]), [0]);
  if (b.chance(0.2)) b.command('supply', 'voltage', b.pick([0, 300, 360, 420]));
  if (b.chance(0.3))
    b.command(pump, b.pick(['compensatorPressure', 'maxVolumeStop']), b.pick([2e-6, 5e6, 2e7]) > 1 ? b.between(1e6, 3e7) : 2e-6);
  for (const component of b.components) {
    const faults = kindOf(component.kind)?.faults ?? [];
    if (faults.length > 0 && b.chance(0.08)) b.command(component.id, `fault.${b.pick(faults).id}`, b.pick([0.5, 1]));
  }
  return {
    format: 'swashbench-circuit',
    version: 1,
    title: `Random circuit ${seed}`,
    fluid: {
      grade: b.pick(['VG 22', 'VG 32', 'VG 46', 'VG 68'] as const),
      temperature: b.between(260, 350),
      airFraction: b.pick([0, 0.001, 0.005, 0.05]),
      bulkModulus: b.between(1e9, 2e9),
      density: 870,
    },
    reservoir: { volume: 0.1, temperature: 313.15, coolingArea: 1 },
    supply: { voltage: b.between(320, 440), frequency: b.pick([50, 60]), impedance: b.pick([0, 0.2, 1]) },
    site: { altitude: b.pick([0, 0, 2000]) },
    components: b.components,
    lines: b.lines,
    shafts: [
      {
        id: 's1',
        members: [
          { component: motor, port: 'shaft' },
          { component: pump, port: 'shaft' },
        ],
      },
    ],
    duty: { duration: b.duration, repeat: false, commands: legal(b.commands, b.components) },
    requirements: [],
    cases: [{ id: 'A', name: 'A', ink: 0, changes: [] }],
    tagPlaces: {},
    labels: [],
    notes: [],
  };
}

/** Commands held within what the inputs allow. */
function legal(commands: readonly Command[], components: readonly Component[]): Command[] {
  return commands.map((command) => {
    const kind = kindOf(components.find(({ id }) => id === command.target)?.kind ?? '');
    const input = kind?.inputs.find(({ id }) => id === command.input);
    if (!input) return command;
    return { ...command, value: Math.min(input.max, Math.max(input.min, command.value)) };
  });
}
