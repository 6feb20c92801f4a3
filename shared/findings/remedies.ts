import type { Component } from '../circuit/schema.ts';
import { kindOf } from '../kinds/registry.ts';
import { crackingPressure } from '../kinds/relief-valve/laws.ts';
import type { Base, DriveLoad, FindingContext } from './context.ts';
import { reliefsOf } from './context.ts';
import type { Finding, Phrase, Seek } from './finding.ts';
import { LEAST_RELIEF_GAP } from './house-rules.ts';
import { figure, say } from './phrase.ts';

/** Remedies with one setting to be sought by running. A higher relief is never among them, nor anything above a rating. */

type Remedy = NonNullable<Finding['remedy']>;

/** Lowest rated pressure on the nets that a pump's pressure can stand on [Pa], a gauge's range among them; null when nobody
 *  has entered any. */
export function lowestRating(base: Base, port: string): { readonly component: string; readonly pressure: number } | null {
  const nets = base.reach.loaded(port);
  let lowest: { component: string; pressure: number } | null = null;
  for (const component of base.seen.components) {
    const rating = ratingOf(base, component);
    if (rating === null || !touches(base, component, nets)) continue;
    if (!lowest || rating < lowest.pressure) lowest = { component: component.id, pressure: rating };
  }
  return lowest;
}

/** Pressure rating of a component [Pa], null where none is known. */
function ratingOf(base: Base, component: Component): number | null {
  const plate = base.plate(component.id);
  return component.kind === 'pressure-gauge' ? plate.number('range') : plate.given('ratedPressure');
}

/** Parts on the same nets for which nobody has entered a rated pressure. */
function unrated(base: Base, port: string): string[] {
  const nets = base.reach.loaded(port);
  return base.seen.components
    .filter(
      (component) => kindOf(component.kind)?.parameters.some((spec) => spec.id === 'ratedPressure') && ratingOf(base, component) === null,
    )
    .filter((component) => touches(base, component, nets))
    .map((component) => base.name(component.id));
}

function touches(base: Base, component: Component, nets: ReadonlySet<string>): boolean {
  return ['P', 'A', 'B', 'M', 'outlet'].some((port) => nets.has(base.reach.netOf(`${component.id}.${port}`)));
}

/** Turn the max. volume stop of the motor's largest pump in. */
export function stopIn(base: Base, drive: DriveLoad, goal: Seek['goal'], words: Phrase): Remedy {
  const pump = [...drive.pumps].sort((a, b) => base.plate(b.id).number('maxVolumeStop') - base.plate(a.id).number('maxVolumeStop'))[0];
  if (!pump) return { words };
  const plate = base.plate(pump.id);
  const low = plate.number('leastStop');
  const high = Math.min(plate.number('maxVolumeStop'), plate.number('displacement'));
  if (!(high > low)) return { words };
  return { words, seek: { target: pump.id, field: 'maxVolumeStop', quantity: 'displacement', low, high, want: 'largest', goal } };
}

/** Turn the compensator down until it works before the relief. */
export function compensatorDown(base: Base, pump: string, words: Phrase): Remedy {
  const plate = base.plate(pump);
  const low = plate.number('leastCompensator');
  const high = plate.number('compensatorPressure');
  if (!(high > low)) return { words };
  return {
    words,
    seek: { target: pump, field: 'compensatorPressure', quantity: 'pressure', low, high, want: 'largest', goal: 'compensates-first' },
  };
}

/** Turn the compensator up as little as the job needs, never to a rating nor near the relief's cracking pressure. */
export function compensatorUp(context: FindingContext, pump: string, words: Phrase): Remedy {
  const plate = context.plate(pump);
  const cracks = reliefsOf(context, pump).map((relief) => cracking(context, relief.id) - LEAST_RELIEF_GAP);
  const rating = lowestRating(context, `${pump}.outlet`);
  const high = Math.min(plate.number('mostCompensator'), ...cracks, rating ? rating.pressure : Number.POSITIVE_INFINITY);
  const low = plate.number('compensatorPressure');
  if (!(high > low)) return { words: say(words, ' There is no room for it under the relief and the ratings.') };
  const unknown = unrated(context, `${pump}.outlet`);
  const first = unknown.length > 0 ? ` No rated pressure is entered for ${unknown.slice(0, 4).join(', ')}: read the plates first.` : '';
  return {
    words: say(words, first),
    seek: { target: pump, field: 'compensatorPressure', quantity: 'pressure', low, high, want: 'smallest', goal: 'within-limits' },
  };
}

/** Cracking pressure of a relief as its plate says [Pa]: set pressure ÷ (1 + override), or the raw value; a weak spring halves it. */
export function cracking(base: Base, relief: string): number {
  return (1 - 0.5 * (base.plate(relief).given('fault.weak-spring') ?? 0)) * soundCracking(base, relief);
}

/** The same of a valve in order [Pa]. */
function soundCracking(base: Base, relief: string): number {
  const plate = base.plate(relief);
  return plate.given('raw.crackingPressure') ?? crackingPressure(plate.number('setPressure'), plate.number('override'));
}

/** A relief whose setting would let the compensator work, but which opens under it: the valve is at fault, not a screw. null
 *  when the setting itself is too low. */
export function weakRelief(base: Base, pump: string, relief: string): Remedy | null {
  const deadHead = base.plate(pump).number('compensatorPressure');
  const sound = soundCracking(base, relief);
  if (!(cracking(base, relief) <= deadHead && sound > deadHead)) return null;
  return {
    words: say(
      'Set as it is, ',
      base.name(relief),
      ' should crack at ',
      figure(sound, 'pressure'),
      ': have it taken out and looked at, the spring is weak or broken. Screwing it in does not cure it.',
    ),
  };
}
