import { findCase, firstCase } from '../circuit/effective.ts';
import type { CaseChange, CircuitDocument } from '../circuit/schema.ts';
import type { Assessment, Finding, Phrase, Seek, SeekResult } from './finding.ts';
import { LEAST_STALL_MARGIN } from './house-rules.ts';
import { figure, margin, moment, multiple, say, share } from './phrase.ts';
import { baseDocumentOf, settableValues } from './settable.ts';

/** Runs one case of a document to its assessment; null when the circuit could not run. */
export type RunOne = (document: CircuitDocument, caseId: string) => Assessment | null;

/** Finds the value of the one setting that a finding's remedy names, by running: halving over the values the screw can be
 *  set to (quarter turns from as found), rounded to the side on which the goal is met. The case's other values stay.
 *  Reports in words when no value of the range meets the goal. */
export function seekRemedy(document: CircuitDocument, caseId: string, finding: Finding, runOne: RunOne): SeekResult {
  const seek = finding.remedy?.seek;
  if (!seek) return { found: false, words: say('There is no single setting to seek.'), runs: 0 };
  const values = settableValues(document, caseId, seek);
  let runs = 0;
  const tried = new Map<number, Assessment | null>();
  const assess = (index: number): Assessment | null => {
    if (!tried.has(index)) {
      runs += 1;
      tried.set(index, runOne(withChange(document, caseId, changeOf(seek, values[index]!)), TRIAL));
    }
    return tried.get(index) ?? null;
  };
  const meets = (index: number) => reaches(seek.goal, assess(index));

  // From the end that must meet the goal towards the end that is wanted.
  const order = seek.want === 'largest' ? values.map((_, i) => i) : values.map((_, i) => values.length - 1 - i);
  let good = 0;
  let bad = order.length;
  if (order.length === 0) return { found: false, words: impossible(seek, values), runs };
  if (!meets(order[0]!)) {
    // The goal may lie inside the range only (too little at one end, too much at the other): walk from the wanted end.
    const last = seek.want === 'smallest' ? findFirst(order, meets) : -1;
    if (last < 0) return { found: false, words: impossible(seek, values), runs };
    good = last;
    bad = last + 1;
  }
  while (bad - good > 1) {
    const middle = (good + bad) >> 1;
    if (meets(order[middle]!)) good = middle;
    else bad = middle;
  }
  const index = order[good]!;
  return { found: true, change: changeOf(seek, values[index]!), words: predicted(document, seek, values[index]!, assess(index)!), runs };
}

/** Most runs spent on walking. */
const MOST_WALKED = 24;

/** Position in `order` of the value nearest the wanted end that meets the goal; −1 when none of the first ones does. */
function findFirst(order: readonly number[], meets: (index: number) => boolean): number {
  for (let i = order.length - 1; i > 0 && order.length - 1 - i < MOST_WALKED; i--) if (meets(order[i]!)) return i;
  return -1;
}

const TRIAL = 'seek-trial';

function changeOf(seek: Seek, value: number): CaseChange {
  return { target: seek.target, field: seek.field, value };
}

/** The document with one more case: the case asked about, with one value changed. */
function withChange(document: CircuitDocument, caseId: string, change: CaseChange): CircuitDocument {
  const from = findCase(document, caseId) ?? firstCase(document);
  const changes = [...from.changes.filter((entry) => entry.target !== change.target || entry.field !== change.field), change];
  return { ...baseDocumentOf(document), cases: [firstCase(document), { id: TRIAL, name: 'Trial', ink: 0, changes }] };
}

export function reaches(goal: Seek['goal'], assessment: Assessment | null): boolean {
  if (!assessment || assessment.verdict.id === 'failed' || assessment.verdict.id === 'above-rating') return false;
  const has = (...rules: readonly Finding['rule'][]) => assessment.findings.some((finding) => rules.includes(finding.rule));
  const margins = assessment.yardsticks.every((entry) => entry.stallMargin !== null && entry.stallMargin >= LEAST_STALL_MARGIN);
  switch (goal) {
    case 'not-stalled-with-margin':
      return (
        margins &&
        assessment.yardsticks.every((entry) => entry.tripTime === null) &&
        !has('motor-stalls', 'not-up-to-speed', 'dips-and-recovers')
      );
    case 'not-tripping':
      return !has('will-trip', 'motor-stalls', 'not-up-to-speed');
    case 'compensates-first':
      return (
        !has('relief-before-compensator', 'relief-passing') &&
        !assessment.findings.some((finding) => finding.rule === 'relief-gap-small' && finding.severity < 3)
      );
    case 'within-limits':
      return assessment.verdict.id === 'within-limits' && margins;
  }
}

/** What is to be expected at the found value: yardsticks, the time of the job, and what stays open. */
function predicted(document: CircuitDocument, seek: Seek, value: number, assessment: Assessment): Phrase {
  const motor = assessment.yardsticks[0];
  const load =
    motor && motor.stallMargin !== null
      ? say(
          ': stall margin ',
          margin(motor.stallMargin),
          ', peak ',
          multiple(motor.peakTorque),
          ' rated torque, RMS current ',
          share(motor.rmsCurrent),
          ' of nameplate',
        )
      : say('');
  const job = document.requirements.find((requirement) => requirement.measure === 'time to reach');
  const time = assessment.requirements.find((entry) => entry.id === job?.id)?.value;
  const missed = assessment.requirements.filter((entry) => !entry.met);
  const left = assessment.findings.find((finding) => finding.severity === 0);
  return say(
    'At ',
    figure(value, seek.quantity, { address: `${seek.target}.${seek.field}` }),
    load,
    typeof time === 'number' ? say(', job done in ', moment(time)) : '',
    '. ',
    left
      ? say('Still open: ', left.headline, '.')
      : missed.length > 0
        ? say('Still missed: ', ...missed.flatMap((entry, i) => [i > 0 ? '; ' : '', entry.words]), '.')
        : say('Every requirement is met.'),
  );
}

function impossible(seek: Seek, values: readonly number[]): Phrase {
  if (values.length === 0) return say('The screw has no room in the direction that would help.');
  const least = Math.min(...values);
  const most = Math.max(...values);
  return say(
    'No value from ',
    figure(least, seek.quantity),
    ' to ',
    figure(most, seek.quantity),
    ' does it: this one setting is not enough.',
  );
}
