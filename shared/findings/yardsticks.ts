import { tripTime } from '../kinds/electric-motor/laws.ts';
import type { Base, DriveLoad } from './context.ts';
import type { Yardsticks } from './finding.ts';
import { RUN_UP_EXTRA, STALL_TIME } from './house-rules.ts';
import { type MotorFacts, motorFacts } from './motor-facts.ts';
import { firstReach, highest, integrate, lowest, mean, median, stretches, type Window } from './series.ts';

/** Signal of the motor kind that says its relay has tripped. */
const OVERLOAD_TRIP = 'overload-trip';

/** Motor load in its three yardsticks, never mixed into one per cent: stall margin, RMS current over the repeated duty, peak.
 *  Run-up is left out: it ends 0.2 s after speed first passes pull-out speed. A start that every repetition needs (motor off
 *  at the end of the duty) is kept in the RMS figures, because it heats the motor every time. */
export function driveLoads(base: Base): DriveLoad[] {
  return base.ofKind('electric-motor').flatMap((component) => {
    const facts = motorFacts(base.plate(component.id), base.constants);
    return [driveLoad(base, component.id, facts)];
  });
}

function driveLoad(base: Base, motor: string, facts: MotorFacts): DriveLoad {
  const { times, end } = base;
  const empty = new Float64Array(times.length);
  const speed = base.column(`${motor}.speed`) ?? empty;
  const torque = base.column(`${motor}.torque`) ?? empty;
  const current = base.column(`${motor}.current`) ?? empty;
  const volts = base.column(`${motor}.terminalVoltage`) ?? empty;
  const on = (i: number) => volts[i]! > 0.05 * facts.ratedVoltage && current[i]! > 0.02 * facts.ratedCurrent;

  const up = firstReach(times, speed, facts.pullOutSpeed, { from: 0, to: end });
  const running = up === null ? null : { from: Math.min(end, up + RUN_UP_EXTRA), to: end };
  const below = up === null ? [] : stretches(times, (i) => (times[i]! > up && on(i) ? facts.pullOutSpeed - speed[i]! : -1), 0);
  const cutOff = (window: Window) => window.to >= end - 1e-9;
  const stalls = below.filter((window) => window.to - window.from >= STALL_TIME || cutOff(window));
  const dips = below.filter((window) => !stalls.includes(window) && window.to - window.from > 1e-3 && backUp(base, motor, facts, window));
  const stall = stalls[0];

  const window = running ?? { from: 0, to: end };
  const before = stall ? { from: window.from, to: stall.from } : window;
  const voltage = voltageRange(times, volts, facts, window);
  const lowestPullOut = facts.pullOutTorqueAt(lowestSupply(base, motor));
  const peakTorque = Math.max(0, highest(times, torque, before).value);
  const restarts = !onAtEnd(times, current, facts);
  const load: Window = restarts ? { from: 0, to: end } : window;
  const squares = current.map((value) => value * value);
  const rmsCurrent = Math.sqrt(Math.max(0, mean(times, squares, load)));
  const rmsTorque = Math.sqrt(
    Math.max(
      0,
      mean(
        times,
        torque.map((value) => value * value),
        load,
      ),
    ),
  );

  const yardsticks: Yardsticks = {
    motor,
    stalled: stall !== undefined,
    ...(stall ? { stallTime: stall.from, stallCurrent: median(times, current, stall) } : {}),
    stallMargin: stall || running === null || peakTorque <= 0 ? null : lowestPullOut / peakTorque,
    rmsCurrent: rmsCurrent / facts.ratedCurrent,
    rmsTorque: rmsTorque / facts.ratedTorque,
    peakTorque: peakTorque / facts.ratedTorque,
    peakCurrent: Math.max(0, highest(times, current, window).value),
    tripTime: relayTime(base, motor, facts, load, stall),
  };
  return {
    component: base.seen.components.find((entry) => entry.id === motor)!,
    facts,
    yardsticks,
    pumps: pumpsOn(base, motor),
    running,
    stall: stall ?? null,
    dips,
    voltage,
    lowestPullOut,
  };
}

function backUp(base: Base, motor: string, facts: MotorFacts, window: Window): boolean {
  return base.at(`${motor}.speed`, Math.min(base.end, window.to + 0.02)) >= facts.pullOutSpeed * 0.999;
}

function voltageRange(times: Float64Array, volts: Float64Array, facts: MotorFacts, window: Window): { low: number; high: number } {
  const present = volts.map((value) => (value > 0.05 * facts.ratedVoltage ? value : Number.NaN));
  const low = lowest(times, present, window).value;
  const high = highest(times, present, window).value;
  return Number.isFinite(low) && Number.isFinite(high) ? { low, high } : { low: facts.ratedVoltage, high: facts.ratedVoltage };
}

/** Lowest no-load voltage that the case and its duty give this motor [V]. */
export function lowestSupply(base: Base, motor: string): number {
  const commands = base.seen.duty.commands.filter(
    (command) =>
      command.time <= base.end &&
      ((command.target === 'supply' && command.input === 'voltage') || (command.target === motor && command.input === 'supplyVoltage')),
  );
  const first = commands.some((command) => command.time + command.ramp <= 0) ? [] : [base.constants.supplyVoltage];
  return Math.min(...first, ...commands.map((command) => command.value));
}

function onAtEnd(times: Float64Array, current: Float64Array, facts: MotorFacts): boolean {
  return times.length > 0 && current[times.length - 1]! > 0.02 * facts.ratedCurrent;
}

function pumpsOn(base: Base, motor: string): DriveLoad['pumps'] {
  const members = base.seen.shafts
    .filter((shaft) => shaft.members.some((member) => member.component === motor))
    .flatMap((shaft) => shaft.members);
  return base.ofKind('compensated-pump').filter((pump) => members.some((member) => member.component === pump.id));
}

/** When the overload relay opens, counted from a cold start of the repeated duty; null = never. */
function relayTime(base: Base, motor: string, facts: MotorFacts, load: Window, stall: Window | undefined): number | null {
  const relay = facts.relay;
  if (!relay) return null;
  const tripped = base.run.events.find((event) => event.component === motor && event.signal === OVERLOAD_TRIP && event.rising);
  if (tripped) return tripped.time;
  const current = base.column(`${motor}.current`);
  if (!current || load.to <= load.from) return null;
  const squares = current.map((value) => (value / (relay.k * relay.dial)) ** 2);
  if (stall) {
    const heat = base.column(`${motor}.overloadHeat`);
    const warm = heat ? heat[heat.length - 1]! : 0;
    const rest = closedForm(median(base.times, squares, stall), relay.tau, warm);
    return rest === null ? null : base.end + rest;
  }
  if (!base.seen.duty.repeat) return null;
  // Cooling at standstill is three times slower (MODEL.md): the relay's heat is weighted with 1/τ of each moment.
  const rate = current.map((value) => (value > 0.02 * facts.ratedCurrent ? 1 : 1 / 3) / relay.tau);
  const gain = squares.map((value, i) => value * rate[i]!);
  const rates = integrate(base.times, rate, load);
  if (rates <= 0) return null;
  return closedForm(integrate(base.times, gain, load) / rates, (load.to - load.from) / rates, 0);
}

/** `meanSquare` is the mean of (I/(k·dial))²: the heat that the relay tends to. */
function closedForm(meanSquare: number, timeConstant: number, warm: number): number | null {
  const time = tripTime(Math.sqrt(Math.max(0, meanSquare)), 1, timeConstant, warm);
  return Number.isFinite(time) ? time : null;
}
