import { readFileSync } from 'node:fs';
import { describe, expect, it } from 'vitest';
import { crowdedCircuit } from '#shared/circuit/samples/crowded.ts';
import { demoCircuit } from '#shared/circuit/samples/demo.ts';
import { ENGINE_VERSION } from '#shared/simulation/engine-version.ts';
import { runToEnd } from '#shared/simulation/run.ts';
import { compiled, readFixtureCircuit } from '../support/reference-case.ts';

/** Hashes of all accepted steps. When one of these fails, results have changed in their bits: if that is meant, raise
 *  ENGINE_VERSION and write the new hashes and the new version into tests/fixtures/golden-hashes.json. */

interface Golden {
  readonly engineVersion: number;
  readonly hashes: Readonly<Record<string, string>>;
}

const golden = JSON.parse(readFileSync(new URL('../fixtures/golden-hashes.json', import.meta.url), 'utf8')) as Golden;

const runs: Readonly<Record<string, () => string>> = {
  'S1 at 1e-4': () => runToEnd(compiled(readFixtureCircuit('s1')), 1e-4).hash,
  'S2 at 1e-4': () => runToEnd(compiled(readFixtureCircuit('s2')), 1e-4).hash,
  'S1 at 1e-6': () => runToEnd(compiled(readFixtureCircuit('s1')), 1e-6).hash,
  'crowded circuit at 1e-4': () => runToEnd(compiled(crowdedCircuit), 1e-4).hash,
  ...Object.fromEntries(
    demoCircuit.cases.map((entry) => [`demo case ${entry.id} at 1e-4`, () => runToEnd(compiled(demoCircuit, entry.id), 1e-4).hash]),
  ),
};

describe('golden hashes', () => {
  it('belong to this engine version', () => {
    expect(golden.engineVersion).toBe(ENGINE_VERSION);
    expect(Object.keys(golden.hashes).sort()).toEqual(Object.keys(runs).sort());
  });

  for (const [name, hash] of Object.entries(runs)) {
    it(`${name} takes the same steps to the last bit`, () => {
      expect(hash(), 'raise ENGINE_VERSION if results are meant to change').toBe(golden.hashes[name]);
    });
  }
});
