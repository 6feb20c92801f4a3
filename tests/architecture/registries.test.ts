import { expect, test } from 'vitest';
import { routes, schemas } from '#shared/api/routes.ts';
import { kinds } from '#shared/kinds/registry.ts';
import { symbols } from '#shared/symbols/registry.ts';
import { filesUnder, textOf } from './source-files.ts';

/** Kinds by their id, however the registry keeps them. */
const kindIds = Object.values(kinds).map((kind) => kind.id);

test('every kind in the folder is in the registry, and every kind there has a file', () => {
  const declared = filesUnder('shared/kinds')
    .filter((path) => path.endsWith('.ts') && !path.endsWith('.test.ts'))
    .flatMap((path) => [...textOf(path).matchAll(/defineKind\(\{\s*id: '([a-z0-9-]+)'/g)].map((match) => match[1]));
  expect([...kindIds].sort()).toEqual([...declared].sort());
  expect(new Set(kindIds).size).toBe(kindIds.length);
});

test('every kind has a symbol and every symbol a kind', () => {
  expect(Object.keys(symbols).sort()).toEqual([...kindIds].sort());
});

test('every schema of the API is used by a route or is an error', () => {
  const used = new Set<string>(['ErrorBody', 'CircuitDocument']);
  for (const route of routes) {
    if (route.request) used.add(route.request);
    for (const answer of Object.values(route.answers)) if (answer.schema) used.add(answer.schema);
  }
  expect(Object.keys(schemas).filter((name) => !used.has(name))).toEqual([]);
});

test('every route of the server is in the list of contracts', () => {
  const app = textOf('server/app.ts');
  const mounted = [...app.matchAll(/router\.use\('(\/[a-z./-]+)'/g)].map((match) => `/api${match[1]}`);
  expect(mounted.sort()).toEqual([...new Set(routes.map((route) => route.path))].sort());
});

test('every service asks a policy', () => {
  const services = filesUnder('server/features').filter((path) => path.endsWith('.service.ts'));
  expect(services.length).toBeGreaterThan(0);
  const silent = services.filter((path) => !/from '\.\/[a-z-]+\.policy\.ts'/.test(textOf(path)));
  expect(silent).toEqual([]);
});
