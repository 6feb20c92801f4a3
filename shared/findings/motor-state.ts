import type { DriveLoad, FindingContext } from './context.ts';
import type { Finding } from './finding.ts';
import { VOLTAGE_BAND } from './house-rules.ts';
import { motorFacts } from './motor-facts.ts';
import { figure, say, torque } from './phrase.ts';
import { lowestSupply } from './yardsticks.ts';

/** What stands behind a motor that gives too little: its supply, itself, or oil that is too cold. */

type Remedy = NonNullable<Finding['remedy']>;

/** Terminal volts as a share of nameplate volts at the supply's frequency: 480 V at 60 Hz is as many volts per hertz as 400 V at
 *  50 Hz, and the same flux. */
export function voltsShare(context: FindingContext, drive: DriveLoad, volts: number): number {
  const plate = context.plate(drive.component.id).number('ratedFrequency');
  const hertz = context.constants.supplyFrequency;
  return (volts / drive.facts.ratedVoltage) * (plate > 0 && hertz > 0 ? plate / hertz : 1);
}

/** Terminal voltage furthest outside ±10 % of nameplate [V], or null. */
export function outOfBand(context: FindingContext, drive: DriveLoad): number | null {
  if (voltsShare(context, drive, drive.voltage.low) < 1 - VOLTAGE_BAND) return drive.voltage.low;
  return voltsShare(context, drive, drive.voltage.high) > 1 + VOLTAGE_BAND ? drive.voltage.high : null;
}

export function lowVolts(context: FindingContext, drive: DriveLoad): boolean {
  return voltsShare(context, drive, drive.voltage.low) < 1 - VOLTAGE_BAND;
}

/** Least share of the plate's pull-out torque that a motor in order gives at its supply. Choice of the model. */
const IN_ORDER = 0.9;

/** The motor gives clearly less than its plate promises at this supply: no screw of the pump is the first remedy. null when it
 *  is in order. */
export function weakMotor(context: FindingContext, drive: DriveLoad): Remedy | null {
  const plate = context.plate(drive.component.id);
  const sound = motorFacts(
    {
      ...plate,
      number: (id) => (id.startsWith('fault.') ? 0 : plate.number(id)),
      given: (id) => (id.startsWith('fault.') ? null : plate.given(id)),
      choice: (id) => plate.choice(id),
    },
    context.constants,
  );
  const promised = sound.pullOutTorqueAt(lowestSupply(context, drive.component.id));
  const low = drive.lowestPullOut < IN_ORDER * promised;
  const lost = lostPhase(context, drive);
  if (!low && !lost) return null;
  return {
    words: say(
      lost ? 'A leg is lost. ' : '',
      'At this supply the plate promises a pull-out torque of ',
      torque(promised),
      low ? say(', the motor gives ', torque(drive.lowestPullOut)) : '',
      '. Look at the motor before the pump: amps of all three legs, star (US: wye) or delta, winding, bearings, by a licensed electrician.',
    ),
  };
}

/** A phase is lost on the plate or by a flag of the duty. */
function lostPhase(context: FindingContext, drive: DriveLoad): boolean {
  const motor = drive.component.id;
  const plate = context.plate(motor).given('fault.single-phasing') ?? 0;
  const flags = context.seen.duty.commands.filter((command) => command.target === motor && command.input === 'fault.single-phasing');
  return plate > 0.5 || flags.some((command) => command.time <= context.end && command.value > 0.5);
}

/** Oil this many times thicker than that of the plate is cold: it drags before it works. Choice of the model. */
const THICK = 4;

/** First remedy where the oil is far too thick for a start under load; null when it is not. */
export function coldOil(context: FindingContext): Remedy | null {
  const { viscosity, referenceViscosity } = context.constants;
  if (!(viscosity > THICK * referenceViscosity)) return null;
  return {
    words: say(
      'The oil is ',
      figure(viscosity / referenceViscosity, 'number', { digits: 0 }),
      ' times as thick as the plate figures assume, and drags on the pump. Warm it first, unloaded, valve at centre; then try again.',
    ),
  };
}
