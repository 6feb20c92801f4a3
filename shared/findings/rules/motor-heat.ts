import { AFTER_A_TRIP } from '../cautions.ts';
import type { DriveLoad, FindingContext } from '../context.ts';
import { reliefsOf } from '../context.ts';
import type { Finding } from '../finding.ts';
import { LEAST_STALL_MARGIN } from '../house-rules.ts';
import { lowVolts, outOfBand, voltsShare, weakMotor } from '../motor-state.ts';
import { current, figure, margin, multiple, say, share, span, torque } from '../phrase.ts';
import { compensatorDown, cracking, stopIn } from '../remedies.ts';
import { highest } from '../series.ts';

/** Relay trips, RMS over nameplate, small stall margin, supply out of band: what the duty does to the motor in the long run. */
export function motorHeatRules(context: FindingContext): Finding[] {
  return context.drives.flatMap((drive) => [
    ...trips(context, drive),
    ...over(context, drive),
    ...smallMargin(context, drive),
    ...supply(context, drive),
  ]);
}

/** A pump of this motor whose relief opens before its compensator. */
function hiddenPump(context: FindingContext, drive: DriveLoad): string | undefined {
  return drive.pumps.find((pump) =>
    reliefsOf(context, pump.id).some((relief) => cracking(context, relief.id) <= context.plate(pump.id).number('compensatorPressure')),
  )?.id;
}

function lighten(context: FindingContext, drive: DriveLoad, goal: 'not-tripping' | 'within-limits') {
  const hidden = hiddenPump(context, drive);
  if (hidden)
    return compensatorDown(
      context,
      hidden,
      say(
        'Turn the compensator down until it works before the relief: the pump then goes off stroke instead of pushing its flow over the relief.',
      ),
    );
  return stopIn(context, drive, goal, say('Turn the max. volume stop in: less flow, less torque at the same pressure.'));
}

function trips(context: FindingContext, drive: DriveLoad): Finding[] {
  const { yardsticks, facts } = drive;
  const relay = facts.relay;
  if (yardsticks.tripTime === null || !relay) return [];
  const motor = drive.component.id;
  const ultimate = relay.k * relay.dial;
  const carries = say('; dialled to ', current(relay.dial), ' the relay lets ', current(ultimate), ' pass for ever and trips on more.');
  const within = yardsticks.tripTime > context.end;
  const started = drive.running !== null;
  return [
    {
      id: `will-trip:${motor}`,
      rule: 'will-trip',
      severity: yardsticks.stalled || drive.running === null ? 1 : 0,
      verdict: 'trips',
      caseId: context.caseId,
      component: motor,
      headline: say('Overload relay trips in ', span(yardsticks.tripTime)),
      cause: yardsticks.stalled
        ? say('Stalled, the motor draws ', current(yardsticks.stallCurrent ?? 0, `${motor}.current`), carries)
        : !within || !started
          ? say(
              started ? 'In this run it draws ' : 'Without coming up to speed the motor draws ',
              current(context.at(`${motor}.current`, Math.max(0, Math.min(context.end, yardsticks.tripTime) - 0.05)), `${motor}.current`),
              started ? ' when the relay has warmed up to its trip point' : '',
              carries,
            )
          : say(
              'Repeated, the duty draws ',
              current(yardsticks.rmsCurrent * facts.ratedCurrent),
              ' RMS (',
              share(yardsticks.rmsCurrent),
              ' of nameplate)',
              carries,
            ),
      remedy:
        yardsticks.stalled || drive.running === null
          ? {
              words: say(
                yardsticks.stalled
                  ? 'Cure the stall first; a higher dial only lets the motor burn.'
                  : 'Cure the start first; a higher dial only lets the motor burn.',
              ),
            }
          : relay.dial < 0.95 * facts.ratedCurrent && yardsticks.rmsCurrent <= facts.serviceFactor && within
            ? {
                words: say(
                  'The motor stays inside its nameplate, ',
                  current(facts.ratedCurrent),
                  ', but the dial stands under it. Have the dial checked against the nameplate by a licensed electrician; never set it above.',
                ),
              }
            : lighten(context, drive, 'not-tripping'),
      caution: AFTER_A_TRIP,
    },
  ];
}

function over(context: FindingContext, drive: DriveLoad): Finding[] {
  const { yardsticks, facts } = drive;
  if (yardsticks.stalled || drive.running === null || outOfBand(context, drive) !== null || yardsticks.rmsCurrent <= facts.serviceFactor)
    return [];
  const motor = drive.component.id;
  return [
    {
      id: `over-nameplate:${motor}`,
      rule: 'over-nameplate',
      severity: 1,
      verdict: 'over',
      caseId: context.caseId,
      component: motor,
      headline: say('Motor over its nameplate, ', share(yardsticks.rmsCurrent), ' RMS'),
      cause: say(
        'Over the repeated duty the RMS current is ',
        current(yardsticks.rmsCurrent * facts.ratedCurrent),
        ' against ',
        current(facts.ratedCurrent),
        ' on the nameplate at service factor ',
        figure(facts.serviceFactor, 'number', { digits: 2 }),
        '; the peak is ',
        multiple(yardsticks.peakTorque),
        ' rated torque.',
      ),
      remedy:
        yardsticks.tripTime === null
          ? lighten(context, drive, 'within-limits')
          : { words: say('What keeps the overload relay from tripping brings the motor back to its nameplate, or nearly.') },
    },
  ];
}

function smallMargin(context: FindingContext, drive: DriveLoad): Finding[] {
  const { stallMargin } = drive.yardsticks;
  if (stallMargin === null || stallMargin >= LEAST_STALL_MARGIN || drive.running === null) return [];
  const motor = drive.component.id;
  const values = context.column(`${motor}.torque`);
  const peak = values ? highest(context.times, values, drive.running) : null;
  return [
    {
      id: `small-stall-margin:${motor}`,
      rule: 'small-stall-margin',
      severity: 2,
      caseId: context.caseId,
      component: motor,
      ...(peak ? { time: peak.time } : {}),
      headline: say('Stall margin ', margin(stallMargin)),
      cause: say(
        'The highest torque asked is ',
        torque(drive.yardsticks.peakTorque * drive.facts.ratedTorque),
        ' against a pull-out torque of ',
        torque(drive.lowestPullOut),
        ' at the lowest supply; the house rule asks for ',
        margin(LEAST_STALL_MARGIN),
        '.',
      ),
      remedy: lowVolts(context, drive)
        ? { words: say('Have the supply cured first by a licensed electrician; then look at the stop.') }
        : (weakMotor(context, drive) ??
          stopIn(context, drive, 'not-stalled-with-margin', say('Turn the max. volume stop in until the margin is there.'))),
    },
  ];
}

function supply(context: FindingContext, drive: DriveLoad): Finding[] {
  const volts = outOfBand(context, drive);
  if (volts === null) return [];
  const motor = drive.component.id;
  const rated = drive.facts.ratedVoltage;
  const kept = voltsShare(context, drive, volts);
  const off = Math.abs(kept - 1);
  const plate = context.plate(motor).number('ratedFrequency');
  const hertz = context.constants.supplyFrequency;
  const other = Math.abs(hertz - plate) > 0.5;
  return [
    {
      id: `supply-out-of-band:${motor}`,
      rule: 'supply-out-of-band',
      severity: 1,
      caseId: context.caseId,
      component: motor,
      headline: say('Supply ', share(off), kept < 1 ? ' under nameplate' : ' over nameplate', other ? ' in volts per hertz' : ''),
      cause: say(
        figure(volts, 'voltage', { address: `${motor}.terminalVoltage` }),
        other ? say(' at ', figure(hertz, 'frequency')) : '',
        ' at the terminals against ',
        figure(rated, 'voltage'),
        other ? say(' at ', figure(plate, 'frequency')) : '',
        ' on the nameplate: no nameplate rating applies. Pull-out torque is ',
        torque(drive.lowestPullOut),
        ' there.',
      ),
      remedy: { words: say('Have the supply cured first by a licensed electrician.') },
    },
  ];
}
