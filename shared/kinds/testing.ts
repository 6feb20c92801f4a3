import type { Block, ComponentKind, Plate, RunConstants, Workspace } from './kind.ts';

/** One component on its own: a hand-made block and workspace, each port on a node of its own. For checks of kinds only. */

export const testRun: RunConstants = {
  density: 870,
  viscosity: 46e-6 * 870,
  referenceViscosity: 46e-6 * 870,
  atmosphere: 101325,
  supplyVoltage: 400,
  supplyFrequency: 50,
  supplyImpedance: 0,
};

/** Typical values with some replaced. */
export function plateOf(kind: ComponentKind, values: Readonly<Record<string, number | string>> = {}): Plate {
  const specs = new Map(kind.parameters.map((spec) => [spec.id, spec]));
  return {
    number(id) {
      const value = values[id] ?? specs.get(id)?.initial;
      if (typeof value !== 'number') throw new Error(`${kind.id} has no number '${id}'`);
      return value;
    },
    given(id) {
      const value = values[id];
      return typeof value === 'number' ? value : null;
    },
    choice(id) {
      const value = values[id] ?? specs.get(id)?.initial;
      if (typeof value !== 'string') throw new Error(`${kind.id} has no choice '${id}'`);
      return value;
    },
  };
}

export interface Rig {
  readonly kind: ComponentKind;
  readonly block: Block;
  readonly w: Workspace;
  readonly coefficients: Readonly<Record<string, number>>;
  /** Names of the rows and columns: ports, then 'state:<id>'. */
  readonly names: readonly string[];
  /** Sets a port value, a state ('state:stroke') or an input by its name. */
  set(name: string, value: number): void;
  /** Clears balances, then evaluates flows. */
  flow(): void;
  /** Derivative of a row ('outlet', 'state:stroke') as the simulation sees it: state derivative, or balance ÷ volume. */
  rate(name: string): number;
  /** What was pushed into the node of a port. */
  pushed(port: string): number;
  reading(id: string): number;
  signal(id: string): number;
}

const VOLUME = 1e-3;

export function rigOf(kind: ComponentKind, values: Readonly<Record<string, number | string>> = {}, run: RunConstants = testRun): Rig {
  const plate = plateOf(kind, values);
  const coefficients = kind.prepare(plate, run);
  const names = [...kind.ports.map((port) => port.id), ...kind.states.map((state) => `state:${state.id}`)];
  const size = names.length;
  const ports = kind.ports.length;
  const inputs = [...kind.inputs.map((input) => input.id), ...kind.faults.map((fault) => fault.id)];
  const block: Block = {
    kind: kind.id,
    count: 1,
    componentIds: ['X1'],
    c: Float64Array.from(kind.coefficients, (name) => coefficients[name] ?? Number.NaN),
    coefficientCount: kind.coefficients.length,
    port: Int32Array.from({ length: ports }, (_, k) => k),
    balance: Int32Array.from({ length: ports }, (_, k) => k),
    portCount: ports,
    state: Int32Array.from({ length: size - ports }, (_, k) => ports + k),
    stateCount: size - ports,
    input: Int32Array.from({ length: inputs.length }, (_, k) => k),
    inputCount: inputs.length,
    slot: Int32Array.from(kind.entries, ([row, column]) => names.indexOf(row) * size + names.indexOf(column)),
    entryCount: kind.entries.length,
  };
  const w: Workspace = {
    y: new Float64Array(size + 1),
    dy: new Float64Array(size + 1),
    balance: new Float64Array(size + 1),
    volume: new Float64Array(size + 1),
    u: Float64Array.from([
      ...kind.inputs.map((input) => input.rest(plate, run)),
      ...kind.faults.map((fault) => plate.given(`fault.${fault.id}`) ?? 0),
    ]),
    jac: new Float64Array(size * size + 1),
  };
  kind.states.forEach((state, k) => {
    w.y[ports + k] = state.start(coefficients);
  });
  const oil = new Set(kind.ports.flatMap((port, k) => (port.medium === 'oil' ? [k] : [])));
  const rig: Rig = {
    kind,
    block,
    w,
    coefficients,
    names,
    set(name, value) {
      const at = names.indexOf(name);
      if (at >= 0) w.y[at] = value;
      else if (inputs.includes(name)) w.u[inputs.indexOf(name)] = value;
      else throw new Error(`${kind.id} has no '${name}'`);
    },
    flow() {
      w.balance.fill(0);
      w.volume.fill(VOLUME);
      kind.flow(block, w);
    },
    rate(name) {
      const at = names.indexOf(name);
      if (at >= ports) return w.dy[at]!;
      return oil.has(at) ? w.balance[at]! / w.volume[at]! : w.balance[at]!;
    },
    pushed: (port) => w.balance[names.indexOf(port)]!,
    reading: (id) => kind.readings.find((reading) => reading.id === id)!.value(block, 0, w),
    signal: (id) => kind.signals.find((signal) => signal.id === id)!.value(block, 0, w),
  };
  rig.flow();
  return rig;
}

/** Largest difference between the analytic Jacobian and central differences, relative to the largest entry of its row;
 *  also entries that differ from zero outside the declared pattern. */
export function jacobianError(rig: Rig): { worst: number; where: string } {
  const { kind, w, names, block } = rig;
  const size = names.length;
  rig.flow();
  const volumes = Float64Array.from(w.volume);
  w.jac.fill(0);
  kind.jacobian(block, w);
  const analytic = Float64Array.from(w.jac);
  const ports = kind.ports.length;
  let worst = 0;
  let where = '';
  const numeric: number[][] = names.map(() => []);
  const noise: number[][] = names.map(() => []);
  for (let column = 0; column < size; column += 1) {
    const old = w.y[column]!;
    const step = 1e-6 * Math.max(Math.abs(old), scaleOf(rig, column));
    const at = (offset: number): number[] => {
      w.y[column] = old + offset;
      rig.flow();
      return names.map((name) => rig.rate(name));
    };
    const high = at(step);
    const low = at(-step);
    const higher = at(2 * step);
    const lower = at(-2 * step);
    w.y[column] = old;
    names.forEach((_, row) => {
      const near = (high[row]! - low[row]!) / (2 * step);
      const far = (higher[row]! - lower[row]!) / (4 * step);
      numeric[row]!.push((4 * near - far) / 3);
      noise[row]!.push((4e-16 * (Math.abs(high[row]!) + Math.abs(low[row]!))) / step);
    });
  }
  rig.flow();
  const nominal = names.map((_, column) => scaleOf(rig, column));
  names.forEach((rowName, row) => {
    const scale = row < ports && kind.ports[row]!.medium === 'oil' ? 1 / volumes[row]! : 1;
    const largest = Math.max(...numeric[row]!.map((value, column) => Math.abs(value) * nominal[column]!), 1e-300);
    names.forEach((columnName, column) => {
      const value = analytic[row * size + column]! * scale;
      const allowed = noise[row]![column]! * nominal[column]!;
      const error = Math.max(0, Math.abs(value - numeric[row]![column]!) * nominal[column]! - 4 * allowed) / largest;
      if (error > worst) {
        worst = error;
        where = `d(${rowName})/d(${columnName}): ${value} against ${numeric[row]![column]!}`;
      }
    });
  });
  return { worst, where };
}

/** Step scale of a column: pressure, speed, or the state's own nominal. */
function scaleOf(rig: Rig, column: number): number {
  const ports = rig.kind.ports.length;
  if (column < ports) return rig.kind.ports[column]!.medium === 'oil' ? 2e5 : 10;
  return rig.kind.states[column - ports]!.nominal;
}
