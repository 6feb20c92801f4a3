import type { Component } from '../../circuit/schema.ts';
import type { NumberParameter } from '../../kinds/kind.ts';
import { kindOf } from '../../kinds/registry.ts';
import { RELIEF_IS_THE_SAFETY_DEVICE } from '../cautions.ts';
import type { FindingContext } from '../context.ts';
import type { Finding } from '../finding.ts';
import { figure, pressure, say } from '../phrase.ts';
import { lowestRating } from '../remedies.ts';
import { highest, stretches } from '../series.ts';
import { feedingPumps } from '../supply-path.ts';

/** Above a rating; intensification on the rod side; an external load that pushes pressure above the compensator. A value
 *  above a rating runs as a trial and is never recommended. */
export function ratingRules(context: FindingContext): Finding[] {
  return [
    ...context.seen.components.flatMap((component) => aboveRating(context, component)),
    ...settings(context),
    ...context.ofKind('cylinder').flatMap((cylinder) => [...intensified(context, cylinder), ...pushed(context, cylinder)]),
  ];
}

/** Shorter than this is a spike of the model's own stiffness, not a load [s]. */
const SUSTAINED = 0.02;

function aboveRating(context: FindingContext, component: Component): Finding[] {
  const kind = kindOf(component.kind);
  if (!kind) return [];
  return kind.parameters.flatMap((spec) => {
    if (spec.type !== 'number' || !spec.rating) return [];
    const rating = context.plate(component.id).given(spec.id) ?? spec.initial;
    const address = `${component.id}.${spec.rating.of}`;
    const values = context.column(address);
    if (rating === null || !values) return [];
    const peak = highest(context.times, values, { from: 0, to: context.end });
    return peak.value > rating ? [rated(context, component, spec, rating, address, peak)] : [];
  });
}

function rated(
  context: FindingContext,
  component: Component,
  spec: NumberParameter,
  rating: number,
  address: string,
  peak: { value: number; time: number },
): Finding {
  const name = context.name(component.id);
  return {
    id: `above-rating:${component.id}.${spec.id}`,
    rule: 'above-rating',
    severity: 0,
    verdict: 'above-rating',
    caseId: context.caseId,
    component: component.id,
    time: peak.time,
    headline: say(`${name} above its rating`),
    cause: say(
      `It sees `,
      figure(peak.value, spec.quantity, { address }),
      '; the plate allows ',
      figure(rating, spec.quantity, { address: `${component.id}.${spec.id}` }),
      '. The run went on as a trial.',
    ),
    remedy: { words: say('Lower what drives it there: the setting, the load or the flow. No part works above its rating.') },
    caution: RELIEF_IS_THE_SAFETY_DEVICE,
  };
}

/** A compensator or relief set above the lowest rating it can load. */
function settings(context: FindingContext): Finding[] {
  const set = [
    ...context
      .ofKind('compensated-pump')
      .map((pump) => ({ id: pump.id, port: `${pump.id}.outlet`, field: 'compensatorPressure', word: 'compensator' })),
    ...context.ofKind('relief-valve').map((relief) => ({ id: relief.id, port: `${relief.id}.P`, field: 'setPressure', word: 'relief' })),
  ];
  return set.flatMap(({ id, port, field, word }) => {
    const value = context.plate(id).number(field);
    const lowest = lowestRating(context, port);
    if (!lowest || value <= lowest.pressure) return [];
    const part = context.name(lowest.component);
    return [
      {
        id: `above-rating:${id}.${field}`,
        rule: 'above-rating' as const,
        severity: 0 as const,
        verdict: 'above-rating' as const,
        caseId: context.caseId,
        component: id,
        headline: say(`${context.name(id)}: ${word} set above the rating of ${part}`),
        cause: say(
          `The ${word} is set to `,
          pressure(value, `${id}.${field}`),
          `; ${part} on the same net is rated `,
          pressure(lowest.pressure, `${lowest.component}.ratedPressure`),
          '. The run went on as a trial.',
        ),
        remedy: {
          words: say('Back to ', pressure(lowest.pressure), ' or less: the lowest rating in the net is the ceiling for every setting.'),
        },
        caution: RELIEF_IS_THE_SAFETY_DEVICE,
      },
    ];
  });
}

/** Rod-side pressure well above what the pump gives, while the cap side is under pressure. */
function intensified(context: FindingContext, cylinder: Component): Finding[] {
  const id = cylinder.id;
  const cap = context.column(`${id}.A.pressure`);
  const rod = context.column(`${id}.B.pressure`);
  if (!cap || !rod) return [];
  const plate = context.plate(id);
  const ratio = plate.number('bore') ** 2 / (plate.number('bore') ** 2 - plate.number('rod') ** 2);
  const supplied = Math.max(0, ...feedingPumps(context, id).map((pump) => peakOf(context, `${pump}.outlet.pressure`)));
  const stretch = stretches(context.times, (i) => Math.min(rod[i]! - 1.05 * Math.max(supplied, cap[i]!), cap[i]! - 5e5), SUSTAINED)[0];
  if (!stretch) return [];
  const peak = highest(context.times, rod, stretch);
  // Under what the compensator may bring there anyway it is how a throttled rod side works: a note.
  const deadHead = Math.max(0, ...feedingPumps(context, id).map((pump) => context.plate(pump).number('compensatorPressure')));
  return [
    {
      id: `intensification:${id}`,
      rule: 'intensification',
      severity: peak.value > deadHead ? 1 : 3,
      caseId: context.caseId,
      component: id,
      time: peak.time,
      headline: say(`Rod side of ${context.name(id)} intensified to `, pressure(peak.value)),
      cause: say(
        'Oil is held back on the rod side while the cap side stands at ',
        pressure(context.at(`${id}.A.pressure`, peak.time), `${id}.A.pressure`),
        ': the areas turn it into ',
        pressure(peak.value, `${id}.B.pressure`),
        ' (area ratio ',
        figure(ratio, 'number', { digits: 2 }),
        '). The pump never gives more than ',
        pressure(supplied),
        '.',
      ),
      remedy: {
        words: say(
          'Open what throttles the rod side, or lower the supply pressure; check every part on the rod side against this pressure.',
        ),
      },
      caution: RELIEF_IS_THE_SAFETY_DEVICE,
    },
  ];
}

function peakOf(context: FindingContext, address: string): number {
  const values = context.column(address);
  return values ? Math.max(0, highest(context.times, values, { from: 0, to: context.end }).value) : 0;
}

/** A load that drives a chamber above the compensator's dead-head. */
function pushed(context: FindingContext, cylinder: Component): Finding[] {
  const id = cylinder.id;
  const pump = feedingPumps(context, id)[0];
  if (!pump) return [];
  const deadHead = context.plate(pump).number('compensatorPressure');
  const cap = context.column(`${id}.A.pressure`);
  const rod = context.column(`${id}.B.pressure`);
  const outlet = context.column(`${pump}.outlet.pressure`);
  if (!cap || !rod || !outlet) return [];
  // Oil that the pump has pushed up and a check valve has shut in is no load: compare with the highest outlet pressure so far.
  const ceiling = runningMost(outlet);
  const side = [
    { port: 'A', word: 'cap side', values: cap, other: rod },
    { port: 'B', word: 'rod side', values: rod, other: cap },
  ]
    .map((entry) => ({
      ...entry,
      stretch: stretches(
        context.times,
        (i) => Math.min(entry.values[i]! - 1.03 * Math.max(deadHead, ceiling[i]!), entry.values[i]! - 1.05 * entry.other[i]!),
        0.1,
      )[0],
    }))
    .find((entry) => entry.stretch);
  if (!side?.stretch || (side.port === 'B' && cap.some((value, i) => context.times[i]! >= side.stretch!.from && value > 5e5))) return [];
  const peak = highest(context.times, side.values, side.stretch);
  const net = context.reach.always(`${id}.${side.port}`);
  const relief = context.ofKind('relief-valve').find((entry) => net.has(context.reach.netOf(`${entry.id}.P`)));
  return [
    {
      id: `load-above-compensator:${id}`,
      rule: 'load-above-compensator',
      severity: 1,
      caseId: context.caseId,
      component: id,
      time: peak.time,
      headline: say(`The load pushes ${context.name(id)} above the compensator`),
      cause: say(
        `On the ${side.word} an external force makes `,
        pressure(peak.value, `${id}.${side.port}.pressure`),
        '; the compensator stops the pump at ',
        pressure(deadHead),
        ' but cannot hold a load back. ',
        relief ? say(`Only ${context.name(relief.id)} limits it.`) : 'No relief is reached from there whatever the valve does.',
      ),
      remedy: { words: say('A relief on the cylinder’s own port limits it; the compensator never does.') },
      caution: RELIEF_IS_THE_SAFETY_DEVICE,
    },
  ];
}

function runningMost(values: Float64Array): Float64Array {
  const most = Float64Array.from(values);
  for (let i = 1; i < most.length; i++) most[i] = Math.max(most[i]!, most[i - 1]!);
  return most;
}
