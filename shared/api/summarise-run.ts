import type { CircuitDocument } from '../circuit/schema.ts';
import type { CaseEvaluation } from '../findings/evaluate.ts';
import type { Figure, Finding, Phrase } from '../findings/finding.ts';
import type { Problem } from '../simulation/result.ts';
import type { UnitPreferences } from '../units/convert.ts';
import { formatPhrase } from '../units/format.ts';
import type { RunSummary } from './run-summary.ts';

const units: UnitPreferences = { system: 'si' };

export interface SummaryOptions {
  /** false: none; true: all; a list: these addresses. */
  readonly channels?: boolean | readonly string[];
}

/** What a host tells about one evaluated case, as plain data that JSON can carry. */
export function summariseRun(document: CircuitDocument, evaluation: CaseEvaluation, options: SummaryOptions = {}): RunSummary {
  const { run, assessment } = evaluation;
  const entry = document.cases.find((candidate) => candidate.id === run.caseId);
  return {
    format: 'swashbench-run',
    engineVersion: run.engineVersion,
    circuit: document.title,
    case: { id: run.caseId, name: entry?.name ?? run.caseId },
    status: run.status,
    ...(run.reason === undefined ? {} : { reason: run.reason }),
    ...(run.stuck === undefined ? {} : { stuck: { ...run.stuck } }),
    time: run.time,
    duration: run.duration,
    tolerance: run.tolerance,
    verdict: {
      id: assessment.verdict.id,
      word: assessment.verdict.word,
      ...figureOf(assessment.verdict.figure),
    },
    findings: assessment.findings.map(findingOf),
    yardsticks: assessment.yardsticks.map((yardsticks) => ({ ...yardsticks })),
    requirements: assessment.requirements.map(({ id, met, value, words }) => ({
      id,
      met,
      value,
      words: textOf(words),
    })),
    heat: assessment.heat,
    events: run.events.map(({ time, component, signal, rising, label }) => ({
      time,
      component,
      signal,
      rising,
      label,
    })),
    phases: run.phases.map((phase) => ({
      ...phase,
      channels: { ...phase.channels },
    })),
    audit: run.audit && { ...run.audit, heatBy: { ...run.audit.heatBy } },
    pressureLeft: run.pressureLeft.map((left) => ({ ...left })),
    notes: run.notes.map(problemOf),
    statistics: { ...run.statistics },
    hash: run.hash,
    ...columnsOf(evaluation, options.channels ?? false),
  };
}

function columnsOf({ run }: CaseEvaluation, wanted: boolean | readonly string[]): Pick<RunSummary, 'times' | 'channels'> {
  if (wanted === false) return {};
  const channels = wanted === true ? run.channels : run.channels.filter((channel) => wanted.includes(channel.address));
  return {
    times: Array.from(run.times),
    channels: channels.map(({ address, label, quantity, values }) => ({
      address,
      label,
      quantity,
      values: Array.from(values),
    })),
  };
}

function findingOf(finding: Finding): RunSummary['findings'][number] {
  return {
    id: finding.id,
    rule: finding.rule,
    severity: finding.severity,
    ...(finding.component === undefined ? {} : { component: finding.component }),
    ...(finding.time === undefined ? {} : { time: finding.time }),
    headline: textOf(finding.headline),
    cause: textOf(finding.cause),
    ...(finding.remedy === undefined ? {} : { remedy: textOf(finding.remedy.words) }),
    ...(finding.caution === undefined ? {} : { caution: finding.caution }),
  };
}

function figureOf(figure: Figure | undefined): {
  figure?: { value: number; quantity: string };
} {
  return figure === undefined ? {} : { figure: { value: figure.value, quantity: figure.quantity } };
}

/** A problem without its cure, which is an action on the drawing. */
export function problemOf({ severity, code, message, component, port, line, path }: Problem): RunSummary['notes'][number] {
  return { severity, code, message, component, port, line, path };
}

function textOf(phrase: Phrase): string {
  return formatPhrase(phrase, units);
}
