import { readdirSync, readFileSync } from 'node:fs';
import { fileURLToPath } from 'node:url';
import { describe, expect, it } from 'vitest';

/** A run gives the same bits in every host only while kernels, oil laws and the integrator use + − × ÷ and these functions. */
const allowed = new Set(['sqrt', 'abs', 'min', 'max', 'floor', 'ceil', 'sign', 'trunc']);
const constant = /^[A-Z0-9_]+$/;
const folders = ['kinds', 'fluid', 'numerics'];

describe('same bits in every host', () => {
  it.each(folders)('shared/%s uses no function that hosts may round differently', (folder) => {
    const root = fileURLToPath(new URL(`../../shared/${folder}/`, import.meta.url));
    const files = (readdirSync(root, { recursive: true }) as string[]).filter((name) => name.endsWith('.ts') && !name.endsWith('.test.ts'));
    expect(files.length).toBeGreaterThan(3);
    for (const name of files) {
      const text = readFileSync(root + name, 'utf8').replace(/\/\*[\s\S]*?\*\/|\/\/.*$/gm, '');
      for (const [, used = ''] of text.matchAll(/\bMath\.(\w+)/g)) {
        expect(allowed.has(used) || constant.test(used), `${folder}/${name}: Math.${used}`).toBe(true);
      }
      expect(/\*\*/.test(text), `${folder}/${name}: power operator`).toBe(false);
    }
  });
});
