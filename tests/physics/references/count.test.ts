import { readdirSync, readFileSync } from 'node:fs';
import { expect, it } from 'vitest';

it('checks at least 40 rows of the reference list, each with its source', () => {
  const found: string[] = [];
  for (const name of readdirSync(import.meta.dirname)) {
    if (!name.endsWith('.test.ts') || name.startsWith('count')) continue;
    const text = readFileSync(new URL(name, import.meta.url), 'utf8');
    for (const match of text.matchAll(/row\(\s*'([A-Z]+[0-9]+)',\s*(['"`])(.+?)\2/g)) {
      expect(match[3]!.length, `${match[1]} names no source`).toBeGreaterThan(10);
      found.push(match[1]!);
    }
  }
  const rows = new Set(found);
  expect(rows.size, [...rows].join(' ')).toBeGreaterThanOrEqual(40);
});
