import type { Component } from '../../circuit/schema.ts';
import { LOAD_HOLDING } from '../cautions.ts';
import type { FindingContext } from '../context.ts';
import type { Finding } from '../finding.ts';
import { figure, pressure, say } from '../phrase.ts';
import { highest, integrate, lowest, stretches, type Window } from '../series.ts';
import { commandOf } from '../supply-path.ts';

/** Rods that the load moves: against the command, with the valve at centre, or ahead of the oil. */

/** A rod moves above this [m/s]; slower is leakage. */
const MOVES = 0.02;
/** For so long [s] and so far [m]; less is a rod that is being stopped. Choice of the model. */
const LASTS = 0.15;
const FAR = 0.01;
/** Driven side under this: drawn apart [Pa gauge]. */
const VOID = -0.5e5;

export function runawayRules(context: FindingContext): Finding[] {
  return context.ofKind('cylinder').flatMap((cylinder) => runsAway(context, cylinder));
}

function runsAway(context: FindingContext, cylinder: Component): Finding[] {
  const id = cylinder.id;
  const velocity = context.column(`${id}.velocity`);
  const cap = context.column(`${id}.A.pressure`);
  const rod = context.column(`${id}.B.pressure`);
  const command = commandOf(context, id);
  if (!velocity || !cap || !rod || !command) return [];
  const longest = (margin: (i: number) => number) =>
    stretches(context.times, margin, LASTS).find((window) => Math.abs(integrate(context.times, velocity, window)) > FAR);
  const back = longest((i) => (command(i) === 0 ? -1 : -velocity[i]! * command(i) - MOVES));
  // At centre a rod that a chamber under pressure carries on is being stopped, not drawn.
  const pushed = (i: number) => (velocity[i]! > 0 ? cap[i]! : rod[i]!) > 5e5;
  const centre = longest((i) => (command(i) === 0 && !pushed(i) ? Math.abs(velocity[i]!) - MOVES : -1));
  const ahead = longest((i) => Math.min(velocity[i]! * command(i) - MOVES, (VOID - (command(i) > 0 ? cap[i]! : rod[i]!)) * 1e-5));
  if (back) return [against(context, id, back)];
  if (centre) return [atCentre(context, id, centre)];
  return ahead ? [drawnAhead(context, id, ahead, command, velocity)] : [];
}

/** Fastest in a window [m/s] and how far the rod goes [m]. */
function motion(context: FindingContext, id: string, window: Window) {
  const velocity = context.column(`${id}.velocity`)!;
  const most = Math.max(highest(context.times, velocity, window).value, -lowest(context.times, velocity, window).value);
  return {
    speed: figure(most, 'velocity', { address: `${id}.velocity` }),
    far: figure(Math.abs(integrate(context.times, velocity, window)), 'length'),
  };
}

function against(context: FindingContext, id: string, window: Window): Finding {
  const { speed, far } = motion(context, id, window);
  const name = context.name(id);
  return {
    id: `load-runs-away:${id}`,
    rule: 'load-runs-away',
    severity: 0,
    verdict: 'rod-stops-short',
    caseId: context.caseId,
    component: id,
    time: window.from,
    headline: say(`The load drives ${name} back against its command`),
    cause: say(
      `${name} is commanded one way and goes the other: `,
      far,
      ' at up to ',
      speed,
      '. What feeds it gives less pressure than the load makes, and lets the oil back.',
    ),
    remedy: {
      words: say('Block the load before anything else. A check valve at the pump, and a load-holding valve at the cylinder, belong here.'),
    },
    caution: LOAD_HOLDING,
  };
}

function atCentre(context: FindingContext, id: string, window: Window): Finding {
  const { speed, far } = motion(context, id, window);
  return {
    id: `load-runs-away:${id}`,
    rule: 'load-runs-away',
    severity: 1,
    caseId: context.caseId,
    component: id,
    time: window.from,
    headline: say(`The load moves ${context.name(id)} with the valve at centre`),
    cause: say('With no command it goes ', far, ' at up to ', speed, ': this centre joins the cylinder to the tank.'),
    remedy: {
      words: say('Keep everyone from under it and block it. Where the load must stand, it takes a load-holding valve at the cylinder.'),
    },
    caution: LOAD_HOLDING,
  };
}

function drawnAhead(context: FindingContext, id: string, window: Window, command: (i: number) => number, velocity: Float64Array): Finding {
  const { speed } = motion(context, id, window);
  const row = Math.max(
    0,
    context.times.findIndex((time) => time > window.from),
  );
  const out = command(row) > 0 && velocity[row]! > 0;
  const port = out ? 'A' : 'B';
  const values = context.column(`${id}.${port}.pressure`)!;
  return {
    id: `load-runs-away:${id}`,
    rule: 'load-runs-away',
    severity: 1,
    caseId: context.caseId,
    component: id,
    time: window.from,
    headline: say(`The load pulls ${context.name(id)} ahead of its oil`),
    cause: say(
      'At up to ',
      speed,
      ` the ${out ? 'cap' : 'rod'} side is drawn down to `,
      pressure(lowest(context.times, values, window).value, `${id}.${port}.pressure`),
      ': the pump does not fill it, and the rod jerks when it is caught up.',
    ),
    remedy: {
      words: say('Something must hold the load back on the way: a throttle on the side that is pushed, or a counterbalance valve.'),
    },
    caution: LOAD_HOLDING,
  };
}
