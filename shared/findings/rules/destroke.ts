import { RELIEF_IS_THE_SAFETY_DEVICE } from '../cautions.ts';
import type { FindingContext } from '../context.ts';
import type { Finding } from '../finding.ts';
import { GAUGE_ERROR_UNKNOWN, PASSING_LEAST } from '../house-rules.ts';
import { displacement, flow, pressure, say } from '../phrase.ts';
import { mean, stretches } from '../series.ts';

/** A pump that goes on giving flow above its compensator setting: minimum stop, case-drain pressure, or something that sticks. */

/** Shorter than this is overshoot while the swash plate still moves [s]. Choice of the model. */
const LASTS = 0.3;
/** Above the setting by this share, and by no less than a gauge can tell. Choice of the model. */
const ABOVE = 0.03;
/** Case-drain pressure that is worth naming [Pa]: healthy cases stand under it. Choice of the model. */
const CASE = 2e5;

export function destrokeRules(context: FindingContext): Finding[] {
  return context.ofKind('compensated-pump').flatMap((pump) => notOffStroke(context, pump.id));
}

function notOffStroke(context: FindingContext, id: string): Finding[] {
  const outlet = context.column(`${id}.outlet.pressure`);
  const given = context.column(`${id}.flow`);
  if (!outlet || !given) return [];
  const plate = context.plate(id);
  const commanded = context.seen.duty.commands.filter((command) => command.target === id && command.input === 'compensatorPressure');
  const setting = Math.max(plate.number('compensatorPressure'), ...commanded.map((command) => command.value));
  const level = setting + Math.max(ABOVE * setting, GAUGE_ERROR_UNKNOWN);
  const window = stretches(context.times, (i) => Math.min(outlet[i]! - level, (given[i]! - PASSING_LEAST) * 1e9), LASTS)[0];
  if (!window) return [];
  const name = context.name(id);
  const average = (address: string) => {
    const values = context.column(address);
    return values ? mean(context.times, values, window) : 0;
  };
  const stands = average(`${id}.outlet.pressure`);
  const drain = average(`${id}.drain.pressure`);
  const least = plate.number('minVolumeStop');
  const blocked = drain > CASE;
  const wound = !blocked && least > 0.02 * plate.number('displacement');
  return [
    {
      id: `does-not-destroke:${id}`,
      rule: 'does-not-destroke',
      severity: 1,
      caseId: context.caseId,
      component: id,
      time: window.from,
      headline: say(`${name} does not go off stroke at its setting`),
      cause: say(
        `${name} stands at `,
        pressure(stands, `${id}.outlet.pressure`),
        ', its compensator is set to ',
        pressure(setting),
        ', and it still gives ',
        flow(average(`${id}.flow`), `${id}.flow`),
        blocked
          ? say('. The case drain stands at ', pressure(drain, `${id}.drain.pressure`), ', which adds to the setting bar for bar.')
          : wound
            ? say('. The minimum volume stop keeps it at ', displacement(least), '.')
            : say('. Its displacement stays at ', displacement(average(`${id}.displacement`), `${id}.displacement`), '.'),
      ),
      remedy: {
        words: say(
          blocked
            ? 'Free the case line: nothing may shut or throttle it. The shaft seal gives way first.'
            : wound
              ? 'Drive stopped, turn the minimum volume stop out until the pump can go to zero flow.'
              : 'Compensator spool, its pilot line or the swash plate sticks. Stop, and have it taken out and looked at; turning the compensator does not cure it.',
        ),
      },
      caution: RELIEF_IS_THE_SAFETY_DEVICE,
      at: { pressure: stands, flow: average(`${id}.flow`) },
    },
  ];
}
