import type { CircuitDocument } from '../circuit/schema.ts';
import { compensatedPump } from '../kinds/compensated-pump/compensated-pump.ts';
import { compensatorStroke, kneePressure } from '../kinds/compensated-pump/laws.ts';
import type { RunResult } from '../simulation/result.ts';
import { type Base, baseOf, reliefsOf, type SeenCircuit } from './context.ts';
import { type MotorFacts, motorFacts } from './motor-facts.ts';
import { cracking } from './remedies.ts';
import { lowestSupply } from './yardsticks.ts';

/** What the load picture needs beside the run, computed by the engine once per case. */
export interface Curve {
  /** Pressure [Pa] and flow [m³/s] pairs, equal lengths. */
  readonly pressure: Float64Array;
  readonly flow: Float64Array;
}
export interface LoadCurves {
  readonly pump: string;
  readonly motor: string | null;
  /** Limits Q = w(T) · etav · T · etam / p at the run's lowest supply voltage; empty without a motor. */
  readonly rated: Curve;
  /** Torque whose current is k × relay dial: Trips begins there. */
  readonly trips: Curve;
  readonly pullOut: Curve;
  /** Steady P–Q line of the pump on its motor, in pieces; not drawn where no steady state exists. */
  readonly pumpLine: readonly Curve[];
  /** Compensator dead-head and knee [Pa]. */
  readonly deadHead: number;
  readonly knee: number;
  /** Relief on the pump's net: cracking and set pressure [Pa], or null. */
  readonly relief: { readonly component: string; readonly cracks: number; readonly set: number } | null;
  /** Channel addresses of the operating point. */
  readonly pressureAddress: string;
  readonly flowAddress: string;
}

const POINTS = 96;
const nothing: Curve = { pressure: new Float64Array(0), flow: new Float64Array(0) };

/** Pump laws in steady state, from the same coefficients as the run. Losses: leakage outlet to case, friction torque. */
interface SteadyPump {
  readonly displacement: number;
  readonly stroke: (pressure: number) => number;
  readonly torque: (stroke: number, pressure: number, speed: number) => number;
  readonly flow: (stroke: number, pressure: number, speed: number) => number;
  /** Flow at which the shaft takes this torque at this speed and pressure. */
  readonly flowFor: (torque: number, speed: number, pressure: number) => number;
}

/** Curves of the circuit's largest pump; null when there is none. Both motor and limits follow the lowest supply of the run. */
export function loadCurves(document: CircuitDocument, caseId: string, circuit: SeenCircuit, run: RunResult): LoadCurves | null {
  const base = baseOf(document, caseId, circuit, run);
  const pump = [...base.ofKind('compensated-pump')].sort(
    (a, b) => base.plate(b.id).number('displacement') - base.plate(a.id).number('displacement'),
  )[0];
  if (!pump) return null;
  const plate = base.plate(pump.id);
  const steady = steadyPump(base, pump.id);
  const motor = motorOf(base, pump.id);
  const facts = motor === null ? null : motorFacts(base.plate(motor), base.constants);
  const volts = motor === null ? 0 : lowestSupply(base, motor);
  const deadHead = plate.number('compensatorPressure');
  const knee = kneePressure(deadHead, plate.number('band'), Math.min(1, plate.number('maxVolumeStop') / steady.displacement));
  const reliefs = reliefsOf(base, pump.id).map((relief) => ({
    component: relief.id,
    cracks: cracking(base, relief.id),
    set: base.plate(relief.id).number('setPressure'),
  }));
  const relief = [...reliefs].sort((a, b) => a.cracks - b.cracks)[0] ?? null;
  const top = 1.3 * Math.max(deadHead, relief?.set ?? 0);
  const most = 1.5 * steady.displacement * (facts?.synchronousSpeed ?? 157);
  const limit = (torque: number | null): Curve =>
    facts && torque !== null ? limitCurve(steady, facts, torque, volts, top, most) : nothing;
  const relayTorque = facts?.relay ? facts.torqueAtCurrent(facts.relay.k * facts.relay.dial, volts) : null;
  return {
    pump: pump.id,
    motor,
    rated: limit(facts ? facts.ratedTorque * facts.serviceFactor : null),
    trips: limit(relayTorque),
    pullOut: limit(facts ? facts.at(facts.pullOutSpeed, volts).torque : null),
    pumpLine: facts ? pumpLine(steady, facts, volts, knee, deadHead) : [],
    deadHead,
    knee,
    relief,
    pressureAddress: `${pump.id}.outlet.pressure`,
    flowAddress: `${pump.id}.flow`,
  };
}

function motorOf(base: Base, pump: string): string | null {
  const shaft = base.seen.shafts.find((entry) => entry.members.some((member) => member.component === pump));
  return base.ofKind('electric-motor').find((motor) => shaft?.members.some((member) => member.component === motor.id))?.id ?? null;
}

function steadyPump(base: Base, pump: string): SteadyPump {
  const plate = base.plate(pump);
  const c = compensatedPump.prepare(plate, base.constants) as Record<string, number>;
  const D = c.displacement!;
  const leakage = c.leakage! * (1 + 9 * (plate.given('fault.worn') ?? 0));
  const friction = (pressure: number, speed: number) => c.viscous! * speed + c.coulomb! + c.pressureFriction! * D * pressure;
  const least = plate.number('minVolumeStop') / D;
  const most = Math.min(1, plate.number('maxVolumeStop') / D);
  return {
    displacement: D,
    stroke: (pressure) => compensatorStroke(pressure, plate.number('compensatorPressure'), plate.number('band'), least, most),
    torque: (stroke, pressure, speed) => stroke * D * pressure + friction(pressure, speed),
    flow: (stroke, pressure, speed) => stroke * D * speed - leakage * pressure,
    flowFor: (torque, speed, pressure) => (speed * (torque - friction(pressure, speed))) / pressure - leakage * pressure,
  };
}

/** Pressure and flow at which the shaft takes one torque; the motor turns at its own speed for that torque. */
function limitCurve(steady: SteadyPump, facts: MotorFacts, torque: number, volts: number, top: number, most: number): Curve {
  const speed = facts.speedAt(torque * (1 - 1e-9), volts);
  if (speed === null) return nothing;
  const pressures: number[] = [];
  const flows: number[] = [];
  for (let i = 1; i <= POINTS; i++) {
    const pressure = (top * i) / POINTS;
    const flow = steady.flowFor(torque, speed, pressure);
    if (flow > most || flow < 0) continue;
    pressures.push(pressure);
    flows.push(flow);
  }
  return { pressure: Float64Array.from(pressures), flow: Float64Array.from(flows) };
}

/** The pump's own line on its motor, down to zero flow. Broken where the torque asked is above pull-out: no steady state
 *  exists there. Points stand closer where the compensator works. */
function pumpLine(steady: SteadyPump, facts: MotorFacts, volts: number, knee: number, deadHead: number): Curve[] {
  const start = Math.max(0, knee - 0.5 * (deadHead - knee));
  const pieces: Curve[] = [];
  let pressures: number[] = [];
  let flows: number[] = [];
  const close = () => {
    if (pressures.length > 1) pieces.push({ pressure: Float64Array.from(pressures), flow: Float64Array.from(flows) });
    pressures = [];
    flows = [];
  };
  for (let i = 0; i <= 2 * POINTS; i++) {
    const pressure = i < POINTS ? (start * i) / POINTS : start + ((1.02 * deadHead - start) * (i - POINTS)) / POINTS;
    const flow = steadyPoint(steady, facts, volts, pressure);
    if (flow === null) {
      close();
      continue;
    }
    const last = flows[flows.length - 1];
    if (flow < 0) {
      const before = pressures[pressures.length - 1];
      if (last !== undefined && before !== undefined) {
        pressures.push(before + ((pressure - before) * last) / (last - flow));
        flows.push(0);
      }
      break;
    }
    pressures.push(pressure);
    flows.push(flow);
  }
  close();
  return pieces;
}

/** Flow at a pressure with motor and pump in balance; null above pull-out. */
function steadyPoint(steady: SteadyPump, facts: MotorFacts, volts: number, pressure: number): number | null {
  const stroke = steady.stroke(pressure);
  let speed = facts.ratedSpeed;
  for (let i = 0; i < 2; i++) {
    const found = facts.speedAt(steady.torque(stroke, pressure, speed), volts);
    if (found === null) return null;
    speed = found;
  }
  return steady.flow(stroke, pressure, speed);
}
