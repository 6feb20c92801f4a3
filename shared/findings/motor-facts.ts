import { evaluateMotor, motorCoefficients, motorInputIds, prepareMotor } from '../kinds/electric-motor/curve.ts';
import type { Block, Plate, RunConstants, Workspace } from '../kinds/kind.ts';

/** What a motor can do, read from the same curve that a run uses. Torque N·m, speed rad/s, current A, voltage V (line, no load). */
export interface MotorFacts {
  readonly ratedPower: number;
  readonly ratedTorque: number;
  readonly ratedSpeed: number;
  readonly ratedCurrent: number;
  readonly ratedVoltage: number;
  readonly serviceFactor: number;
  readonly synchronousSpeed: number;
  readonly pullOutSpeed: number;
  /** Highest torque with this supply voltage, the drop across the supply's impedance taken off. */
  readonly pullOutTorqueAt: (volts: number) => number;
  /** Shaft torque and current of the highest leg at a speed. */
  readonly at: (speed: number, volts: number) => { readonly torque: number; readonly current: number };
  /** Speed on the running side of the curve at which the shaft gives this torque; null above pull-out. */
  readonly speedAt: (torque: number, volts: number) => number | null;
  /** Shaft torque on the running side at which the current is this; null if the curve has none there. */
  readonly torqueAtCurrent: (current: number, volts: number) => number | null;
  /** Overload relay: trips in the end above k × dial [A]; time constant [s]. null = none fitted. */
  readonly relay: { readonly k: number; readonly dial: number; readonly tau: number } | null;
}

const MOST_STEPS = 60;
/** Speeds this close are the same [rad/s]. */
const CLOSE = 1e-9;

export function motorFacts(plate: Plate, constants: RunConstants): MotorFacts {
  const c = prepareMotor(plate, constants);
  const block: Block = {
    kind: 'electric-motor',
    count: 1,
    componentIds: ['motor'],
    c: Float64Array.from(motorCoefficients.map((name) => c[name])),
    coefficientCount: motorCoefficients.length,
    port: Int32Array.of(0),
    balance: Int32Array.of(0),
    portCount: 1,
    state: Int32Array.of(0),
    stateCount: 1,
    input: Int32Array.from(motorInputIds.map((_, i) => i)),
    inputCount: motorInputIds.length,
    slot: new Int32Array(0),
    entryCount: 0,
  };
  const u = Float64Array.from(
    motorInputIds.map((id) => {
      if (id === 'contactor') return 1;
      if (id === 'supplyFrequency') return constants.supplyFrequency;
      if (id === 'relayDial') return plate.number('relayDial');
      return id === 'supplyVoltage' ? constants.supplyVoltage : (plate.given(`fault.${id}`) ?? 0);
    }),
  );
  const y = new Float64Array(2);
  const none = new Float64Array(2);
  const w: Workspace = { y, dy: none, balance: none, volume: none, u, jac: none };
  const volt = motorInputIds.indexOf('supplyVoltage');
  const point = (speed: number, volts: number) => {
    y[0] = speed;
    u[volt] = volts;
    return evaluateMotor(block, 0, w);
  };
  const at = (speed: number, volts: number) => {
    const { shaft, current } = point(speed, volts);
    return { torque: shaft, current };
  };
  const rest = point(0, constants.supplyVoltage);
  const { pullOutSpeed, synchronous } = rest;
  /** Speed between pull-out and synchronous where a falling quantity passes a level: Newton, kept inside by halving. */
  const solve = (level: number, volts: number, of: 'shaft' | 'current', slopeOf: 'shaftSlope' | 'currentSlope'): number | null => {
    let low = pullOutSpeed;
    let high = synchronous;
    if (point(low, volts)[of] < level) return null;
    let speed = low + 0.7 * (high - low);
    for (let i = 0; i < MOST_STEPS && high - low > CLOSE; i++) {
      const here = point(speed, volts);
      const excess = here[of] - level;
      if (Math.abs(excess) <= 1e-10 * Math.abs(level)) break;
      if (excess > 0) low = speed;
      else high = speed;
      const next = speed - excess / here[slopeOf];
      speed = next > low && next < high ? next : (low + high) / 2;
    }
    return speed;
  };
  return {
    ratedPower: plate.number('ratedPower'),
    ratedTorque: c.ratedTorque,
    ratedSpeed: c.ws0 * (1 - c.ratedSlip),
    ratedCurrent: c.ratedCurrent,
    ratedVoltage: c.ratedVoltage,
    serviceFactor: c.serviceFactor,
    synchronousSpeed: synchronous,
    pullOutSpeed,
    pullOutTorqueAt: (volts) => point(pullOutSpeed, volts).pullOutTorque,
    at,
    speedAt: (torque, volts) => solve(torque, volts, 'shaft', 'shaftSlope'),
    torqueAtCurrent: (current, volts) => {
      const speed = solve(current, volts, 'current', 'currentSlope');
      return speed === null ? null : at(speed, volts).torque;
    },
    relay: c.relayFitted > 0 ? { k: c.relayFactor, dial: plate.number('relayDial'), tau: c.relayTime } : null,
  };
}
