import { AFTER_A_TRIP } from '../cautions.ts';
import type { DriveLoad, FindingContext } from '../context.ts';
import type { Finding } from '../finding.ts';
import { VOLTAGE_BAND } from '../house-rules.ts';
import { current, displacement, figure, moment, pressure, say, torque } from '../phrase.ts';
import { stopIn } from '../remedies.ts';
import { highest, median } from '../series.ts';

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
  const low = lowVolts(drive);
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
      : stopIn(
          context,
          drive,
          'not-stalled-with-margin',
          say('Turn the max. volume stop in: it takes torque off at every pressure and leaves dead-head pressure alone.'),
        ),
    caution: AFTER_A_TRIP,
    ...(pump ? { at: { pressure: port, flow: context.at(`${pump}.flow`, time) } } : {}),
  };
}

function lowVolts(drive: DriveLoad): boolean {
  return drive.voltage.low < (1 - VOLTAGE_BAND) * drive.facts.ratedVoltage;
}

function dips(context: FindingContext, drive: DriveLoad): Finding[] {
  const first = drive.dips[0];
  if (!first) return [];
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
        ', because more than pull-out torque, ',
        torque(drive.lowestPullOut),
        ', is asked. A lower voltage or a colder day makes a stall of it.',
      ),
      remedy: stopIn(context, drive, 'not-stalled-with-margin', say('Turn the max. volume stop in until the dip is gone with margin.')),
    },
  ];
}

function notUpToSpeed(context: FindingContext, drive: DriveLoad): Finding[] {
  const motor = drive.component.id;
  const amps = context.column(`${motor}.current`);
  const speed = context.column(`${motor}.speed`);
  const all = { from: 0, to: context.end };
  const peak = amps ? highest(context.times, amps, all).value : 0;
  if (!amps || !speed || peak < 0.02 * drive.facts.ratedCurrent || context.run.status !== 'finished') return [];
  const best = highest(context.times, speed, all);
  const asked = context.at(`${motor}.torque`, context.end);
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
        figure(best.value, 'speed', { address: `${motor}.speed` }),
        '; pull-out speed is ',
        figure(drive.facts.pullOutSpeed, 'speed'),
        '. There the load takes all it gives, ',
        torque(asked),
        ', and it draws ',
        current(peak, `${motor}.current`),
        '.',
      ),
      remedy: {
        words: say(
          'Start it unloaded: valve at centre, outlet free to tank. If it is unloaded already, have the supply and the winding checked by a licensed electrician.',
        ),
      },
      caution: AFTER_A_TRIP,
    },
  ];
}
