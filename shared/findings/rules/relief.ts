import type { Component } from '../../circuit/schema.ts';
import { HELD_RELIEF } from '../cautions.ts';
import type { FindingContext } from '../context.ts';
import { reliefsOf } from '../context.ts';
import type { Finding } from '../finding.ts';
import { GAUGE_ERROR, GAUGE_ERROR_UNKNOWN, LEAST_RELIEF_GAP, PASSING_LEAST, PASSING_SHARE, PASSING_TIME } from '../house-rules.ts';
import { flow, heat, pressure, say, span } from '../phrase.ts';
import { compensatorDown, cracking, weakRelief } from '../remedies.ts';
import { highest, mean, stretches, type Window } from '../series.ts';

/** Relief against compensator: which opens first, how close they stand, and whether the relief passes oil for long. Every gap
 *  is taken from dead-head to cracking or reseat, never to the set pressure (MODEL.md). */
export function reliefRules(context: FindingContext): Finding[] {
  const pairs = context.ofKind('compensated-pump').flatMap((pump) => reliefsOf(context, pump.id).map((relief) => ({ pump, relief })));
  const passing = context
    .ofKind('relief-valve')
    .flatMap((relief) => passes(context, relief, pairs.find((pair) => pair.relief === relief)?.pump));
  return [...passing, ...pairs.flatMap(({ pump, relief }) => gaps(context, pump, relief))];
}

/** Stretches in which a relief passes oil long enough to be a heater [s]. */
export function passingStretches(context: FindingContext, relief: string): Window[] {
  const values = context.column(`${relief}.flow`);
  if (!values) return [];
  const level = Math.max(PASSING_LEAST, PASSING_SHARE * fullFlow(context));
  return stretches(context.times, (i) => values[i]! - level, PASSING_TIME);
}

function fullFlow(context: FindingContext): number {
  const flows = context.ofKind('compensated-pump').map((pump) => context.column(`${pump.id}.flow`));
  return Math.max(0, ...flows.map((values) => (values ? highest(context.times, values, { from: 0, to: context.end }).value : 0)));
}

function passes(context: FindingContext, relief: Component, pump: Component | undefined): Finding[] {
  const windows = passingStretches(context, relief.id);
  const longest = [...windows].sort((a, b) => b.to - b.from - (a.to - a.from))[0];
  const values = context.column(`${relief.id}.flow`);
  if (!longest || !values) return [];
  const warm = context.column(`${relief.id}.heat`);
  const amount = mean(context.times, values, longest);
  const power = warm ? mean(context.times, warm, longest) : 0;
  const drop = context.at(`${relief.id}.P.pressure`, (longest.from + longest.to) / 2);
  const cracks = cracking(context, relief.id);
  const deadHead = pump ? context.plate(pump.id).number('compensatorPressure') : Number.POSITIVE_INFINITY;
  const reseat = cracks * context.plate(relief.id).number('reseat');
  // Oil that crosses well under the pressure at which the valve should be shut again: the valve, not a setting.
  const stuck = drop < 0.95 * reseat;
  const hidden = !stuck && pump !== undefined && cracks <= deadHead;
  // A peak opened it, and dead-head lies above the pressure at which it closes again.
  const unseated = !stuck && !hidden && pump !== undefined && drop < cracks && drop <= 1.02 * deadHead;
  return [
    {
      id: `relief-passing:${relief.id}`,
      rule: 'relief-passing',
      severity: 0,
      verdict: 'relief-passing',
      caseId: context.caseId,
      component: relief.id,
      time: longest.from,
      headline: say(`${context.name(relief.id)} passes `, flow(amount, `${relief.id}.flow`), ' as heat'),
      cause: say(
        'For ',
        span(longest.to - longest.from),
        ' from ',
        span(longest.from),
        ' on it passes ',
        flow(amount, `${relief.id}.flow`),
        ' at ',
        pressure(drop, `${relief.id}.P.pressure`),
        ': ',
        heat(power),
        ' of heat. ',
        stuck
          ? say('It should crack at ', pressure(cracks), ' and be shut again at ', pressure(reseat), '.')
          : hidden
            ? say('It opens at ', pressure(cracks), '; the compensator would go to zero flow only at ', pressure(deadHead), '.')
            : unseated
              ? say(
                  'A peak opened it at ',
                  pressure(cracks),
                  '; it closes again only at ',
                  pressure(reseat),
                  ', and the compensator keeps the line at ',
                  pressure(deadHead),
                  '.',
                )
              : 'The pump does not go off stroke before the relief opens.',
      ),
      remedy:
        hidden && pump
          ? (weakRelief(context, pump.id, relief.id) ??
            compensatorDown(
              context,
              pump.id,
              say('Turn the compensator down until it works before the relief. A higher relief is not a cure.'),
            ))
          : unseated && pump
            ? compensatorDown(
                context,
                pump.id,
                say(
                  'Turn the compensator down until dead-head lies under the pressure at which the relief closes. A higher relief is not a cure.',
                ),
              )
            : stuck
              ? {
                  words: say(
                    'Have the relief taken out and looked at: dirt under the seat, a broken spring. Turning its screw does not cure it.',
                  ),
                }
              : {
                  words: say(
                    'Find why the pump does not go off stroke: compensator, its pilot line, a stuck swash plate, or a minimum stop wound in.',
                  ),
                },
      caution: HELD_RELIEF,
      at: { pressure: drop, flow: amount },
    },
  ];
}

function gaps(context: FindingContext, pump: Component, relief: Component): Finding[] {
  const deadHead = context.plate(pump.id).number('compensatorPressure');
  const cracks = cracking(context, relief.id);
  const reseat = cracks * context.plate(relief.id).number('reseat');
  const names = { relief: context.name(relief.id), pump: context.name(pump.id) };
  const base = { caseId: context.caseId, component: relief.id };
  if (cracks <= deadHead) {
    const passed = context.run.events.find((event) => event.component === relief.id && event.rising);
    return [
      {
        ...base,
        id: `relief-before-compensator:${relief.id}`,
        rule: 'relief-before-compensator',
        severity: passed ? 1 : 2,
        ...(passed ? { time: passed.time } : {}),
        headline: say(`${names.pump} never compensates: ${names.relief} opens first`),
        cause: say(
          `${names.relief} cracks at `,
          pressure(cracks, `${relief.id}.cracksAt`),
          '; the compensator reaches zero flow at ',
          pressure(deadHead),
          '. Pressure cannot get there, so the pump stays on stroke and its flow crosses the relief.',
        ),
        remedy:
          weakRelief(context, pump.id, relief.id) ??
          compensatorDown(
            context,
            pump.id,
            say(
              'Turn the compensator down first, until dead-head lies ',
              pressure(LEAST_RELIEF_GAP),
              ' under cracking. A higher relief is not a cure.',
            ),
          ),
      },
    ];
  }
  const error = gaugeError(context, relief.id);
  const needed = Math.max(LEAST_RELIEF_GAP, error);
  const gap = cracks - deadHead;
  if (gap >= needed && reseat >= deadHead) return [];
  const close = gap < needed;
  return [
    {
      ...base,
      id: `relief-gap-small:${relief.id}`,
      rule: 'relief-gap-small',
      severity: close ? 2 : 3,
      headline: close
        ? say(`${names.relief} cracks only `, pressure(gap), ' above dead-head')
        : say(`${names.relief} reseats under dead-head`),
      cause: close
        ? say(
            `${names.relief} cracks at `,
            pressure(cracks, `${relief.id}.cracksAt`),
            ', dead-head is ',
            pressure(deadHead),
            '; the house rule asks for ',
            pressure(LEAST_RELIEF_GAP),
            ' and the gauge cannot tell ',
            pressure(error),
            ' apart.',
          )
        : say(
            `Once open, ${names.relief} closes again only at `,
            pressure(reseat),
            '; dead-head is ',
            pressure(deadHead),
            '. A pressure peak can leave it passing.',
          ),
      remedy: close
        ? compensatorDown(context, pump.id, say('Turn the compensator down until the gap is there. A higher relief is not a cure.'))
        : {
            words: say(
              'Read the gauge at dead-head after a peak; feel nothing by hand. If the relief keeps passing, a lower compensator lets it close.',
            ),
          },
    },
  ];
}

/** What the gauge on the relief's net cannot tell apart [Pa]. */
function gaugeError(context: FindingContext, relief: string): number {
  const nets = new Set([...context.reach.loaded(`${relief}.P`), context.reach.netOf(`${relief}.P`)]);
  const ranges = context
    .ofKind('pressure-gauge')
    .filter((gauge) => nets.has(context.reach.netOf(`${gauge.id}.M`)))
    .map((gauge) => context.plate(gauge.id).number('range'));
  return ranges.length > 0 ? GAUGE_ERROR * Math.min(...ranges) : GAUGE_ERROR_UNKNOWN;
}
