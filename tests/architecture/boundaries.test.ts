import { existsSync } from 'node:fs';
import { builtinModules } from 'node:module';
import { posix } from 'node:path';
import { describe, expect, test } from 'vitest';
import { type Import, importsOf, root, sourceFiles, textOf } from './source-files.ts';

/** Which top folder may import which. Adding a pair is a reviewed change. */
const mayImport: Readonly<Record<string, readonly string[]>> = {
  shared: ['shared'],
  server: ['server', 'shared'],
  src: ['src', 'shared'],
  tests: ['tests', 'server', 'src', 'shared'],
};
/** Packages that a folder may import; a folder that is not listed may import what package.json has. */
const packagesOf: Readonly<Record<string, readonly string[]>> = { shared: ['zod', 'zod/mini'] };
/** What tests beside the code may import on top. */
const isTest = (path: string) => /\.test\.tsx?$/.test(path);

const top = (path: string) => path.split('/')[0] as string;
const all = sourceFiles().flatMap((path) => importsOf(path));
const isOwn = ({ specifier }: Import) => specifier.startsWith('.') || specifier.startsWith('#');
const bare = (specifier: string) => specifier.split('?')[0] as string;

/** Path from the root that one of our own imports means. */
function target({ from, specifier }: Import): string {
  const path = bare(specifier);
  return path.startsWith('#') ? path.slice(1) : posix.join(posix.dirname(from), path);
}

/** Scripts that run before anything is installed lead to one another by plain paths. */
const isScript = (path: string) => path.endsWith('.mjs') || path.endsWith('.cjs');

test('the imports of the whole product are seen', () => {
  expect(all.length).toBeGreaterThan(500);
  for (const folder of Object.keys(mayImport)) expect(all.some((entry) => top(entry.from) === folder)).toBe(true);
});

describe('arrows between the top folders', () => {
  test('every import between them is in the table', () => {
    const wrong = all.filter((entry) => isOwn(entry) && !isTest(entry.from) && !mayImport[top(entry.from)]?.includes(top(target(entry))));
    expect(wrong).toEqual([]);
  });

  test('tests beside the code may use tests/support and nothing else of tests', () => {
    const wrong = all.filter(
      (entry) => isTest(entry.from) && top(entry.from) !== 'tests' && isOwn(entry) && /^tests\//.test(target(entry)),
    );
    expect(wrong.filter((entry) => !target(entry).startsWith('tests/support/'))).toEqual([]);
  });

  test('between top folders by #name, inside one by relative path', () => {
    const wrong = all.filter((entry) => {
      if (!isOwn(entry) || isScript(entry.from)) return false;
      const crosses = top(entry.from) !== top(target(entry));
      return crosses ? !entry.specifier.startsWith('#') : false;
    });
    expect(wrong.filter((entry) => !isScript(target(entry)))).toEqual([]);
  });
});

test('shared imports only itself, zod, and odex through shared/odex', () => {
  const wrong = all.filter((entry) => {
    if (top(entry.from) !== 'shared' || isTest(entry.from) || isOwn(entry)) return false;
    if (entry.from.startsWith('shared/odex/') && entry.specifier.startsWith('odex')) return false;
    return !packagesOf.shared?.includes(entry.specifier);
  });
  expect(wrong).toEqual([]);
});

test('src imports nothing of Node', () => {
  const names = new Set(builtinModules);
  const wrong = all.filter(
    (entry) => top(entry.from) === 'src' && !isTest(entry.from) && (entry.specifier.startsWith('node:') || names.has(entry.specifier)),
  );
  expect(wrong).toEqual([]);
});

test('our own imports carry the file extension and lead to a file', () => {
  const wrong = all.filter(
    (entry) => isOwn(entry) && (!/\.[a-z0-9]+$/.test(bare(entry.specifier)) || !existsSync(`${root}/${target(entry)}`)),
  );
  expect(wrong).toEqual([]);
});

test('no folder is hidden behind an index file, nothing is exported as a whole or as default', () => {
  const files = sourceFiles();
  expect(files.filter((path) => /(^|\/)index\.(ts|tsx|mjs)$/.test(path))).toEqual([]);
  const wholesale = files.filter((path) => /^\s*export\s+\*/m.test(textOf(path)));
  expect(wholesale).toEqual([]);
  const defaults = files.filter((path) => /\.(ts|tsx)$/.test(path) && /^export default\b/m.test(textOf(path)));
  expect(defaults.filter((path) => !mustBeDefault.some((pattern) => pattern.test(path)))).toEqual([]);
});

/** Files whose reader asks for a default export: vite, vitest, and the thread pool. */
const mustBeDefault = [/\.config\.ts$/, /-setup\.ts$/, /\.thread\.ts$/];

test('only the configuration reads the environment of the server', () => {
  const readers = sourceFiles().filter((path) => path.startsWith('server/') && !isTest(path) && /\bprocess\.env\b/.test(textOf(path)));
  const allowed = /^server\/(launch\/.*\.mjs|config\.ts|main\.ts|db\/migrate\.ts|cli\/shops\.ts)$/;
  expect(readers.filter((path) => !allowed.test(path))).toEqual([]);
});
