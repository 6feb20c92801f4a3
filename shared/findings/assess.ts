import type { CircuitDocument } from '../circuit/schema.ts';
import type { RunResult } from '../simulation/result.ts';
import { baseOf, type FindingContext, type SeenCircuit } from './context.ts';
import { type Assessment, type Figure, type Finding, type Verdict, type VerdictId, verdictIds, verdictWords } from './finding.ts';
import { figure } from './phrase.ts';
import { checkRequirements, requirementRows } from './requirements.ts';
import { destrokeRules } from './rules/destroke.ts';
import { heatRules } from './rules/heat.ts';
import { motorRules } from './rules/motor.ts';
import { motorHeatRules } from './rules/motor-heat.ts';
import { failedRule, requirementRules, withinLimitsRule } from './rules/outcome.ts';
import { protectionRules } from './rules/protection.ts';
import { pumpRules } from './rules/pump.ts';
import { ratingRules } from './rules/ratings.ts';
import { reliefRules } from './rules/relief.ts';
import { rodRules } from './rules/rod.ts';
import { runawayRules } from './rules/runaway.ts';
import { slowerRules } from './rules/slower.ts';
import { driveLoads } from './yardsticks.ts';

const rules = [
  failedRule,
  motorRules,
  motorHeatRules,
  reliefRules,
  rodRules,
  slowerRules,
  ratingRules,
  protectionRules,
  pumpRules,
  destrokeRules,
  runawayRules,
  heatRules,
];

/** Verdict, findings (worst first), yardsticks and requirements of one run of one case.
 *  @param circuit the compiled circuit of that case (its document as the case sees it, and the run's constants). */
export function assessRun(document: CircuitDocument, caseId: string, circuit: SeenCircuit, run: RunResult): Assessment {
  const base = baseOf(document, caseId, circuit, run);
  const drives = driveLoads(base);
  const requirements = checkRequirements(base, drives);
  const context: FindingContext = { ...base, drives, requirements };
  const seen = rules.flatMap((rule) => rule(context));
  const found = [...seen, ...requirementRules(context, seen)];
  const verdict = verdictOf(context, found);
  const findings = verdict.id === 'within-limits' ? [...found, ...withinLimitsRule(context)] : found;
  return {
    caseId,
    verdict,
    findings: [...findings].sort(worstFirst),
    yardsticks: drives.map((drive) => drive.yardsticks),
    requirements: requirementRows(base, requirements),
    heat: run.audit && run.time > 0 ? run.audit.heat / run.time : 0,
  };
}

/** By severity, then by the order of the verdicts, then by time. Within limits comes first among the notes. */
function worstFirst(a: Finding, b: Finding): number {
  const place = (finding: Finding) => (finding.verdict ? verdictIds.indexOf(finding.verdict) : verdictIds.length);
  return (
    a.severity - b.severity ||
    place(a) - place(b) ||
    (a.time ?? Number.POSITIVE_INFINITY) - (b.time ?? Number.POSITIVE_INFINITY) ||
    (a.id < b.id ? -1 : 1)
  );
}

/** The first that applies, in the order of CONTRACTS.md. */
export function verdictOf(context: FindingContext, findings: readonly Finding[]): Verdict {
  for (const id of verdictIds) {
    const finding = findings.find((entry) => entry.verdict === id);
    if (!finding) continue;
    const amount = verdictFigure(context, id, finding);
    return { id, word: wordOf(id, finding), ...(amount ? { figure: amount } : {}) };
  }
  const peak = context.drives.length > 0 ? Math.max(...context.drives.map((drive) => drive.yardsticks.peakTorque)) : null;
  return {
    id: 'within-limits',
    word: verdictWords['within-limits'],
    ...(peak === null ? {} : { figure: figure(peak, 'ratio', { digits: 2 }) }),
  };
}

function wordOf(id: VerdictId, finding: Finding): string {
  if (finding.rule === 'no-relief') return 'No relief protects a net';
  if (finding.rule === 'load-runs-away') return 'Load runs back';
  return finding.rule === 'not-up-to-speed' ? 'Does not come up to speed' : verdictWords[id];
}

function verdictFigure(context: FindingContext, id: VerdictId, finding: Finding): Figure | null {
  const drive = context.drives.find((entry) => entry.component.id === finding.component);
  if (id === 'motor-stalls' && finding.rule === 'motor-stalls') return figure(finding.time ?? 0, 'time', { digits: 1 });
  if (id === 'trips' && drive?.yardsticks.tripTime != null) return figure(drive.yardsticks.tripTime, 'time', { digits: 0 });
  if (id === 'relief-passing' && finding.at) return figure(finding.at.flow, 'flow');
  if (id === 'over' && drive) return figure(drive.yardsticks.rmsCurrent, 'fraction', { digits: 0 });
  if (id === 'rod-stops-short' && finding.rule === 'rod-stops-short')
    return finding.headline.find((part): part is Figure => typeof part !== 'string') ?? null;
  return id === 'failed' ? figure(context.run.time, 'time', { digits: 1 }) : null;
}
