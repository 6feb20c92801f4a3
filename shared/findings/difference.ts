import { documentValue, findCase } from '../circuit/effective.ts';
import { nameInWords } from '../circuit/kind-lookup.ts';
import type { CircuitDocument } from '../circuit/schema.ts';
import { kindOf } from '../kinds/registry.ts';
import type { RunResult } from '../simulation/result.ts';
import { channelOf } from '../simulation/result.ts';
import type { QuantityId } from '../units/quantities.ts';
import type { Assessment, Phrase, Yardsticks } from './finding.ts';
import { current, figure, margin, moment, multiple, say, share, span } from './phrase.ts';

/** The difference between two cases in words: what was set otherwise, what the verdict is, what it costs and gains. */
export function differenceInWords(
  document: CircuitDocument,
  caseIdA: string,
  caseIdB: string,
  runA: RunResult,
  runB: RunResult,
  assessmentA: Assessment,
  assessmentB: Assessment,
): Phrase[] {
  const nameA = findCase(document, caseIdA)?.name ?? caseIdA;
  const nameB = findCase(document, caseIdB)?.name ?? caseIdB;
  const settings = changedFields(document, caseIdA, caseIdB).map(({ target, field }) =>
    settingPhrase(document, caseIdA, caseIdB, target, field),
  );
  const verdicts =
    assessmentA.verdict.id === assessmentB.verdict.id
      ? say(`Both: ${assessmentB.verdict.word}.`)
      : say(
          `${nameA}: ${assessmentA.verdict.word}`,
          verdictAmount(assessmentA),
          `. ${nameB}: ${assessmentB.verdict.word}`,
          verdictAmount(assessmentB),
          '.',
        );
  return [
    ...(settings.length > 0 ? settings : [say(`${nameA} and ${nameB} have the same settings.`)]),
    verdicts,
    ...assessmentB.yardsticks.flatMap((yardsticks) =>
      motorPhrase(
        document,
        assessmentA.yardsticks.find((entry) => entry.motor === yardsticks.motor),
        yardsticks,
      ),
    ),
    ...requirementPhrases(document, assessmentA, assessmentB),
    ...heatPhrase(assessmentA, assessmentB),
    ...pressurePhrase(document, runA, runB),
  ];
}

function verdictAmount(assessment: Assessment): Phrase {
  return assessment.verdict.figure ? say(', ', assessment.verdict.figure) : say('');
}

function changedFields(document: CircuitDocument, a: string, b: string): { target: string; field: string }[] {
  const fields = new Map<string, { target: string; field: string }>();
  for (const id of [a, b])
    for (const { target, field } of findCase(document, id)?.changes ?? []) fields.set(`${target} ${field}`, { target, field });
  return [...fields.values()].filter(({ target, field }) => valueIn(document, a, target, field) !== valueIn(document, b, target, field));
}

function valueIn(document: CircuitDocument, caseId: string, target: string, field: string): number | string | null {
  const change = findCase(document, caseId)?.changes.find((entry) => entry.target === target && entry.field === field);
  return change ? change.value : (documentValue(document, target, field) ?? null);
}

function settingPhrase(document: CircuitDocument, a: string, b: string, target: string, field: string): Phrase {
  const component = document.components.find((entry) => entry.id === target);
  const spec = component && kindOf(component.kind)?.parameters.find((entry) => entry.id === field);
  const label = `${component ? nameInWords(component) : target}, ${spec ? spec.label.charAt(0).toLowerCase() + spec.label.slice(1) : field}`;
  const shown = (value: number | string | null) =>
    typeof value === 'number' ? figure(value, quantityOf(target, field, spec), { address: `${target}.${field}` }) : (value ?? 'not given');
  return say(`${label}: `, shown(valueIn(document, a, target, field)), ' → ', shown(valueIn(document, b, target, field)), '.');
}

function quantityOf(target: string, field: string, spec: { type: string; quantity?: QuantityId } | undefined): QuantityId {
  if (spec?.quantity) return spec.quantity;
  if (field.startsWith('fault.')) return 'fraction';
  if (target === 'supply') return field === 'voltage' ? 'voltage' : field === 'frequency' ? 'frequency' : 'resistance';
  if (field === 'temperature') return 'temperature';
  return field === 'duration' || field.endsWith('.time') || field.endsWith('.ramp') ? 'time' : 'number';
}

function motorPhrase(document: CircuitDocument, a: Yardsticks | undefined, b: Yardsticks): Phrase[] {
  if (!a) return [];
  const component = document.components.find((entry) => entry.id === b.motor);
  const name = component ? nameInWords(component) : b.motor;
  const state = (y: Yardsticks) =>
    y.stalled
      ? say('stalled', y.stallCurrent === undefined ? '' : say(', ', current(y.stallCurrent)))
      : y.stallMargin === null
        ? say('not up to speed')
        : margin(y.stallMargin);
  const out: Phrase[] = [
    say(
      `${name}: stall margin `,
      state(a),
      ' → ',
      state(b),
      '; RMS current ',
      share(a.rmsCurrent),
      ' → ',
      share(b.rmsCurrent),
      ' of nameplate; peak ',
      a.stalled ? 'pull-out' : multiple(a.peakTorque),
      ' → ',
      b.stalled ? 'pull-out' : multiple(b.peakTorque),
      ' rated torque.',
    ),
  ];
  if (a.tripTime !== b.tripTime && (a.tripTime === null) !== (b.tripTime === null)) {
    const trips = (time: number | null) => (time === null ? say('stays shut') : say('trips in ', span(time)));
    out.push(say('Overload relay: ', trips(a.tripTime), ' → ', trips(b.tripTime), '.'));
  }
  return out;
}

function requirementPhrases(document: CircuitDocument, a: Assessment, b: Assessment): Phrase[] {
  return document.requirements.flatMap((requirement) => {
    const before = a.requirements.find((entry) => entry.id === requirement.id);
    const after = b.requirements.find((entry) => entry.id === requirement.id);
    if (!before || !after || requirement.quantity === 'stall margin' || requirement.quantity === 'rms current') return [];
    if (requirement.measure === 'time to reach' && before.value !== null && after.value !== null) {
      const later = after.value - before.value;
      if (Math.abs(later) < 0.05) return [];
      return [
        say(
          'The job takes ',
          moment(Math.abs(later)),
          later > 0 ? ' longer: ' : ' less: ',
          moment(before.value),
          ' → ',
          moment(after.value),
          '.',
        ),
      ];
    }
    return before.met === after.met ? [] : [say(after.met ? 'Now met: ' : 'No longer met: ', after.words, '.')];
  });
}

function heatPhrase(a: Assessment, b: Assessment): Phrase[] {
  const change = b.heat - a.heat;
  if (Math.abs(change) < Math.max(100, 0.1 * Math.max(a.heat, b.heat))) return [];
  return [say('Heat, motor and oil: ', figure(a.heat, 'power', { digits: 1 }), ' → ', figure(b.heat, 'power', { digits: 1 }), '.')];
}

function pressurePhrase(document: CircuitDocument, runA: RunResult, runB: RunResult): Phrase[] {
  return document.components
    .filter((component) => component.kind === 'compensated-pump')
    .flatMap((pump) => {
      const peak = (run: RunResult) =>
        channelOf(run, `${pump.id}.outlet.pressure`)?.values.reduce((most, value) => Math.max(most, value), 0) ?? 0;
      const [a, b] = [peak(runA), peak(runB)];
      if (Math.abs(a - b) < 2e5) return [];
      return [say(`Highest pressure at ${nameInWords(pump)}: `, figure(a, 'pressure'), ' → ', figure(b, 'pressure'), '.')];
    });
}
