import { LOAD_HOLDING, RELIEF_IS_THE_SAFETY_DEVICE } from '../cautions.ts';
import type { DriveLoad, FindingContext } from '../context.ts';
import { reliefsOf } from '../context.ts';
import type { Finding } from '../finding.ts';
import { figure, pressure, say } from '../phrase.ts';
import { highest, integrate, lowest, mean, stretches, type Window } from '../series.ts';
import { feedingPumps } from '../supply-path.ts';

/** No relief protects a net; the load drives the pump backwards; pressure left behind a closed valve. */
export function protectionRules(context: FindingContext): Finding[] {
  return [...unprotectedPumps(context), ...unprotectedChambers(context), ...backwards(context), ...left(context)];
}

/** A pump outlet from which no relief, and no tank, is always reached. A relief whose own tank port leads nowhere is none. */
function unprotectedPumps(context: FindingContext): Finding[] {
  return context.ofKind('compensated-pump').flatMap((pump) => {
    const nets = context.reach.always(`${pump.id}.outlet`);
    const free = context.ofKind('tank').some((tank) => nets.has(context.reach.netOf(`${tank.id}.T`)));
    const reliefs = reliefsOf(context, pump.id);
    const working = reliefs.filter((relief) => context.plate(relief.id).number('fault.stuck-shut') < 0.5);
    const shut = reliefs[0] ? context.name(reliefs[0].id) : null;
    if (free || working.length > 0) return [];
    const values = context.column(`${pump.id}.outlet.pressure`);
    const peak = values ? highest(context.times, values, { from: 0, to: context.end }) : null;
    return [
      {
        id: `no-relief:${pump.id}`,
        rule: 'no-relief' as const,
        severity: 0 as const,
        verdict: 'above-rating' as const,
        caseId: context.caseId,
        component: pump.id,
        ...(peak ? { time: peak.time } : {}),
        headline: say(`No relief protects the outlet of ${context.name(pump.id)}`),
        cause: say(
          shut ? `${shut} is on its line but stuck shut.` : 'From this pump no relief is reached whatever the valves do.',
          ' The compensator is set to ',
          pressure(context.plate(pump.id).number('compensatorPressure')),
          '; it is a control and can stick.',
          peak ? say(' The highest pressure of this run is ', pressure(peak.value, `${pump.id}.outlet.pressure`), '.') : '',
        ),
        remedy: {
          words: say(
            shut
              ? `Stop, and have ${shut} replaced or repaired and proved before the pump runs again. Turning its screw does not cure it.`
              : 'Join a relief to the pump line, before the first valve that can close, sized for the whole flow with the compensator failed.',
          ),
        },
        caution: RELIEF_IS_THE_SAFETY_DEVICE,
      },
    ];
  });
}

/** A chamber that something drives above all that a pump or its relief can make, with no relief of its own. */
function unprotectedChambers(context: FindingContext): Finding[] {
  return context.ofKind('cylinder').flatMap((cylinder) => {
    const pumps = feedingPumps(context, cylinder.id);
    const ceiling = Math.max(
      5e5,
      ...pumps.flatMap((pump) => [
        context.plate(pump).number('compensatorPressure'),
        ...reliefsOf(context, pump).map((relief) => context.plate(relief.id).number('setPressure')),
      ]),
    );
    return (['A', 'B'] as const).flatMap((port) => {
      const values = context.column(`${cylinder.id}.${port}.pressure`);
      const nets = context.reach.always(`${cylinder.id}.${port}`);
      if (!values || context.ofKind('relief-valve').some((relief) => nets.has(context.reach.netOf(`${relief.id}.P`)))) return [];
      const stretch = stretches(context.times, (i) => values[i]! - 1.05 * ceiling, 0.02)[0];
      if (!stretch) return [];
      const peak = highest(context.times, values, stretch);
      const side = port === 'A' ? 'cap side' : 'rod side';
      return [
        {
          id: `no-relief:${cylinder.id}.${port}`,
          rule: 'no-relief' as const,
          severity: 0 as const,
          verdict: 'above-rating' as const,
          caseId: context.caseId,
          component: cylinder.id,
          time: peak.time,
          headline: say(`No relief protects the ${side} of ${context.name(cylinder.id)}`),
          cause: say(
            'It reaches ',
            pressure(peak.value, `${cylinder.id}.${port}.pressure`),
            ', above ',
            pressure(ceiling),
            ', the most that pump and relief can make, and no relief is reached from there whatever the valve does.',
          ),
          remedy: {
            words: say('Give this side a relief of its own, or take away what drives it: a throttled rod side, a load that pushes.'),
          },
          caution: RELIEF_IS_THE_SAFETY_DEVICE,
        },
      ];
    });
  });
}

/** Turning back this fast counts [rad/s]. */
const BACKWARDS = 2;
/** …and this far [rad]: oil pressed together between pump and check valve springs the shaft back by less. */
const A_TURN = 2 * Math.PI;

function backwards(context: FindingContext): Finding[] {
  return context.drives.flatMap((drive) => {
    if (drive.pumps.length === 0) return [];
    const motor = drive.component.id;
    const speed = context.column(`${motor}.speed`);
    const torque = context.column(`${motor}.torque`);
    if (!speed) return [];
    // A motor that itself pulls backwards (two leads exchanged) is no load that drives.
    const stretch = stretches(context.times, (i) => -speed[i]! - BACKWARDS, 0.02).find(
      (window) => -integrate(context.times, speed, window) >= A_TURN && !(torque && drivenBackwards(context, drive, torque, window)),
    );
    if (!stretch) return [];
    const worst = lowest(context.times, speed, stretch);
    const pump = drive.pumps[0]!.id;
    return [
      {
        id: `load-drives-pump:${motor}`,
        rule: 'load-drives-pump' as const,
        severity: 0 as const,
        caseId: context.caseId,
        component: pump,
        time: stretch.from,
        headline: say(`The load drives ${context.name(pump)} backwards`),
        cause: say(
          'At ',
          pressure(context.at(`${pump}.outlet.pressure`, worst.time), `${pump}.outlet.pressure`),
          ' in the pump line and no motor torque against it the shaft turns back at ',
          figure(-worst.value, 'speed', { address: `${motor}.speed` }),
          '. A motor that is off or stalled does not stop it.',
        ),
        remedy: { words: say('A check valve at the pump’s outlet keeps the oil in the line; the load itself must be blocked.') },
        caution: LOAD_HOLDING,
      },
    ];
  });
}

/** The field turns backwards: the motor draws current and is not braking. */
function drivenBackwards(context: FindingContext, drive: DriveLoad, torque: Float64Array, window: Window): boolean {
  const amps = context.column(`${drive.component.id}.current`);
  if (!amps || mean(context.times, amps, window) < 0.02 * drive.facts.ratedCurrent) return false;
  return mean(context.times, torque, window) < -1e-3 * drive.facts.ratedTorque;
}

function left(context: FindingContext): Finding[] {
  const nets = [...context.run.pressureLeft].sort((a, b) => b.pressure - a.pressure);
  const first = nets[0];
  if (!first) return [];
  const hung = context
    .ofKind('cylinder')
    .some((cylinder) => context.plate(cylinder.id).number('angle') !== 0 && context.plate(cylinder.id).number('mass') >= 50);
  return [
    {
      id: `pressure-left:${first.net}`,
      rule: 'pressure-left',
      severity: 3,
      caseId: context.caseId,
      component: first.net.split('.')[0] ?? '',
      time: context.end,
      headline: say(pressure(first.pressure), ` left at ${first.label} after the last command`),
      cause: say(
        ...nets.flatMap((net, i) => [i === 0 ? '' : '; ', `${net.label} `, pressure(net.pressure, `${net.net}.pressure`)]),
        '. Each is shut off: a gauge elsewhere does not show it.',
      ),
      remedy: { words: say('Let pressure down at each of these places and prove zero there before any joint is opened.') },
      ...(hung ? { caution: LOAD_HOLDING } : {}),
    },
  ];
}
