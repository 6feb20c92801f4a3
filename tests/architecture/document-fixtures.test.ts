import { existsSync, readdirSync, readFileSync } from 'node:fs';
import { fileURLToPath } from 'node:url';
import { describe, expect, it } from 'vitest';
import { migrationSteps } from '#shared/circuit/migrations.ts';
import { parseDocumentText } from '#shared/circuit/parse-document-text.ts';
import { circuitDocument, DOCUMENT_VERSION } from '#shared/circuit/schema.ts';

const root = fileURLToPath(new URL('../fixtures/circuits/', import.meta.url));
const versions = Array.from({ length: DOCUMENT_VERSION }, (_, index) => index + 1);
const filesOf = (version: number) =>
  (existsSync(`${root}v${version}`) ? readdirSync(`${root}v${version}`) : []).filter((name) => name.endsWith('.json'));

describe('saved documents of every version', () => {
  it.each(versions)('version %d has a fixture', (version) => {
    expect(filesOf(version)).not.toEqual([]);
  });

  it.each(versions.flatMap((version) => filesOf(version).map((name) => [version, name] as const)))(
    'v%d/%s still opens',
    (version, name) => {
      const parsed = parseDocumentText(readFileSync(`${root}v${version}/${name}`, 'utf8'));
      expect(parsed.ok ? [] : parsed.issues).toEqual([]);
      if (parsed.ok) expect(parsed.migrated).toEqual(migrationSteps.filter((step) => step.from >= version).map((step) => step.name));
    },
  );

  it('fill every list and record of the document at least once, so that each field is read', () => {
    const parsed = parseDocumentText(readFileSync(`${root}v1/everything.json`, 'utf8'));
    expect(parsed.ok).toBe(true);
    if (!parsed.ok) return;
    for (const field of Object.keys(circuitDocument.shape) as (keyof typeof parsed.document)[]) {
      const value = parsed.document[field];
      if (typeof value === 'object') expect(Object.keys(value).length, field).toBeGreaterThan(0);
    }
  });
});
