import { parseArgs } from 'node:util';
import { tolerances } from '#shared/simulation/result.ts';

export const USAGE = `Usage: npm run -s simulate -- FILE.json [--case NAME] [--rtol 1e-4] [--json | --csv OUT]
  FILE.json     a circuit document, as the bench exports it
  --case NAME   name or id of the case to run; the first case without it
  --rtol R      relative tolerance, 1e-10 to 1e-2; ${tolerances.normal} without it
  --json        the run's summary as JSON on standard output
  --csv OUT     also write all traces to the file OUT, in SI units
Exit codes: 0 finished, 1 internal fault, 2 bad document or arguments, 3 the run failed (what was reached is printed).`;

export interface SimulateArguments {
  readonly file: string;
  readonly caseName: string | null;
  readonly rtol: number;
  readonly json: boolean;
  readonly csv: string | null;
}

const LEAST_RTOL = 1e-10;
const MOST_RTOL = 1e-2;

/** @returns the arguments, or the sentence that says what is wrong with them */
export function readArguments(args: readonly string[]): SimulateArguments | string {
  try {
    const { values, positionals } = parseArgs({
      args: [...args],
      allowPositionals: true,
      options: { case: { type: 'string' }, rtol: { type: 'string' }, json: { type: 'boolean' }, csv: { type: 'string' } },
    });
    const [file, ...more] = positionals;
    if (!file || more.length > 0) return `One circuit file is needed; ${positionals.length} were given.`;
    if (values.json && values.csv !== undefined) return 'Give --json or --csv, not both.';
    const rtol = values.rtol === undefined ? tolerances.normal : Number(values.rtol);
    if (!(rtol >= LEAST_RTOL && rtol <= MOST_RTOL))
      return `--rtol is "${values.rtol}": it must be a number from ${LEAST_RTOL} to ${MOST_RTOL}.`;
    return { file, caseName: values.case ?? null, rtol, json: values.json ?? false, csv: values.csv ?? null };
  } catch (error) {
    if (error instanceof TypeError) return `${error.message}.`;
    throw error;
  }
}
