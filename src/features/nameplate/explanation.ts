import { effectiveValue } from '#shared/circuit/effective.ts';
import { effectiveDocument } from '#shared/circuit/effective-document.ts';
import { inputIds, inputProfiles } from '#shared/circuit/input-profiles.ts';
import { findComponent, findKind, findParameter, nameInWords } from '#shared/circuit/kind-lookup.ts';
import { profileValue } from '#shared/circuit/profile.ts';
import type { CircuitDocument } from '#shared/circuit/schema.ts';
import type { Assessment, Phrase } from '#shared/findings/finding.ts';
import { verdictWords } from '#shared/findings/finding.ts';
import { runConstants } from '#shared/fluid/run-constants.ts';
import { channelOf, type RunResult, valueAt } from '#shared/simulation/result.ts';
import type { QuantityId } from '#shared/units/quantities.ts';
import { fieldSpec, targetWord } from '#src/lib/field-specs.ts';
import { ruleWords, type YardstickId, yardstickWords } from './explain-rules.ts';
import { plateValue } from './plate-value.ts';
import { wordsBefore } from './words-before.ts';

export interface ExplainInput {
  readonly label: string;
  readonly value: Phrase;
  /** Where it comes from: typed, part, fit, typical, "this run". */
  readonly source: string;
  readonly address?: string;
}
export interface Explained {
  readonly title: string;
  readonly value?: Phrase;
  readonly words?: Phrase;
  readonly equation?: string;
  readonly where?: string;
  readonly inputs: readonly ExplainInput[];
  readonly assumptions: readonly string[];
  readonly limits?: string;
  readonly source: string;
}
export interface ExplainContext {
  readonly document: CircuitDocument;
  readonly caseId: string;
  readonly run: RunResult | null;
  readonly assessment: Assessment | null;
  /** Cursor [s]. */
  readonly time: number;
}

const figure = (value: number, quantity: QuantityId, digits?: number): Phrase => [{ value, quantity, digits }];

function reading(context: ExplainContext, address: string): Phrase | undefined {
  const channel = context.run ? channelOf(context.run, address) : undefined;
  return channel && context.run ? figure(valueAt(context.run.times, channel.values, context.time), channel.quantity) : undefined;
}

function given(context: ExplainContext, target: string, field: string): ExplainInput | null {
  const row = plateValue(context.document, context.caseId, target, field);
  if (!row) return null;
  const { spec, value } = row;
  const shown: Phrase =
    spec.type === 'number' && typeof value === 'number'
      ? figure(value, spec.quantity)
      : [spec.type === 'choice' ? (spec.choices.find((choice) => choice.value === String(value))?.label ?? 'not given') : 'not given'];
  return { label: spec.label, value: shown, source: row.changed ? 'typed in this case' : row.source, address: `plate:${target}.${field}` };
}

/** An input that the duty may move: its value at the cursor, from the case and the commands so far. */
function commanded(context: ExplainContext, componentId: string, id: string): ExplainInput | null {
  const seen = effectiveDocument(context.document, context.caseId);
  const component = findComponent(seen, componentId);
  const kind = component && findKind(component.kind);
  const spec = kind?.inputs.find((entry) => entry.id === id);
  if (!component || !kind || !spec) return null;
  const profile = inputProfiles(seen, component, kind, runConstants(seen.fluid, seen.supply, seen.site))[inputIds(kind).indexOf(id)];
  if (!profile) return null;
  return { label: spec.label, value: figure(profileValue(profile, context.time), spec.quantity), source: 'the duty, at the cursor' };
}

/** An input named by a reading's explanation: a parameter of the component, another of its readings, or a supply value. */
function inputOf(context: ExplainContext, componentId: string, id: string): ExplainInput {
  const plate =
    given(context, componentId, id) ?? given(context, 'supply', id) ?? given(context, 'fluid', id) ?? commanded(context, componentId, id);
  if (plate) return plate;
  const own = `${componentId}.${id}`;
  const address = context.run && !channelOf(context.run, own) && channelOf(context.run, id) ? id : own;
  const component = findComponent(context.document, componentId);
  const spec = component && findKind(component.kind)?.readings.find((entry) => entry.id === id);
  const channel = context.run ? channelOf(context.run, address) : undefined;
  return {
    label: spec?.label ?? channel?.label ?? id,
    value: reading(context, address) ?? ['known to the run only'],
    source: 'this run, at the cursor',
    address,
  };
}

function explainReading(context: ExplainContext, componentId: string, id: string): Explained | null {
  const component = findComponent(context.document, componentId);
  const spec = component && findKind(component.kind)?.readings.find((entry) => entry.id === id);
  if (!component || !spec) return null;
  return {
    title: `${spec.label}, ${nameInWords(component)}`,
    value: reading(context, `${componentId}.${id}`),
    equation: spec.explain.equation,
    where: spec.explain.where,
    inputs: spec.explain.inputs.map((input) => inputOf(context, componentId, input)),
    assumptions: spec.explain.assumptions,
    limits: spec.explain.limits,
    source: spec.explain.source,
  };
}

function explainPort(context: ExplainContext, componentId: string, portId: string, what: string): Explained | null {
  const component = findComponent(context.document, componentId);
  const port = component && findKind(component.kind)?.ports.find((entry) => entry.id === portId);
  if (!component || !port) return null;
  const address = `${componentId}.${portId}.${what}`;
  const lines = context.document.lines.filter((line) =>
    [line.from, line.to].some((end) => end.component === componentId && end.port === portId),
  );
  const fluid = ['bulkModulus', 'airFraction'].map((field) => given(context, 'fluid', field));
  const pipes = lines.flatMap((line) => ['bore', 'length'].map((field) => given(context, line.id, field)));
  if (what === 'flow') {
    return {
      title: `Flow at ${port.label.toLowerCase()}, ${nameInWords(component)}`,
      value: reading(context, address),
      equation: 'the part’s own law, from the pressures at its ports; positive into the part',
      inputs: (findKind(component.kind)?.readings ?? []).slice(0, 4).map((entry) => inputOf(context, componentId, entry.id)),
      assumptions: ['The flows of all parts at one net add up to what the oil there is compressed by.'],
      limits: findKind(component.kind)?.about,
      source: 'volume balance of the net',
    };
  }
  return {
    title: `Pressure at ${port.label.toLowerCase()}, ${nameInWords(component)}`,
    value: reading(context, address),
    equation: 'dp/dt = K(p)/V · (ΣQ into the net − dV/dt)',
    where: 'K stiffness of oil with its free air and of the pipes; V oil volume of the net; Q flows of all parts joined to it',
    inputs: [...fluid, ...pipes].filter((entry) => entry !== null),
    assumptions: [
      'One pressure per net; a line whose loss is switched on separates two nets.',
      'Gauge pressure, never below minus the atmosphere.',
    ],
    limits: 'Pressure waves along a line are left out.',
    source: 'volume balance and bulk modulus of the oil; reference sheet, B1 to B7',
  };
}

function explainValue(context: ExplainContext, target: string, field: string): Explained | null {
  const spec = fieldSpec(context.document, target, field);
  if (!spec) return null;
  const own = given(context, target, field);
  const found = effectiveValue(context.document, context.document.cases[0]?.id ?? '', target, field);
  const before: readonly ExplainInput[] =
    spec.type === 'number' && typeof found === 'number' && own?.source === 'typed in this case'
      ? [{ label: 'As found', value: figure(found, spec.quantity), source: 'the document' }]
      : [];
  return {
    title: `${spec.label}, ${targetWord(context.document, target)}`,
    value: own?.value,
    words: [spec.help],
    equation: spec.type === 'number' ? spec.equation : undefined,
    inputs: [...(own ? [{ ...own, address: undefined }] : []), ...before, ...range(spec)],
    assumptions: [],
    limits: spec.type === 'number' && spec.rating ? `A limit of the part, on ${spec.rating.of}: a run above it is a trial.` : undefined,
    source: spec.source,
  };
}

function range(spec: NonNullable<ReturnType<typeof fieldSpec>>): readonly ExplainInput[] {
  if (spec.type !== 'number') return [];
  const list: ExplainInput[] = [
    {
      label: 'May be entered from',
      value: [...figure(spec.min, spec.quantity), ' to ', ...figure(spec.max, spec.quantity)],
      source: 'the form',
    },
  ];
  if (spec.typicalRange) {
    const [low, high] = spec.typicalRange;
    list.push({ label: 'Typical', value: [...figure(low, spec.quantity), ' to ', ...figure(high, spec.quantity)], source: spec.source });
  }
  return list;
}

function explainFinding(context: ExplainContext, id: string): Explained | null {
  const finding = context.assessment?.findings.find((entry) => entry.id === id);
  if (!finding) return null;
  const rule = ruleWords[finding.rule];
  const figures = [finding.headline, finding.cause].flatMap((phrase) =>
    phrase.flatMap((part, index) => (typeof part === 'string' ? [] : [{ part, before: wordsBefore(phrase[index - 1]) }])),
  );
  return {
    title: 'Finding',
    words: finding.headline,
    ...rule,
    inputs: figures.map(({ part, before }) => ({
      label: part.address ? (channelLabel(context, part.address) ?? part.address) : before,
      value: [part],
      source: part.address ? sourceOf(context, part.address) : 'this run',
      address: part.address,
    })),
  };
}

function channelLabel(context: ExplainContext, address: string): string | undefined {
  const channel = context.run ? channelOf(context.run, address) : undefined;
  if (channel) return channel.label;
  const dot = address.indexOf('.');
  return dot < 0 ? undefined : fieldSpec(context.document, address.slice(0, dot), address.slice(dot + 1))?.label;
}

function sourceOf(context: ExplainContext, address: string): string {
  if (context.run && channelOf(context.run, address)) return 'this run';
  const dot = address.indexOf('.');
  return (dot < 0 ? null : given(context, address.slice(0, dot), address.slice(dot + 1))?.source) ?? 'this run';
}

function explainYardstick(context: ExplainContext, motor: string, id: string): Explained | null {
  const words = yardstickWords[id as YardstickId];
  const yardsticks = context.assessment?.yardsticks.find((entry) => entry.motor === motor);
  if (!words || !yardsticks) return null;
  const values: Record<YardstickId, Phrase> = {
    'stall-margin':
      yardsticks.stallMargin === null
        ? [yardsticks.stalled ? 'stalled' : 'no torque was asked']
        : [{ value: yardsticks.stallMargin, quantity: 'ratio', digits: 1, rounding: 'down' }],
    'rms-current': figure(yardsticks.rmsCurrent, 'fraction', 0),
    'peak-torque': figure(yardsticks.peakTorque, 'ratio', 2),
  };
  const fields = ['ratedPower', 'ratedSpeed', 'ratedCurrent', 'pullOut', 'serviceFactor', 'relayDial'];
  return {
    title: `${words.label}, ${targetWord(context.document, motor)}`,
    value: values[id as YardstickId],
    equation: words.equation,
    inputs: [
      ...fields.map((field) => given(context, motor, field)).filter((entry) => entry !== null),
      { label: 'Peak current', value: figure(yardsticks.peakCurrent, 'current'), source: 'this run' },
    ],
    assumptions: words.assumptions,
    limits: words.limits,
    source: words.source,
  };
}

function explainVerdict(context: ExplainContext): Explained | null {
  const verdict = context.assessment?.verdict;
  if (!verdict) return null;
  return {
    title: 'Verdict of the case',
    words: [verdict.word, ...(verdict.figure ? [', ', verdict.figure] : [])],
    equation: Object.values(verdictWords).join(' \u2192 '),
    where: 'the first of these that applies is the verdict',
    inputs: (context.assessment?.findings ?? []).map((finding) => ({
      label: finding.rule.replaceAll('-', ' '),
      value: finding.headline,
      source: 'this run',
      address: `finding.${finding.id}`,
    })),
    assumptions: ['Run-up is left out of the motor’s verdicts.', '"Over" is about RMS; a short peak is a finding.'],
    limits: 'A calculation, not a permission.',
    source: 'contract of the product',
  };
}

/** @returns null when nothing is known under the address (a deleted part, a run that is gone). */
export function explanationOf(context: ExplainContext, address: string): Explained | null {
  if (address === 'verdict') return explainVerdict(context);
  if (address.startsWith('finding.')) return explainFinding(context, address.slice(8));
  if (address.startsWith('plate:')) {
    const [target = '', ...field] = address.slice(6).split('.');
    return explainValue(context, target, field.join('.'));
  }
  const [first = '', second = '', third] = address.split('.');
  if (first === 'yardstick') return explainYardstick(context, second, third ?? '');
  if (first === 'line' && third === 'flow') return explainLine(context, second);
  if (third === 'pressure' || third === 'flow') return explainPort(context, first, second, third);
  const kind = findKind(findComponent(context.document, first)?.kind ?? '');
  const hasReading = kind?.readings.some((entry) => entry.id === second) ?? false;
  if (hasReading && (!kind || !findParameter(kind, second) || reading(context, address))) return explainReading(context, first, second);
  return explainValue(context, first, address.slice(first.length + 1)) ?? explainReading(context, first, second);
}

function explainLine(context: ExplainContext, lineId: string): Explained | null {
  const line = context.document.lines.find((entry) => entry.id === lineId);
  if (!line) return null;
  return {
    title: `Flow in line ${lineId}`,
    value: reading(context, `line.${lineId}.flow`),
    equation: line.loss ? 'Δp = R·Q + k·Q·|Q|, solved for Q' : 'what the parts at its end push through it',
    where: 'R laminar, k quadratic loss from length, bore and viscosity; positive from the first end to the second',
    inputs: ['length', 'bore'].map((field) => given(context, lineId, field)).filter((entry) => entry !== null),
    assumptions: [line.loss ? 'The line separates two nets.' : 'Its loss is left out: both ends have one pressure.'],
    limits: 'Inertia of the oil column is left out.',
    source: 'reference sheet, section on pipe losses',
  };
}
