import type { FindingContext } from '../context.ts';
import type { Finding, Phrase } from '../finding.ts';
import { flow, say, share } from '../phrase.ts';
import { integrate, mean, type Window } from '../series.ts';
import { commandOf, feedingPumps } from '../supply-path.ts';

/** Rods that move slower than the pump should drive them: where the flow goes. Stop × speed is compared with what the
 *  pistons sweep, over the time in which a rod moves as commanded. */

/** A rod moves above this [m/s]. */
const MOVING = 5e-3;
/** Below this share of the pump's stop flow it is said. Choice of the model. */
const SHARE = 0.8;
const LEAST_TIME = 0.3;
/** What enters a chamber beyond what its piston sweeps, less than this: compression [m³/s]. */
const PAST_PISTON = 0.5e-3 / 60;

export function slowerRules(context: FindingContext): Finding[] {
  return context.ofKind('compensated-pump').flatMap((pump) => slower(context, pump.id));
}

function slower(context: FindingContext, pump: string): Finding[] {
  const motor = context.drives.find((drive) => drive.pumps.some((entry) => entry.id === pump));
  if (!motor || motor.yardsticks.stalled || motor.running === null) return [];
  const speed = context.column(`${motor.component.id}.speed`);
  const cylinders = context.ofKind('cylinder').filter((cylinder) => feedingPumps(context, cylinder.id).includes(pump));
  if (!speed || cylinders.length === 0) return [];
  const taken = new Float64Array(context.times.length);
  const passed = cylinders.map(() => new Float64Array(context.times.length));
  for (const [k, { id }] of cylinders.entries()) {
    const velocity = context.column(`${id}.velocity`);
    const cap = context.column(`${id}.A.flow`);
    const rod = context.column(`${id}.B.flow`);
    const command = commandOf(context, id);
    if (!velocity || !cap || !rod || !command) continue;
    const plate = context.plate(id);
    const piston = (Math.PI / 4) * plate.number('bore') ** 2;
    const ring = piston - (Math.PI / 4) * plate.number('rod') ** 2;
    for (let i = 0; i < taken.length; i++) {
      const v = velocity[i]! * command(i);
      if (!(v > MOVING)) continue;
      const swept = v * (command(i) > 0 ? piston : ring);
      taken[i] = taken[i]! + swept;
      passed[k]![i] = Math.max(0, (command(i) > 0 ? cap[i]! : rod[i]!) - swept);
    }
  }
  const moving = taken.map((value) => (value > 0 ? 1 : 0));
  const stop = context.plate(pump).number('maxVolumeStop');
  const ideal = speed.map((value, i) => (moving[i]! > 0 ? stop * Math.max(0, value) : 0));
  const worst = context.run.phases
    .map((phase) => ({ phase, window: { from: Math.max(phase.from, motor.running!.from), to: phase.to } }))
    .map(({ phase, window }) => {
      const could = integrate(context.times, ideal, window);
      return {
        phase,
        window,
        time: integrate(context.times, moving, window),
        ratio: could > 0 ? integrate(context.times, taken, window) / could : 1,
      };
    })
    .filter((entry) => entry.time > LEAST_TIME && entry.ratio < SHARE)
    .sort((a, b) => a.ratio - b.ratio)[0];
  if (!worst) return [];
  const name = cylinders.map(({ id }) => context.name(id)).join(' and ');
  return [
    {
      id: `slower-than-pump:${pump}`,
      rule: 'slower-than-pump',
      severity: throttled(context, pump, worst.window) ? 3 : 2,
      caseId: context.caseId,
      component: cylinders[0]!.id,
      time: worst.phase.from,
      headline: say(`${name} ${cylinders.length > 1 ? 'take' : 'takes'} `, share(worst.ratio), ' of the pump’s flow'),
      cause: say(
        `In "${worst.phase.label}" the stop and the speed would give `,
        flow(integrate(context.times, ideal, worst.window) / worst.time),
        '; ',
        flow(integrate(context.times, taken, worst.window) / worst.time),
        ' arrives. ',
        losses(
          context,
          pump,
          worst.window,
          moving,
          cylinders.map(({ id }, k) => ({ words: `past the piston of ${context.name(id)}`, values: passed[k]! })),
        ),
      ),
      remedy: { words: say('Look first where the larger share goes; time the stroke without load and read the case-drain flow.') },
    },
  ];
}

/** The compensator alone accounts for it: something downstream throttles the flow, as it may be meant to. */
function throttled(context: FindingContext, pump: string, window: Window): boolean {
  const stroke = context.column(`${pump}.displacement`);
  return stroke !== null && 1 - mean(context.times, stroke, window) / context.plate(pump).number('maxVolumeStop') > 1 - SHARE;
}

interface Passed {
  readonly words: string;
  readonly values: Float64Array;
}

function losses(context: FindingContext, pump: string, window: Window, moving: Float64Array, passed: readonly Passed[]): Phrase {
  const during = (address: string): number => over(context.column(address));
  const over = (values: Float64Array | null): number => {
    const time = integrate(context.times, moving, window);
    return values && time > 0
      ? integrate(
          context.times,
          values.map((value, i) => value * moving[i]!),
          window,
        ) / time
      : 0;
  };
  const shares: { words: string; amount: number }[] = [{ words: 'through the case drain', amount: during(`${pump}.caseFlow`) }];
  for (const relief of context.ofKind('relief-valve'))
    shares.push({ words: `over ${context.name(relief.id)}`, amount: during(`${relief.id}.flow`) });
  for (const { words, values } of passed) {
    const amount = over(values);
    if (amount > PAST_PISTON) shares.push({ words, amount });
  }
  const stroke = context.column(`${pump}.displacement`);
  const stop = context.plate(pump).number('maxVolumeStop');
  const off = stroke ? 1 - mean(context.times, stroke, window) / stop : 0;
  const said = shares.filter((entry) => entry.amount > 1e-7).sort((a, b) => b.amount - a.amount);
  return say(
    ...said.map((entry, i) => say(i === 0 ? 'Of the rest ' : ', ', flow(entry.amount), ` goes ${entry.words}`)),
    said.length > 0 ? '. ' : '',
    off > 0.05 ? say('The compensator keeps the pump ', share(off), ' under its stop.') : '',
  );
}
