/** npm run -s simulate: the same engine as bench and server, without browser or database. */
import { readFileSync, writeFileSync } from 'node:fs';
import { withValue } from '#server/http/validate.ts';
import { runCsv } from '#shared/api/run-csv.ts';
import { summariseRun } from '#shared/api/summarise-run.ts';
import { parseDocumentText } from '#shared/circuit/parse-document-text.ts';
import type { CircuitDocument } from '#shared/circuit/schema.ts';
import { evaluateCase } from '#shared/findings/evaluate.ts';
import { runReport } from './run-report.ts';
import { readArguments, USAGE } from './simulate-arguments.ts';

const FINISHED = 0;
const INTERNAL = 1;
const BAD_DOCUMENT = 2;
const RUN_FAILED = 3;

const say = (text: string) => process.stdout.write(text);
function refuse(...lines: readonly string[]): number {
  process.stderr.write(`${lines.join('\n')}\n`);
  return BAD_DOCUMENT;
}

function readFile(file: string): string | null {
  try {
    return readFileSync(file, 'utf8');
  } catch (error) {
    if (error instanceof Error && 'code' in error) return null;
    throw error;
  }
}

function findCaseId(document: CircuitDocument, name: string | null): string | null {
  if (name === null) return document.cases[0]?.id ?? null;
  const wanted = name.trim().toLowerCase();
  return document.cases.find((entry) => entry.id === name || entry.name.trim().toLowerCase() === wanted)?.id ?? null;
}

function main(args: readonly string[]): number {
  const wanted = readArguments(args);
  if (typeof wanted === 'string') return refuse(wanted, USAGE);
  const text = readFile(wanted.file);
  if (text === null) return refuse(`The file ${wanted.file} does not exist or may not be read.`);
  const checked = parseDocumentText(text);
  if (!checked.ok) {
    return refuse(
      `${wanted.file} is not a circuit that can be used:`,
      ...checked.issues.map((issue) => `  ${issue.path} ${withValue(issue.value, issue.message)}`),
    );
  }
  const { document } = checked;
  const caseId = findCaseId(document, wanted.caseName);
  if (caseId === null) {
    return refuse(
      `There is no case "${wanted.caseName}": it must be one of ${document.cases.map((entry) => `"${entry.name}"`).join(', ')}.`,
    );
  }
  const evaluation = evaluateCase(document, caseId, wanted.rtol);
  let step = evaluation.next();
  while (!step.done) step = evaluation.next();
  const outcome = step.value;
  if (!outcome.ok) {
    return refuse('The circuit cannot run yet:', ...outcome.problems.filter((p) => p.severity === 'problem').map((p) => `  ${p.message}`));
  }
  const { run } = outcome.evaluation;
  const summary = summariseRun(document, outcome.evaluation);
  if (wanted.csv !== null) writeFileSync(wanted.csv, runCsv(run));
  say(wanted.json ? `${JSON.stringify(summary, null, 2)}\n` : runReport(document, summary));
  return run.status === 'finished' ? FINISHED : RUN_FAILED;
}

// Whoever reads our output may stop reading (… | head): that is no failure of ours.
process.stdout.on('error', () => process.exit(FINISHED));
try {
  process.exitCode = main(process.argv.slice(2));
} catch (error) {
  process.stderr.write(
    `The calculation stopped for a reason that was not foreseen: ${error instanceof Error ? error.message : String(error)}\n`,
  );
  process.exitCode = INTERNAL;
}
