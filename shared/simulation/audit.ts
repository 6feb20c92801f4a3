import type { Powers } from '../kinds/kind.ts';
import type { Integrator } from '../numerics/solver.ts';
import type { EnergyAudit } from './result.ts';
import type { CircuitSystem } from './system.ts';

/** Simpson's rule on start, middle and end of a step: weights over 6. */
const WEIGHTS = [1, 4, 1] as const;
const PLACES = 3;

/** Residuals of a run in which next to nothing moves are related to this work [J] and volume [m³]. */
const LEAST_WORK = 1;
const LEAST_MOVED = 1e-6;

/** Energy and volume accounts of a run, by quadrature on the dense output and from each component's own law, independent of
 *  the node equations: work supplied, work delivered, heat (also by component), energy kept in components, oil compressed
 *  (∫ p·(V/K) dp per node), and what flowed into every node against what its oil took up (∫ (V/K) dp). */
export class Audit {
  private readonly system: CircuitSystem;
  private readonly nodes: number;
  private readonly count: number;
  private readonly names: string[] = [];
  private readonly out: Powers = { supplied: 0, delivered: 0, heat: 0, stored: 0 };
  /** At each of the three places of a step: sums, heat by instance, and capacity, pressure and inflow of every node. */
  private readonly supplied = new Float64Array(PLACES);
  private readonly delivered = new Float64Array(PLACES);
  private readonly stored = new Float64Array(PLACES);
  private readonly moved = new Float64Array(PLACES);
  private readonly heat: Float64Array[];
  private readonly capacity: Float64Array[];
  private readonly pressure: Float64Array[];
  private readonly inflow: Float64Array[];
  private readonly slope: Float64Array;
  private readonly total = { supplied: 0, delivered: 0, stored: 0, moved: 0, oil: 0 };
  private readonly heatTotal: Float64Array;
  private readonly volumeError: Float64Array;
  private readonly startSpeeds: Float64Array;

  constructor(system: CircuitSystem) {
    this.system = system;
    const { circuit } = system;
    this.nodes = circuit.nodes;
    for (const { block } of circuit.blocks) this.names.push(...block.componentIds);
    this.count = this.names.length;
    const places = (length: number): Float64Array[] => Array.from({ length: PLACES }, () => new Float64Array(length));
    this.heat = places(this.count);
    this.capacity = places(this.nodes);
    this.pressure = places(this.nodes);
    this.inflow = places(this.nodes + 1);
    this.slope = new Float64Array(system.length);
    this.heatTotal = new Float64Array(this.count);
    this.volumeError = new Float64Array(this.nodes);
    this.startSpeeds = circuit.start.slice(circuit.nodes, circuit.nodes + circuit.shafts);
  }

  /** Takes the powers at place k = 0, 1, 2 (start, middle, end) of a step, after `system.read` there. */
  sample(k: number): void {
    const { system, out, nodes } = this;
    const { circuit, reading: w } = system;
    const heat = this.heat[k]!;
    out.supplied = 0;
    out.delivered = 0;
    out.stored = 0;
    let at = 0;
    for (const { kind, reading } of circuit.blocks) {
      for (let i = 0; i < reading.count; i++) {
        out.heat = 0;
        kind.powers(reading, i, w, out);
        heat[at++] = out.heat;
      }
    }
    this.supplied[k] = out.supplied;
    this.delivered[k] = out.delivered;
    this.stored[k] = out.stored;
    let moved = 0;
    for (const slot of circuit.sourceSlots) moved += Math.abs(w.balance[slot]!);
    this.moved[k] = moved;
    const inflow = this.inflow[k]!;
    inflow.fill(0);
    const { nodeOfSlot } = circuit;
    for (let s = 0; s < nodeOfSlot.length; s++) {
      const node = nodeOfSlot[s]!;
      if (node < nodes) inflow[node]! += w.balance[s]!;
    }
    const capacity = this.capacity[k]!;
    const pressure = this.pressure[k]!;
    for (let i = 0; i < nodes; i++) {
      capacity[i] = system.capacityOf(i);
      pressure[i] = w.y[i]!;
    }
  }

  /** Adds the step whose three places were sampled, up to place q of the integrator's last step, and makes its end the next start. */
  commit(integrator: Integrator, q: number): void {
    const { total, slope, nodes, volumeError, heatTotal } = this;
    const length = (integrator.to - integrator.from) * q;
    for (let k = 0; k < PLACES; k++) {
      const weight = (length * WEIGHTS[k]!) / 6;
      total.supplied += weight * this.supplied[k]!;
      total.delivered += weight * this.delivered[k]!;
      total.stored += weight * this.stored[k]!;
      total.moved += weight * this.moved[k]!;
      const heat = this.heat[k]!;
      for (let i = 0; i < heat.length; i++) heatTotal[i]! += weight * heat[i]!;
      integrator.denseSlope((q * k) / 2, slope);
      const capacity = this.capacity[k]!;
      const pressure = this.pressure[k]!;
      const inflow = this.inflow[k]!;
      for (let i = 0; i < nodes; i++) {
        const taken = capacity[i]! * slope[i]!;
        total.oil += weight * pressure[i]! * taken;
        volumeError[i]! += weight * (inflow[i]! - taken);
      }
    }
    for (const list of [this.heat, this.capacity, this.pressure, this.inflow]) {
      const first = list[0]!;
      list[0] = list[2]!;
      list[2] = first;
    }
    for (const list of [this.supplied, this.delivered, this.stored, this.moved]) list[0] = list[2]!;
  }

  /** The accounts, given the state at the end. */
  result(end: Float64Array): EnergyAudit {
    const { total, names } = this;
    const { circuit } = this.system;
    let kinetic = 0;
    for (let s = 0; s < circuit.shafts; s++) {
      const after = end[circuit.nodes + s]!;
      const before = this.startSpeeds[s]!;
      kinetic += 0.5 * circuit.inertia[s]! * (after * after - before * before);
    }
    const heatBy: Record<string, number> = {};
    let heat = 0;
    names.forEach((name, i) => {
      heat += this.heatTotal[i]!;
      heatBy[name] = this.heatTotal[i]!;
    });
    const storedChange = total.stored + total.oil + kinetic;
    const miss = Math.abs(total.supplied - total.delivered - heat - storedChange);
    const volumeMiss = this.volumeError.reduce((sum, error) => sum + Math.abs(error), 0);
    return {
      supplied: total.supplied,
      delivered: total.delivered,
      heat,
      storedChange,
      residual: miss / Math.max(total.supplied, LEAST_WORK),
      volumeResidual: volumeMiss / Math.max(total.moved, LEAST_MOVED),
      heatBy,
    };
  }
}
