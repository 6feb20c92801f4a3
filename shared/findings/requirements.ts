import type { Requirement } from '../circuit/schema.ts';
import type { QuantityId } from '../units/quantities.ts';
import type { Base, DriveLoad, RequirementResult } from './context.ts';
import type { Assessment, Phrase } from './finding.ts';
import { figure, margin, moment, say, share } from './phrase.ts';
import { firstReach, highest, lowest, type Window } from './series.ts';

/** Whether the run meets what the circuit is asked for. A phase is named by the label of the command that opens it and
 *  lasts until the next command to the same component; times to reach count from its start. */

export function phaseWindow(base: Base, label: string | undefined): Window {
  const commands = base.seen.duty.commands;
  const opening = label === undefined ? undefined : commands.find((command) => command.label === label);
  if (!opening) return { from: 0, to: base.end };
  const later = commands
    .filter((command) => command.target === opening.target && command.time > opening.time)
    .map((command) => command.time);
  return { from: opening.time, to: Math.min(base.end, ...later) };
}

export function checkRequirements(base: Base, drives: readonly DriveLoad[]): RequirementResult[] {
  return base.seen.requirements.map((requirement) => {
    const value = measured(base, drives, requirement);
    return { requirement, value, met: value !== null && fits(requirement, value) };
  });
}

function fits(requirement: Requirement, value: number): boolean {
  const slack = 1e-9 * Math.max(1, Math.abs(value));
  return (
    (requirement.min === undefined || value >= requirement.min - slack) &&
    (requirement.max === undefined || value <= requirement.max + slack)
  );
}

function measured(base: Base, drives: readonly DriveLoad[], requirement: Requirement): number | null {
  if (requirement.quantity === 'stall margin') {
    const margins = drives.map((drive) => drive.yardsticks.stallMargin);
    return margins.length === 0 || margins.includes(null) ? null : Math.min(...(margins as number[]));
  }
  if (requirement.quantity === 'rms current')
    return drives.every((drive) => drive.running === null) ? null : Math.max(...drives.map((drive) => drive.yardsticks.rmsCurrent));
  const values = base.column(requirement.quantity);
  const window = phaseWindow(base, requirement.phase);
  if (!values || window.from > base.end) return null;
  if (requirement.measure === 'end') return base.at(requirement.quantity, window.to);
  if (requirement.measure === 'time to reach') {
    const reached = firstReach(base.times, values, (requirement.at ?? 0) * (1 - 1e-6), window);
    return reached === null ? null : reached - window.from;
  }
  // The peak towards the limit: the largest value, or the least where only a minimum would be broken downwards all along.
  const peak = highest(base.times, values, window).value;
  return Number.isFinite(peak) ? peak : lowest(base.times, values, window).value;
}

/** What a requirement asks, in words: 'A1 loadForce at least 52 kN'. */
export function askedInWords(base: Base, requirement: Requirement): Phrase {
  const limit = (value: number) => limitFigure(base, requirement, value);
  const parts: Phrase[] = [say(subject(base, requirement))];
  if (requirement.measure === 'time to reach') parts.push(say(' to ', quantityFigure(base, requirement, requirement.at ?? 0)));
  if (requirement.min !== undefined) parts.push(say(' at least ', limit(requirement.min)));
  if (requirement.max !== undefined)
    parts.push(say(requirement.measure === 'time to reach' ? ' within ' : ' at most ', limit(requirement.max)));
  return say(...parts);
}

function subject(base: Base, requirement: Requirement): string {
  if (requirement.quantity === 'stall margin') return 'Stall margin';
  if (requirement.quantity === 'rms current') return 'RMS current of nameplate';
  return base.run.channels.find((channel) => channel.address === requirement.quantity)?.label ?? requirement.quantity;
}

function limitFigure(base: Base, requirement: Requirement, value: number) {
  if (requirement.measure === 'time to reach') return moment(value);
  if (requirement.quantity === 'stall margin') return margin(value);
  if (requirement.quantity === 'rms current') return share(value);
  return quantityFigure(base, requirement, value);
}

export function quantityFigure(base: Base, requirement: Requirement, value: number) {
  const quantity: QuantityId = base.run.channels.find((channel) => channel.address === requirement.quantity)?.quantity ?? 'number';
  return figure(value, quantity, { address: requirement.quantity, ...(quantity === 'force' ? { digits: 0 } : {}) });
}

/** What the run gave: '36 kN', '2.9 s', 'never reached'. */
export function answerInWords(base: Base, { requirement, value }: RequirementResult): Phrase {
  if (value !== null) return say(limitFigure(base, requirement, value));
  if (requirement.quantity === 'stall margin') return say('none, the motor is past pull-out or not up to speed');
  return say(requirement.measure === 'time to reach' ? 'never reached' : 'no value in this run');
}

export function requirementRows(base: Base, results: readonly RequirementResult[]): Assessment['requirements'] {
  return results.map((result) => ({
    id: result.requirement.id,
    met: result.met,
    value: result.value,
    words: say(askedInWords(base, result.requirement), ': ', answerInWords(base, result)),
  }));
}
