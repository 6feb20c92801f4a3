import { runRandomCircuits } from '../support/run-random-circuits.ts';

/** A thousand seeded random circuits: each runs to the end or fails as a value; no exception, no number that is none. */
const summary = runRandomCircuits(1, 1000);
console.log(JSON.stringify(summary, null, 2));
if (summary.faults.length > 0) process.exitCode = 1;
