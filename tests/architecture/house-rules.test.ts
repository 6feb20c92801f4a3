import { describe, expect, test } from 'vitest';
import { codeOf, filesUnder, root, sourceFiles, textOf, tops } from './source-files.ts';

const MOST_LINES = 300;
/** Longer files, each with its reason. */
const longFiles: Readonly<Record<string, string>> = {};

const files = sourceFiles();

test('file and folder names are kebab-case', () => {
  const good = /^(\.?[a-z0-9]+(-[a-z0-9]+)*)(\.[a-z0-9]+(-[a-z0-9]+)*)*$/;
  const wrong = tops
    .flatMap((top) => filesUnder(top))
    .filter((path) => !path.startsWith('tests/fixtures/') && !path.split('/').every((part) => good.test(part)));
  expect(wrong).toEqual([]);
});

test(`no source file is longer than ${MOST_LINES} lines unless its reason is written down`, () => {
  const long = files.filter((path) => textOf(path).split('\n').length - 1 > MOST_LINES && !(path in longFiles));
  expect(long.map((path) => `${path}: ${textOf(path).split('\n').length - 1}`)).toEqual([]);
  const idle = Object.keys(longFiles).filter((path) => !files.includes(path) || textOf(path).split('\n').length - 1 <= MOST_LINES);
  expect(idle, 'exceptions that are no longer needed').toEqual([]);
});

describe('types are not switched off', () => {
  const ts = files.filter((path) => /\.(ts|tsx|mts)$/.test(path));
  const without = (pattern: RegExp, read: (path: string) => string) =>
    ts.filter((path) => path !== 'tests/architecture/house-rules.test.ts' && pattern.test(read(path)));

  test('no any', () => {
    expect(without(/[:<,(|&]\s*any\b|\bas any\b|\bany\[\]/, codeOf)).toEqual([]);
  });
  test('no comment that silences the compiler', () => {
    expect(without(/@ts-(ignore|nocheck|expect-error)/, textOf)).toEqual([]);
  });
});

describe('the engine gives the same bits in every host', () => {
  /** Evaluated by each host in its own way; only + − × ÷ and the exact functions of Math may stand in what a run evaluates. */
  const inexact =
    /\bMath\.(pow|exp|expm1|log|log2|log10|log1p|sin|cos|tan|sinh|cosh|tanh|asin|acos|atan|atan2|asinh|acosh|atanh|cbrt|hypot|fround)\b|\*\*/;
  const kernels = files.filter(
    (path) => /^shared\/(kinds|numerics|simulation|fluid)\//.test(path) && !/\.test\.ts$|\/testing\.ts$/.test(path),
  );

  test('the files in question are there', () => {
    expect(kernels.length).toBeGreaterThan(30);
  });
  test.each(kernels)('%s uses only exact arithmetic', (path) => {
    const lines = codeOf(path)
      .split('\n')
      .map((line, index) => `${index + 1}: ${line.trim()}`);
    expect(lines.filter((line) => inexact.test(line))).toEqual([]);
  });
  test('shared has no clock and no chance', () => {
    const wrong = files.filter(
      (path) =>
        path.startsWith('shared/') &&
        !/\.test\.ts$|\/testing\.ts$/.test(path) &&
        /\b(Date\.now|new Date\(|performance\.now|Math\.random|crypto\.)/.test(codeOf(path)),
    );
    expect(wrong).toEqual([]);
  });
});

describe('what is committed speaks of the product only', () => {
  const self = 'tests/architecture/house-rules.test.ts';
  const everything = [
    ...files.filter((path) => path !== self),
    'package.json',
    'vite.config.ts',
    'index.html',
    'README.md',
    'DEVELOPERS.md',
    '.ci/run',
    '.npmrc',
  ];

  test('no paths of the machine it was written on', () => {
    expect(everything.filter((path) => /\/work\/|\/root\/|\/home\/[a-z]|\/Users\//.test(textOf(path)))).toEqual([]);
  });
  test('the lock names no registry', () => {
    expect(textOf('package-lock.json')).not.toContain('"resolved"');
  });
  test('nothing is left for later and no test is left out', () => {
    expect(everything.filter((path) => /\b(TODO|FIXME|XXX|HACK)\b/.test(textOf(path)))).toEqual([]);
    const skipped = files.filter(
      (path) =>
        path !== self &&
        /\.test\.tsx?$/.test(path) &&
        /\b(test|it|describe)\.(skip|only|todo|fails)\b|\bx(it|test|describe)\(/.test(codeOf(path)),
    );
    expect(skipped).toEqual([]);
  });
  test('it is read from the checkout', () => {
    expect(root.length).toBeGreaterThan(1);
    expect(textOf('package.json')).toContain('"name": "swashbench"');
  });
});
