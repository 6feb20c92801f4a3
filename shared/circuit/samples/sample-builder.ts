import type { CircuitDocument, Command, Component, Line, ParameterValue, Requirement } from '../schema.ts';

/** Small words for writing sample documents as a person would fill in the nameplates. */

function typed(value: number, text: string): ParameterValue {
  return { value, typed: text, source: 'typed' };
}
const REVOLUTION = 2 * Math.PI;

export const bar = (n: number): ParameterValue => typed(n * 1e5, `${n} bar`);
export const barPerTurn = (n: number): ParameterValue => typed(n * 1e5, `${n} bar/turn`);
export const cubic = (n: number): ParameterValue => typed((n * 1e-6) / REVOLUTION, `${n} cm3/rev`);
export const cubicPerTurn = (n: number): ParameterValue => typed((n * 1e-6) / REVOLUTION, `${n} cm3/rev/turn`);
export const litres = (n: number): ParameterValue => typed((n * 1e-3) / 60, `${n} L/min`);
export const millimetres = (n: number): ParameterValue => typed(n / 1000, `${n} mm`);
export const milliseconds = (n: number): ParameterValue => typed(n / 1000, `${n} ms`);
export const kilowatts = (n: number): ParameterValue => typed(n * 1000, `${n} kW`);
export const kilonewtons = (n: number): ParameterValue => typed(n * 1000, `${n} kN`);
export const kilograms = (n: number): ParameterValue => typed(n, `${n} kg`);
export const volts = (n: number): ParameterValue => typed(n, `${n} V`);
export const amps = (n: number): ParameterValue => typed(n, `${n} A`);
export const hertz = (n: number): ParameterValue => typed(n, `${n} Hz`);
export const rpm = (n: number): ParameterValue => typed((n * REVOLUTION) / 60, `${n} rpm`);
export const percent = (n: number): ParameterValue => typed(n / 100, `${n} %`);
export const degrees = (n: number): ParameterValue => typed((n * Math.PI) / 180, `${n} deg`);
export const ratio = (n: number): ParameterValue => typed(n, `${n}`);
export const choice = (value: string): ParameterValue => ({
  value,
  source: 'typed',
});

interface PartOptions {
  readonly turn?: 0 | 1 | 2 | 3;
  readonly mirror?: boolean;
  /** Screw ids whose present value is the as-found mark; those named in `locked` have the nut tight. */
  readonly screws?: readonly string[];
  readonly locked?: readonly string[];
}

/** One component at a place on the sheet [modules], named by its item code, its as-found marks taken from its own values. */
export function part(
  id: string,
  kind: string,
  at: readonly [number, number],
  parameters: Readonly<Record<string, ParameterValue>> = {},
  options: PartOptions = {},
): Component {
  const screws = Object.fromEntries(
    (options.screws ?? []).map((screw) => {
      const value = parameters[screw]?.value;
      const locked = options.locked?.includes(screw) ?? false;
      return [screw, typeof value === 'number' ? { asFound: value, locked } : { locked }];
    }),
  );
  const plain: Component = {
    id,
    kind,
    kindVersion: 1,
    name: id,
    at: { x: at[0], y: at[1] },
    turn: options.turn ?? 0,
    mirror: options.mirror ?? false,
    parameters: { ...parameters },
  };
  return options.screws ? { ...plain, screws } : plain;
}

function portRef(text: string): { component: string; port: string } {
  const [component = '', port = ''] = text.split('.');
  return { component, port };
}

/** A line from 'component.port' to 'component.port', length in m, bore in mm. */
export function pipe(id: string, from: string, to: string, length: number, boreMillimetres: number, route: Line['route'] = []): Line {
  return {
    id,
    from: portRef(from),
    to: portRef(to),
    route,
    length,
    bore: boreMillimetres / 1000,
    loss: false,
  };
}

export function shaftOf(id: string, ...members: readonly string[]): CircuitDocument['shafts'][number] {
  return { id, members: members.map(portRef) };
}

export function flag(id: string, time: number, label: string, address: string, value: number, ramp = 0): Command {
  const { component, port } = portRef(address);
  return { id, time, ramp, target: component, input: port, value, label };
}

/** The three motor requirements every sample carries: margin to stall, and RMS current at or under the nameplate. */
export function motorRequirements(): Requirement[] {
  return [
    { id: 'margin', quantity: 'stall margin', measure: 'peak', min: 1.25 },
    { id: 'rms', quantity: 'rms current', measure: 'peak', max: 1 },
  ];
}

/** Everything a sample does not say for itself: ordinary oil at 45 °C, a tank whose area counts a small air cooler, 400 V
 *  50 Hz, near sea level, one case A. */
export function sample(
  content: Partial<CircuitDocument> & Pick<CircuitDocument, 'title' | 'components' | 'lines' | 'duty'>,
): CircuitDocument {
  return {
    format: 'swashbench-circuit',
    version: 1,
    fluid: {
      grade: 'VG 46',
      temperature: 318.15,
      airFraction: 0.005,
      bulkModulus: 1.7e9,
      density: 870,
    },
    reservoir: { volume: 0.16, temperature: 318.15, coolingArea: 4 },
    supply: { voltage: 400, frequency: 50, impedance: 0 },
    site: { altitude: 100 },
    shafts: [],
    requirements: [],
    cases: [{ id: 'A', name: 'As found', ink: 0, changes: [] }],
    tagPlaces: {},
    labels: [],
    notes: [],
    ...content,
  };
}
