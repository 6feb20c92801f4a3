import { AFTER_A_TRIP } from '../cautions.ts';
import type { DriveLoad, FindingContext } from '../context.ts';
import type { Finding } from '../finding.ts';
import { VOLTAGE_BAND } from '../house-rules.ts';
import { coldOil, lowVolts, weakMotor } from '../motor-state.ts';
import { current, displacement, figure, moment, pressure, say, torque } from '../phrase.ts';
import { stopIn } from '../remedies.ts';
import { highest, lowest, median } from '../series.ts';

/** Motor stalls, dips past pull-out and recovers, does not come up to speed. */
export function motorRules(context: FindingContext): Finding[] {
  return context.drives.flatMap((drive) => {
    if (drive.running === null) return notUpToSpeed(context, drive);
    return drive.yardsticks.stalled ? [stalls(context, drive)] : dips(context, drive);
  });
}

function stalls(context: FindingContext, drive: DriveLoad): Finding {
  const { yardsticks, facts } = drive;
  const motor = drive.component.id;
  const time = yardsticks.stallTime ?? 0;
  const pump = drive.pumps[0]?.id;
  const speed = context.column(`${motor}.speed`);
  const crawl = speed && drive.stall ? Math.abs(median(context.times, speed, drive.stall)) : 0;
  const port = pump ? context.at(`${pump}.outlet.pressure`, time) : 0;
  const asks = pump
    ? say(
        'At ',
        pressure(port, `${pump}.outlet.pressure`),
        ' and ',
        displacement(context.at(`${pump}.displacement`, time), `${pump}.displacement`),
        ' the pump asks for the motor’s pull-out torque, ',
        torque(drive.lowestPullOut),
        '. ',
      )
    : say('The shaft asks for the motor’s pull-out torque, ', torque(drive.lowestPullOut), '. ');
  const low = lowVolts(context, drive);
  return {
    id: `motor-stalls:${motor}`,
    rule: 'motor-stalls',
    severity: 0,
    verdict: 'motor-stalls',
    caseId: context.caseId,
    component: motor,
    time,
    headline: say('Motor stalls at ', moment(time)),
    cause: say(
      asks,
      'After that it creeps at some ',
      figure(crawl, 'speed', { address: `${motor}.speed` }),
      ' and draws ',
      current(yardsticks.stallCurrent ?? 0, `${motor}.current`),
      ' against ',
      current(facts.ratedCurrent),
      ' on the nameplate.',
    ),
    remedy: low
      ? { words: say('Have the supply cured first by a licensed electrician; then look at the stop.') }
      : (weakMotor(context, drive) ??
        jammed(context, drive) ??
        coldOil(context) ??
        stopIn(
          context,
          drive,
          'not-stalled-with-margin',
          say('Turn the max. volume stop in: it takes torque off at every pressure and leaves dead-head pressure alone.'),
        )),
    caution: AFTER_A_TRIP,
    ...(pump ? { at: { pressure: port, flow: context.at(`${pump}.flow`, time) } } : {}),
  };
}

/** The oil asks for less than half of what takes the motor to its pull-out: friction in the pump takes the rest. null when it
 *  does not. */
function jammed(context: FindingContext, drive: DriveLoad) {
  const time = drive.yardsticks.stallTime ?? 0;
  const asked = drive.pumps.reduce((sum, { id }) => {
    const difference = context.at(`${id}.outlet.pressure`, time) - context.at(`${id}.suction.pressure`, time);
    return sum + Math.max(0, context.at(`${id}.displacement`, time) * difference);
  }, 0);
  if (drive.pumps.length === 0 || asked > 0.5 * drive.lowestPullOut || coldOil(context)) return null;
  return {
    words: say(
      'The oil itself asks for only ',
      torque(asked),
      ': the rest is friction. Lock out and turn the shaft by hand: a pump that seizes or runs dry, a bearing, a coupling out of line.',
    ),
  };
}

function dips(context: FindingContext, drive: DriveLoad): Finding[] {
  const first = drive.dips[0];
  if (!first) return [];
  const low = lowVolts(context, drive);
  const motor = drive.component.id;
  return [
    {
      id: `dips-and-recovers:${motor}`,
      rule: 'dips-and-recovers',
      severity: 1,
      caseId: context.caseId,
      component: motor,
      time: first.from,
      headline: say('Motor dips past pull-out at ', moment(first.from), ' and recovers'),
      cause: say(
        'For ',
        figure(first.to - first.from, 'time', { digits: 2 }),
        ' the shaft runs below pull-out speed, ',
        figure(drive.facts.pullOutSpeed, 'speed'),
        drive.voltage.low < (1 - VOLTAGE_BAND) * drive.facts.ratedVoltage
          ? say(
              ', because the supply falls to ',
              figure(drive.voltage.low, 'voltage', { address: `${motor}.terminalVoltage` }),
              ' at the terminals. A longer dip, a lower',
            )
          : say(', because more than pull-out torque, ', torque(drive.lowestPullOut), ', is asked. A lower'),
        ' voltage or a colder day makes a stall of it.',
      ),
      remedy: low
        ? { words: say('Have the supply cured first by a licensed electrician; then look at the stop.') }
        : (weakMotor(context, drive) ??
          stopIn(context, drive, 'not-stalled-with-margin', say('Turn the max. volume stop in until the dip is gone with margin.'))),
    },
  ];
}

function notUpToSpeed(context: FindingContext, drive: DriveLoad): Finding[] {
  const motor = drive.component.id;
  const amps = context.column(`${motor}.current`);
  const speed = context.column(`${motor}.speed`);
  const all = { from: 0, to: context.end };
  const peak = amps ? highest(context.times, amps, all).value : 0;
  if (!amps || !speed || context.run.status !== 'finished') return [];
  if (peak < 0.02 * drive.facts.ratedCurrent) return [neverOn(context, drive)];
  const back = lowest(context.times, speed, all);
  if (-back.value > drive.facts.pullOutSpeed && context.at(`${motor}.torque`, context.end) <= 0)
    return [turnsBackwards(context, drive, back)];
  const best = highest(context.times, speed, all);
  const asked = context.at(`${motor}.torque`, context.end);
  const still = best.value < 0.05 * drive.facts.pullOutSpeed;
  return [
    {
      id: `not-up-to-speed:${motor}`,
      rule: 'not-up-to-speed',
      severity: 0,
      verdict: 'motor-stalls',
      caseId: context.caseId,
      component: motor,
      time: best.time,
      headline: say('Motor does not come up to speed'),
      cause: say(
        'It gets no further than ',
        figure(Math.max(0, best.value), 'speed', { address: `${motor}.speed` }),
        '; pull-out speed is ',
        figure(drive.facts.pullOutSpeed, 'speed'),
        asked > 0.02 * drive.facts.ratedTorque
          ? say('. There the load takes all it gives, ', torque(asked), ', and it draws ')
          : '. It gives no starting torque, hums, and draws ',
        current(peak, `${motor}.current`),
        '.',
      ),
      remedy: lowVolts(context, drive)
        ? { words: say('Have the supply cured first by a licensed electrician; then start it unloaded.') }
        : (weakMotor(context, drive) ??
          coldOil(context) ?? {
            words: say(
              'Start it unloaded: valve at centre, outlet free to tank. If it is unloaded already, ',
              still ? 'lock out and turn the shaft by hand: a seized pump does not turn; then ' : '',
              'have the supply, all three legs and the winding checked by a licensed electrician.',
            ),
          }),
      caution: AFTER_A_TRIP,
    },
  ];
}

function neverOn(context: FindingContext, drive: DriveLoad): Finding {
  const motor = drive.component.id;
  return {
    id: `not-up-to-speed:${motor}`,
    rule: 'not-up-to-speed',
    severity: 2,
    caseId: context.caseId,
    component: motor,
    headline: say('Motor is never switched on'),
    cause: say('No flag of the tape closes its contactor, or it has no volts: it draws no current in this run.'),
    remedy: { words: say('Set a flag on the tape that starts it, or look at the supply’s volts.') },
  };
}

function turnsBackwards(context: FindingContext, drive: DriveLoad, back: { value: number; time: number }): Finding {
  const motor = drive.component.id;
  const pump = drive.pumps[0]?.id;
  return {
    id: `not-up-to-speed:${motor}`,
    rule: 'not-up-to-speed',
    severity: 0,
    verdict: 'motor-stalls',
    caseId: context.caseId,
    component: motor,
    time: back.time,
    headline: say('Motor turns the wrong way'),
    cause: say(
      'It runs backwards at ',
      figure(-back.value, 'speed', { address: `${motor}.speed` }),
      ' and draws ',
      current(context.at(`${motor}.current`, context.end), `${motor}.current`),
      '. ',
      pump ? `${context.name(pump)} draws oil out of its pressure line and runs dry.` : 'What it drives turns backwards.',
    ),
    remedy: {
      words: say(
        'Stop at once; a dry pump seizes. Have two of the three leads exchanged by a licensed electrician, then jog and compare with the arrow.',
      ),
    },
  };
}
