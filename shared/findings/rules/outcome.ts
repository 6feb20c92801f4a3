import type { FindingContext, RequirementResult } from '../context.ts';
import type { Finding, Phrase } from '../finding.ts';
import { margin, moment, multiple, say, share } from '../phrase.ts';
import { answerInWords, askedInWords, quantityFigure } from '../requirements.ts';

/** The run failed; a requirement is missed; within limits. */

export function failedRule(context: FindingContext): Finding[] {
  const { run } = context;
  if (run.status === 'finished') return [];
  const where = run.stuck?.component ? context.name(run.stuck.component) : null;
  return [
    {
      id: 'run-failed',
      rule: 'run-failed',
      severity: 0,
      verdict: 'failed',
      caseId: context.caseId,
      ...(run.stuck?.component ? { component: run.stuck.component } : {}),
      time: run.time,
      headline: run.status === 'stopped' ? say('Run stopped at ', moment(run.time)) : say('Run failed at ', moment(run.time)),
      cause: say(
        run.reason ?? 'The run did not reach its end.',
        where ? ` It is stuck at ${where}${run.stuck?.state ? `, ${run.stuck.state}` : ''}.` : '',
      ),
      remedy: { words: say('What was reached is shown. Try a smaller change, or a shorter duty, and look at the part named.') },
    },
  ];
}

export function requirementRules(context: FindingContext, found: readonly Finding[]): Finding[] {
  return context.requirements
    .filter((result) => !result.met && !saidElsewhere(context, result, found))
    .map((result) => ({
      id: `requirement:${result.requirement.id}`,
      rule: 'requirement',
      severity: 2,
      caseId: context.caseId,
      ...(componentOf(context, result) ? { component: componentOf(context, result)! } : {}),
      headline: say(askedInWords(context, result.requirement)),
      cause:
        result.value === null
          ? say(capital(answerInWords(context, result)), '.')
          : say('The run gives ', answerInWords(context, result), '.'),
    }));
}

/** A missed motor requirement is already a finding when the motor stalls or its margin is small; a missed force or time when
 *  the rod stops short, the motor stalls or the run failed. */
function saidElsewhere(context: FindingContext, result: RequirementResult, found: readonly Finding[]): boolean {
  const { requirement } = result;
  if (found.some((entry) => entry.rule === 'rod-stops-short' && entry.component === componentOf(context, result))) return true;
  if (found.some((entry) => entry.rule === 'motor-stalls' || entry.rule === 'not-up-to-speed' || entry.rule === 'run-failed')) return true;
  if (requirement.quantity === 'stall margin')
    return context.drives.some((drive) => drive.yardsticks.stallMargin === null || drive.yardsticks.stallMargin < 1.25);
  return (
    requirement.quantity === 'rms current' &&
    context.drives.some((drive) => drive.yardsticks.stalled || drive.yardsticks.rmsCurrent > drive.facts.serviceFactor)
  );
}

function componentOf(context: FindingContext, { requirement }: RequirementResult): string | undefined {
  const id = requirement.quantity.split('.')[0];
  return context.seen.components.some((component) => component.id === id) ? id : undefined;
}

function capital(phrase: Phrase): Phrase {
  const [first, ...rest] = phrase;
  return typeof first === 'string' ? [first.charAt(0).toUpperCase() + first.slice(1), ...rest] : phrase;
}

/** Said only when nothing of an earlier kind is open. */
export function withinLimitsRule(context: FindingContext): Finding[] {
  const drive = context.drives[0];
  const timed = context.requirements.find((result) => result.requirement.measure === 'time to reach' && result.value !== null);
  const job = timed ? say(quantityFigure(context, timed.requirement, timed.requirement.at ?? 0), ' in ', moment(timed.value!)) : null;
  const y = drive?.yardsticks;
  return [
    {
      id: 'within-limits',
      rule: 'within-limits',
      severity: 3,
      verdict: 'within-limits',
      caseId: context.caseId,
      headline: context.requirements.some((result) => !result.met)
        ? say('Within limits, but the job asked for is not done')
        : job
          ? say('Within limits, ', job)
          : say('Within limits'),
      cause:
        y && y.stallMargin !== null
          ? say(
              'Stall margin ',
              margin(y.stallMargin),
              ', RMS current ',
              share(y.rmsCurrent),
              ' of nameplate, peak ',
              multiple(y.peakTorque),
              ' rated torque.',
            )
          : say('No limit is passed in this run.'),
    },
  ];
}
