import { type Move, movedProfile, type Profile, pieceAt } from '../circuit/profile.ts';
import { effectiveModulus, effectiveModulusSlope, type OilModel } from '../fluid/effective-modulus.ts';
import type { Block, ComponentKind, Workspace } from '../kinds/kind.ts';
import type { OdeSystem } from '../numerics/solver.ts';
import { type CompiledCircuit, LEAST_VOLUME } from './circuit.ts';

/** States on which another state depends; at least 1. */
function statesThatMatter({ size, pattern }: CompiledCircuit): number {
  const columns = new Set<number>();
  pattern.columns.forEach((column, s) => {
    if (pattern.rows[s] !== column) columns.add(column);
  });
  return size === 0 ? 1 : Math.max(1, columns.size);
}

type Mutable<T> = { -readonly [K in keyof T]: T[K] };

/** Right-hand side and Jacobian of a compiled circuit, with the inputs of the present segment of the duty. One per run. */
export class CircuitSystem implements OdeSystem {
  readonly size: number;
  readonly length: number;
  readonly nominal: Float64Array;
  readonly counted: number;
  ramping = false;
  readonly circuit: CompiledCircuit;
  /** Present value of every input. */
  readonly u: Float64Array;
  /** Workspace of readings: `balance` has a slot per port. */
  readonly reading: Workspace & { pass: number };
  private readonly w: Mutable<Workspace> & { pass: number };
  private readonly oil: OilModel;
  /** Kernels beside their blocks: called from here they need no look-up in objects of many shapes. */
  private readonly flows: ComponentKind['flow'][];
  private readonly jacobians: ComponentKind['jacobian'][];
  private readonly blocks: readonly Block[];
  private readonly readingBlocks: readonly Block[];
  private readonly profiles: Profile[];
  private readonly capacity: Float64Array;
  private readonly rowScale: Float64Array;
  /** Inputs that move in this segment: index; start time, value and slope of each. */
  private moving: number[] = [];
  private movingFrom: number[] = [];
  private movingValue: number[] = [];
  private movingSlope: number[] = [];

  constructor(circuit: CompiledCircuit) {
    this.circuit = circuit;
    this.size = circuit.size;
    this.length = circuit.size + 1;
    this.nominal = circuit.nominal;
    this.counted = statesThatMatter(circuit);
    this.oil = circuit.oil;
    this.u = new Float64Array(circuit.profiles.length);
    this.profiles = [...circuit.profiles];
    const vector = (): Float64Array => new Float64Array(this.length);
    const working = circuit.blocks.filter(({ kind }) => kind.entries.length > 0 || kind.states.length > 0);
    this.flows = working.map(({ kind }) => kind.flow);
    this.jacobians = working.map(({ kind }) => kind.jacobian);
    this.blocks = working.map(({ block }) => block);
    this.readingBlocks = working.map(({ reading }) => reading);
    this.w = { y: vector(), dy: vector(), balance: vector(), volume: vector(), u: this.u, jac: new Float64Array(0), pass: 0 };
    this.reading = {
      y: vector(),
      dy: vector(),
      balance: new Float64Array(circuit.slots),
      volume: vector(),
      u: this.u,
      jac: new Float64Array(0),
      pass: 0,
    };
    this.capacity = new Float64Array(circuit.nodes);
    this.rowScale = new Float64Array(this.size).fill(1);
    for (let s = 0; s < circuit.shafts; s++) this.rowScale[circuit.nodes + s] = 1 / circuit.inertia[s]!;
    this.enterSegment(0);
  }

  /** Profiles of all inputs, with what acting events have changed. */
  get inputs(): readonly Profile[] {
    return this.profiles;
  }

  /** Replaces what is left of an input's profile. */
  override(input: number, move: Move): void {
    this.profiles[input] = movedProfile(this.profiles[input] as Profile, move);
  }

  /** Takes up the inputs as they are just after `time`, until the next corner of any of them. True when one of them jumped. */
  enterSegment(time: number): boolean {
    this.setTime(time);
    this.moving = [];
    this.movingFrom = [];
    this.movingValue = [];
    this.movingSlope = [];
    let jumped = false;
    this.profiles.forEach((profile, i) => {
      const piece = pieceAt(profile, time);
      const value = piece.value + piece.slope * (time - piece.from);
      if (Math.abs(value - this.u[i]!) > 1e-9 * (Math.abs(value) + Math.abs(this.u[i]!))) jumped = true;
      this.u[i] = value;
      if (piece.slope === 0) return;
      this.moving.push(i);
      this.movingFrom.push(piece.from);
      this.movingValue.push(piece.value);
      this.movingSlope.push(piece.slope);
    });
    this.ramping = this.moving.length > 0;
    return jumped;
  }

  private setTime(time: number): void {
    const { moving, movingFrom, movingValue, movingSlope, u } = this;
    for (let k = 0; k < moving.length; k++) u[moving[k]!] = movingValue[k]! + movingSlope[k]! * (time - movingFrom[k]!);
  }

  derivative(t: number, y: Float64Array, dy: Float64Array): void {
    const { circuit, w, flows, blocks, oil, capacity, length } = this;
    if (this.ramping) this.setTime(t);
    w.y = y;
    w.dy = dy;
    w.pass++;
    const { balance, volume } = w;
    const fixed = circuit.volume;
    for (let i = 0; i < length; i++) {
      balance[i] = 0;
      volume[i] = fixed[i]!;
    }
    for (let k = 0; k < flows.length; k++) flows[k]!(blocks[k]!, w);
    const { nodes, compliance } = circuit;
    for (let i = 0; i < nodes; i++) {
      const c = Math.max(volume[i]!, LEAST_VOLUME) / effectiveModulus(y[i]!, oil) + compliance[i]!;
      capacity[i] = c;
      dy[i] = balance[i]! / c;
    }
    const { rowScale } = this;
    const last = nodes + circuit.shafts;
    for (let i = nodes; i < last; i++) dy[i] = balance[i]! * rowScale[i]!;
  }

  jacobian(_t: number, y: Float64Array, values: Float64Array): void {
    const { circuit, w, jacobians, blocks, oil, capacity, rowScale } = this;
    const { nodes, compliance, pattern } = circuit;
    const { balance, volume } = w;
    w.y = y;
    w.jac = values;
    for (let s = 0; s < values.length; s++) values[s] = 0;
    for (let i = 0; i < nodes; i++) rowScale[i] = 1 / capacity[i]!;
    for (let i = 0; i < nodes; i++) {
      const modulus = effectiveModulus(y[i]!, oil);
      const slope = effectiveModulusSlope(y[i]!, oil);
      const c = capacity[i]!;
      const v = Math.max(volume[i]!, LEAST_VOLUME);
      values[i] = (balance[i]! * v * slope) / (modulus * modulus * c);
      // Kernels scale by 1/volume: with yielding walls the share of the moving volume is smaller, and a volume held at the
      // least one does not move at all.
      volume[i] = volume[i]! < LEAST_VOLUME ? Number.POSITIVE_INFINITY : v + modulus * compliance[i]!;
    }
    for (let k = 0; k < jacobians.length; k++) jacobians[k]!(blocks[k]!, w);
    const { rows } = pattern;
    for (let s = 0; s < rows.length; s++) values[s]! *= rowScale[rows[s]!]!;
  }

  /** Flow pass with a slot per port at (t, y): afterwards `reading` holds what readings, signals and powers need. */
  read(t: number, y: Float64Array): void {
    const { circuit, reading, flows, readingBlocks } = this;
    if (this.ramping) this.setTime(t);
    reading.y.set(y);
    reading.pass++;
    reading.balance.fill(0);
    reading.volume.set(circuit.volume);
    for (let k = 0; k < flows.length; k++) flows[k]!(readingBlocks[k]!, reading);
  }

  /** Oil volume taken up by a node per pascal [m³/Pa], after `read`. */
  capacityOf(node: number): number {
    const { reading, oil, circuit } = this;
    return Math.max(reading.volume[node]!, LEAST_VOLUME) / effectiveModulus(reading.y[node]!, oil) + circuit.compliance[node]!;
  }
}
