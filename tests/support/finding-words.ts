import type { Assessment, Figure, Finding, FindingRule, Phrase } from '#shared/findings/finding.ts';

/** Looking into findings. */

export const rulesOf = (assessment: Assessment) => assessment.findings.map((finding) => finding.rule);
export function find(assessment: Assessment, rule: FindingRule): Finding {
  const finding = assessment.findings.find((entry) => entry.rule === rule);
  if (!finding) throw new Error(`no finding ${rule}, only ${rulesOf(assessment).join(', ')}`);
  return finding;
}
export const figures = (phrase: Phrase): Figure[] => phrase.filter((part): part is Figure => typeof part !== 'string');
export const words = (phrase: Phrase) => phrase.filter((part) => typeof part === 'string').join('');
export const values = (phrase: Phrase) => figures(phrase).map((figure) => figure.value);
