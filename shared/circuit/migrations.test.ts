import { describe, expect, it } from 'vitest';
import { type MigrationStep, migrateDocument, migrationSteps } from './migrations.ts';
import { DOCUMENT_VERSION } from './schema.ts';

const steps: readonly MigrationStep[] = [
  { from: 1, name: 'title becomes name', migrate: ({ title, ...rest }) => ({ ...rest, name: title }) },
  { from: 2, name: 'site is added', migrate: (document) => ({ ...document, site: { altitude: 0 } }) },
];

describe('migrateDocument', () => {
  it('takes the named steps one by one and leaves its argument alone', () => {
    const old = Object.freeze({ version: 1, title: 'Press' });
    expect(migrateDocument(old, 1, steps, 3)).toEqual({
      document: { version: 3, name: 'Press', site: { altitude: 0 } },
      taken: ['title becomes name', 'site is added'],
    });
    expect(old).toEqual({ version: 1, title: 'Press' });
  });

  it('gives a document of the present version back untouched', () => {
    const document = { version: 3 };
    expect(migrateDocument(document, 3, steps, 3)).toEqual({ document, taken: [] });
  });

  it('gives null where a step is missing', () => {
    expect(migrateDocument({ version: 1 }, 1, steps.slice(1), 3)).toBeNull();
  });

  it('has a step for every older version', () => {
    const older = Array.from({ length: DOCUMENT_VERSION - 1 }, (_, index) => index + 1);
    expect(migrationSteps.map((step) => step.from)).toEqual(older);
  });
});
