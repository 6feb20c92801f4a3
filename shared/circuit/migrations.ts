import { DOCUMENT_VERSION } from './schema.ts';

/** Older documents are brought up one version at a time by named steps. A step is never changed once released; each version
 *  keeps a fixture in tests/fixtures/circuits/v<version> for ever, and a test fails when a step has none. */
export interface MigrationStep {
  readonly from: number;
  /** What changed, in words: shown when a file is opened. */
  readonly name: string;
  /** Pure: must not write into its argument. The result has version `from + 1`. */
  readonly migrate: (document: Readonly<Record<string, unknown>>) => Record<string, unknown>;
}

/** Version 1 is the first: there is nothing to migrate from yet. */
export const migrationSteps: readonly MigrationStep[] = [];

export interface Migrated {
  readonly document: Readonly<Record<string, unknown>>;
  /** Names of the steps that were taken, in order. */
  readonly taken: readonly string[];
}

/** Brings a document of version `from` to `to`. Returns null where a step is missing. */
export function migrateDocument(
  document: Readonly<Record<string, unknown>>,
  from: number,
  steps: readonly MigrationStep[] = migrationSteps,
  to: number = DOCUMENT_VERSION,
): Migrated | null {
  let current = document;
  const taken: string[] = [];
  for (let version = from; version < to; version++) {
    const step = steps.find((entry) => entry.from === version);
    if (!step) return null;
    current = { ...step.migrate(current), version: version + 1 };
    taken.push(step.name);
  }
  return { document: current, taken };
}
