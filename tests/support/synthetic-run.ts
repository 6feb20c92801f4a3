import { effectiveDocument } from '#shared/circuit/effective-document.ts';
import { demoCircuit } from '#shared/circuit/samples/demo.ts';
import type { CircuitDocument } from '#shared/circuit/schema.ts';
import { assessRun } from '#shared/findings/assess.ts';
import type { SeenCircuit } from '#shared/findings/context.ts';
import type { Assessment } from '#shared/findings/finding.ts';
import { runConstants } from '#shared/fluid/run-constants.ts';
import type { RunResult } from '#shared/simulation/result.ts';
import type { QuantityId } from '#shared/units/quantities.ts';

/** Runs made up for testing the rules: columns are functions of time, so that each rule meets exactly the situation it is
 *  about. The demo's document gives plates and drawing. */

type Signal = number | ((time: number) => number);

export interface SyntheticOptions {
  readonly document?: CircuitDocument;
  readonly caseId?: string;
  /** Columns over those of a healthy press, by address. */
  readonly channels?: Readonly<Record<string, Signal>>;
  readonly run?: Partial<RunResult>;
  readonly duration?: number;
}

export const bar = 1e5;
export const litresPerMinute = 1e-3 / 60;
export const cubic = 1e-6 / (2 * Math.PI);

/** A press that does its work within limits: up to speed at 0.1 s, bale met and made, back in at the end. */
function healthy(duration: number): Record<string, Signal> {
  const pressing = (t: number) => t > 0.6 && t < 0.7 * duration;
  return {
    'M1.speed': (t) => Math.min(1, t / 0.1) * 153,
    'M1.torque': (t) => (pressing(t) ? 40 : 12),
    'M1.current': (t) => (pressing(t) ? 11 : 6),
    'M1.terminalVoltage': 400,
    'M1.overloadHeat': 0.1,
    'P1.outlet.pressure': (t) => (pressing(t) ? 150 : 10) * bar,
    'P1.flow': 20 * litresPerMinute,
    'P1.displacement': 16 * cubic,
    'P1.stroke': 0.55,
    'P1.caseFlow': 0.5 * litresPerMinute,
    'P1.suctionPressure': 101325,
    'P1.filling': 1,
    'V2.flow': 0,
    'V2.heat': 0,
    'V2.P.pressure': (t) => (pressing(t) ? 150 : 10) * bar,
    'V3.spool': (t) => (pressing(t) ? 1 : t >= 0.7 * duration && t < 0.95 * duration ? -1 : 0),
    'A1.position': (t) => (pressing(t) ? Math.min(0.35, 0.35 * (t / (0.5 * duration))) : t >= 0.7 * duration ? 0 : 0),
    'A1.velocity': (t) => (pressing(t) && t < 0.5 * duration ? 0.12 : 0),
    'A1.loadForce': (t) => (pressing(t) ? Math.min(53e3, 53e3 * (t / (0.45 * duration))) : 0),
    'A1.A.pressure': (t) => (pressing(t) ? 150 : 0.5) * bar,
    'A1.B.pressure': (t) => (pressing(t) ? 0.5 : 2) * bar,
    'A1.A.flow': 20 * litresPerMinute,
    'A1.B.flow': 0,
  };
}

const quantityOf = (address: string): QuantityId =>
  address.endsWith('pressure') ? 'pressure' : address.endsWith('Force') ? 'force' : address.endsWith('low') ? 'flow' : 'number';

export function syntheticRun(options: SyntheticOptions = {}): RunResult {
  const duration = options.duration ?? 8;
  const rows = Math.round(duration * 200) + 1;
  const times = Float64Array.from({ length: rows }, (_, i) => (i / (rows - 1)) * duration);
  const signals = { ...healthy(duration), ...options.channels };
  return {
    engineVersion: 1,
    caseId: options.caseId ?? 'A',
    status: 'finished',
    time: duration,
    duration,
    tolerance: 1e-4,
    times,
    channels: Object.entries(signals).map(([address, signal]) => ({
      address,
      label: address,
      quantity: quantityOf(address),
      values: times.map((t) => (typeof signal === 'number' ? signal : signal(t))),
    })),
    events: [],
    phases: [],
    audit: { supplied: 1e4, delivered: 5e3, heat: 5e3, storedChange: 0, residual: 0, volumeResidual: 0, heatBy: { M1: 3e3, P1: 2e3 } },
    pressureLeft: [],
    statistics: { steps: 1, rejected: 0, evaluations: 1, jacobians: 1, factorisations: 1, states: 1, nonzeros: 1 },
    notes: [],
    hash: '0',
    ...options.run,
  };
}

export function seenCircuit(document: CircuitDocument, caseId: string): SeenCircuit {
  const seen = effectiveDocument(document, caseId);
  return { document: seen, run: runConstants(seen.fluid, seen.supply, seen.site) };
}

/** Assessment of a synthetic run. */
export function assess(options: SyntheticOptions = {}): Assessment {
  const document = options.document ?? demoCircuit;
  const caseId = options.caseId ?? 'A';
  return assessRun(document, caseId, seenCircuit(document, caseId), syntheticRun(options));
}

/** The demo with some parameters changed: `{ 'V2.setPressure': 120e5 }`. */
export function changed(parameters: Readonly<Record<string, number | string>>, document: CircuitDocument = demoCircuit): CircuitDocument {
  return {
    ...document,
    components: document.components.map((component) => {
      const mine = Object.entries(parameters).filter(([address]) => address.startsWith(`${component.id}.`));
      if (mine.length === 0) return component;
      const own = { ...component.parameters };
      for (const [address, value] of mine) own[address.slice(component.id.length + 1)] = { value, source: 'typed' };
      return { ...component, parameters: own };
    }),
  };
}
