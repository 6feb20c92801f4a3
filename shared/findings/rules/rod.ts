import type { Component } from '../../circuit/schema.ts';
import type { FindingContext } from '../context.ts';
import { reliefsOf } from '../context.ts';
import type { Finding, Phrase } from '../finding.ts';
import { AT_REST, PASSING_LEAST } from '../house-rules.ts';
import { figure, flow, force, pressure, say } from '../phrase.ts';
import { compensatorUp, cracking } from '../remedies.ts';
import { mean, stretches, type Window } from '../series.ts';
import { commandOf, feedingPumps } from '../supply-path.ts';

/** A rod that stops short: commanded, at rest, neither at an end nor at the force it needs. */
export function rodRules(context: FindingContext): Finding[] {
  return context.ofKind('cylinder').flatMap((cylinder) => stopsShort(context, cylinder));
}

const REST_TIME = 0.3;
/** At an end: within this of it [m]. */
const END = 1e-3;
/** While another rod moves above this [m/s], the oil goes there first: waiting is not stopping short. */
const MOVES = 5e-3;
/** A driven side under this is drawn ahead of its oil by the load: it waits for the pump [Pa gauge]. */
const VOID = -0.1e5;
/** Force counts as reached from this share on. */
const ENOUGH = 0.995;

/** Force that the job needs at this rod [N]; null when nobody has said. */
export function neededForce(context: FindingContext, cylinder: string): number | null {
  const asked = context.seen.requirements
    .filter((requirement) => requirement.quantity === `${cylinder}.loadForce` || requirement.quantity === `${cylinder}.force`)
    .map((requirement) => (requirement.measure === 'time to reach' ? requirement.at : requirement.min))
    .filter((value): value is number => value !== undefined);
  if (asked.length > 0) return Math.max(...asked);
  const plate = context.plate(cylinder);
  const entered = plate.given('requiredForce');
  if (entered !== null && entered > 0) return entered;
  const work = plate.number('workForce');
  return work > 0 ? work : null;
}

function stopsShort(context: FindingContext, cylinder: Component): Finding[] {
  const id = cylinder.id;
  const plate = context.plate(id);
  const position = context.column(`${id}.position`);
  const velocity = context.column(`${id}.velocity`);
  const load = context.column(`${id}.loadForce`);
  const cap = context.column(`${id}.A.pressure`);
  const rod = context.column(`${id}.B.pressure`);
  const command = commandOf(context, id);
  if (!position || !velocity || !cap || !rod || !command) return [];
  const stroke = plate.number('stroke');
  const needed = neededForce(context, id);
  const speeds = context.drives.map((drive) => ({
    values: context.column(`${drive.component.id}.speed`),
    least: drive.facts.pullOutSpeed,
  }));
  const turning = (i: number) => speeds.length === 0 || speeds.some(({ values, least }) => values !== null && values[i]! >= least);
  const others = context
    .ofKind('cylinder')
    .filter((entry) => entry.id !== id)
    .map((entry) => context.column(`${entry.id}.velocity`));
  const othersMove = (i: number) => others.some((values) => values !== null && Math.abs(values[i]!) > MOVES);
  const stuck = stretches(
    context.times,
    (i) => {
      const x = position[i]!;
      const way = command(i);
      if (way === 0 || !turning(i) || Math.abs(velocity[i]!) >= AT_REST) return -1;
      if (othersMove(i)) return -1;
      if ((way > 0 ? cap[i]! : rod[i]!) < VOID) return -1;
      if ((way > 0 && x > stroke - END) || (way < 0 && x < END)) return -1;
      if (way > 0 && needed !== null && load && load[i]! >= ENOUGH * needed) return -1;
      return 1;
    },
    REST_TIME,
  );
  const window = stuck[0];
  if (!window) return [];
  const middle = (window.from + window.to) / 2;
  const row = Math.max(
    0,
    context.times.findIndex((time) => time >= middle),
  );
  return [finding(context, id, window, needed, command(row) < 0 ? 'B' : 'A')];
}

function finding(context: FindingContext, id: string, window: Window, needed: number | null, side: 'A' | 'B'): Finding {
  const load = context.column(`${id}.loadForce`);
  const asked = load ? mean(context.times, load, window) : 0;
  const output = context.column(`${id}.force`);
  // A load that rests on the end of the stroke asks for more than the rod pushes.
  const available = output && side === 'A' ? Math.min(asked, Math.max(0, mean(context.times, output, window))) : asked;
  const at = (window.from + window.to) / 2;
  const driven = context.at(`${id}.${side}.pressure`, at);
  const place = Math.max(0, context.at(`${id}.position`, at));
  const name = context.name(id);
  const pump = feedingPumps(context, id)[0];
  const relief =
    pump && reliefsOf(context, pump).find((entry) => context.at(`${entry.id}.P.pressure`, at) >= 0.98 * cracking(context, entry.id));
  const deadHead = pump ? context.plate(pump).number('compensatorPressure') : 0;
  const compensated = pump !== undefined && context.at(`${pump}.outlet.pressure`, at) > 0.95 * deadHead;
  const limit = relief
    ? say(
        ` ${context.name(relief.id)} opens at `,
        pressure(cracking(context, relief.id), `${relief.id}.cracksAt`),
        ' and lets no more pressure build.',
      )
    : compensated
      ? say(' The compensator stops at ', pressure(deadHead), '.')
      : pump
        ? lost(context, pump, at, deadHead)
        : say('');
  return {
    id: `rod-stops-short:${id}`,
    rule: 'rod-stops-short',
    severity: 0,
    verdict: 'rod-stops-short',
    caseId: context.caseId,
    component: id,
    time: window.from,
    headline:
      needed === null
        ? say(`${name} stops short at `, figure(place, 'length'))
        : say(`${name} stops short: `, force(available, `${id}.loadForce`), ' of ', force(needed)),
    cause: say(
      `${name} is commanded and stands at `,
      figure(place, 'length', { address: `${id}.position` }),
      ' with ',
      pressure(driven, `${id}.${side}.pressure`),
      side === 'A' ? ' on the cap side. It pushes ' : ' on the rod side. It pushes ',
      force(available, `${id}.loadForce`),
      needed !== null
        ? say('; ', force(needed), ' is needed.')
        : asked > 1.01 * available
          ? say('; the load asks for ', force(asked), '.')
          : '.',
      limit,
    ),
    remedy: relief
      ? {
          words: say(
            'This force cannot be had at this relief setting. Find out why the relief stands where it does; if the motor was to be spared, the max. volume stop does that without costing force. A higher relief is not a cure.',
          ),
        }
      : pump && compensated
        ? compensatorUp(
            context,
            pump,
            say('Turn the compensator up as little as the force needs, under the relief’s cracking pressure and every rating.'),
          )
        : {
            words: say(
              pump
                ? 'No screw cures this: the compensator is not what limits it. Find where the flow goes, or why the pump gives none: rotation, coupling, swash plate, inlet, relief.'
                : 'Find where the pressure is lost between pump and cylinder.',
            ),
          },
  };
}

/** The pump port stands far under its compensator: where its flow goes, or that it gives none. */
function lost(context: FindingContext, pump: string, at: number, deadHead: number): Phrase {
  const given = Math.max(0, context.at(`${pump}.flow`, at));
  const passing = context.ofKind('relief-valve').find((entry) => context.at(`${entry.id}.flow`, at) > PASSING_LEAST);
  return say(
    ` ${context.name(pump)} stands at `,
    pressure(Math.max(0, context.at(`${pump}.outlet.pressure`, at)), `${pump}.outlet.pressure`),
    ', far under its compensator, ',
    pressure(deadHead),
    given > PASSING_LEAST ? say(', and gives ', flow(given, `${pump}.flow`), '.') : ', and gives no flow.',
    passing ? say(' ', flow(context.at(`${passing.id}.flow`, at), `${passing.id}.flow`), ` crosses ${context.name(passing.id)}.`) : '',
  );
}
