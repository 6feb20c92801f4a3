import type { CircuitDocument, Command, Component, Line } from '#shared/circuit/schema.ts';
import { kindOf } from '#shared/kinds/registry.ts';

/** Small documents for tests, written as lists: components 'M1 electric-motor', lines 'P1.outlet V1.A'. */
export function smallCircuit(
  components: readonly string[],
  lines: readonly string[],
  change: Partial<CircuitDocument> & {
    readonly values?: Readonly<Record<string, number | string>>;
    readonly shaft?: readonly string[];
  } = {},
): CircuitDocument {
  const { values = {}, shaft, ...rest } = change;
  return {
    format: 'swashbench-circuit',
    version: 1,
    title: 'Small circuit',
    fluid: { grade: 'VG 46', temperature: 313.15, airFraction: 0.005, bulkModulus: 1.7e9, density: 870 },
    reservoir: { volume: 0.1, temperature: 313.15, coolingArea: 1 },
    supply: { voltage: 400, frequency: 50, impedance: 0 },
    site: { altitude: 0 },
    components: components.map((entry, k): Component => {
      const [id = '', kind = ''] = entry.split(' ');
      const own = Object.entries(values).filter(([address]) => address.startsWith(`${id}.`));
      return {
        id,
        kind,
        kindVersion: kindOf(kind)?.version ?? 1,
        name: id,
        at: { x: 6 * k, y: 0 },
        turn: 0,
        mirror: false,
        parameters: Object.fromEntries(own.map(([address, value]) => [address.slice(id.length + 1), { value, source: 'typed' as const }])),
      };
    }),
    lines: lines.map((entry, k): Line => {
      const [from = '', to = '', loss] = entry.split(' ');
      const [a = '', pa = ''] = from.split('.');
      const [b = '', pb = ''] = to.split('.');
      const base = { id: `l${k + 1}`, from: { component: a, port: pa }, to: { component: b, port: pb } };
      return { ...base, route: [], length: 1, bore: 0.012, loss: loss === 'loss' };
    }),
    shafts: shaft ? [{ id: 's1', members: shaft.map((component) => ({ component, port: 'shaft' })) }] : [],
    duty: { duration: 1, repeat: false, commands: [] },
    requirements: [],
    cases: [{ id: 'A', name: 'A', ink: 0, changes: [] }],
    tagPlaces: {},
    labels: [],
    notes: [],
    ...rest,
  };
}

/** A pump on a relief: motor, pump, relief, tanks. */
export function standCircuit(change: Parameters<typeof smallCircuit>[2] = {}): CircuitDocument {
  return smallCircuit(
    ['M1 electric-motor', 'P1 compensated-pump', 'V1 relief-valve', 'T1 tank', 'T2 tank', 'T3 tank'],
    ['T1.T P1.suction', 'P1.outlet V1.P', 'V1.T T2.T', 'P1.drain T3.T'],
    { shaft: ['M1', 'P1'], ...change },
  );
}

export function command(id: string, time: number, ramp: number, target: string, input: string, value: number): Command {
  return { id, time, ramp, target, input, value, label: '' };
}
