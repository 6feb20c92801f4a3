import { readdirSync, readFileSync } from 'node:fs';
import { fileURLToPath } from 'node:url';

export const root = fileURLToPath(new URL('../..', import.meta.url));

/** Paths from the root, with forward slashes, of every file below a folder. */
export function filesUnder(folder: string): string[] {
  return readdirSync(`${root}/${folder}`, { recursive: true, withFileTypes: true })
    .filter((entry) => entry.isFile())
    .map((entry) =>
      `${entry.parentPath}/${entry.name}`.replaceAll('\\', '/').replaceAll('//', '/').slice(root.replaceAll('\\', '/').length),
    )
    .map((path) => path.replace(/^\//, ''))
    .sort();
}

export const tops = ['shared', 'server', 'src', 'tests'] as const;

/** Every source file of the product and its tests. */
export function sourceFiles(): string[] {
  return tops.flatMap((top) => filesUnder(top)).filter((path) => /\.(ts|tsx|mts|mjs|cjs)$/.test(path));
}

export function textOf(path: string): string {
  return readFileSync(`${root}/${path}`, 'utf8');
}

/** Source without comments and without the insides of texts, line by line: what the machine obeys. */
export function codeOf(path: string): string {
  return textOf(path)
    .replace(/\/\*[\s\S]*?\*\//g, (comment) => comment.replace(/[^\n]/g, ' '))
    .replace(/(^|[^:'"`\\])\/\/[^\n]*/g, '$1')
    .replace(/'(?:[^'\\\n]|\\.)*'|"(?:[^"\\\n]|\\.)*"/g, "''");
}

export interface Import {
  readonly from: string;
  readonly specifier: string;
}

/** Every static import, re-export and literal dynamic import of a file. */
export function importsOf(path: string): Import[] {
  const text = textOf(path).replace(/\/\*[\s\S]*?\*\//g, '');
  const pattern =
    /^\s*(?:import|export)\b[^'"`;]*?\bfrom\s*['"]([^'"]+)['"]|^\s*import\s*['"]([^'"]+)['"]|\bimport\(\s*['"]([^'"]+)['"]\s*\)/gm;
  return [...text.matchAll(pattern)].map((match) => ({ from: path, specifier: (match[1] ?? match[2] ?? match[3]) as string }));
}
