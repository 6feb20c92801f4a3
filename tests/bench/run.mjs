// Measures and prints. Each part is a module in this folder that exports `measure()`, which returns a list of
// { name, value, unit, goal? } (goal: value should stay below it). Parts are bundled first, as the product's workers are.
// `npm run bench` runs all parts, `npm run bench -- engine` one of them.
import { mkdtemp, rm } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { fileURLToPath, pathToFileURL } from 'node:url';
import { build } from 'vite';

const here = fileURLToPath(new URL('.', import.meta.url));
const parts = ['engine'];
const asked = process.argv.slice(2);

const folder = await mkdtemp(join(tmpdir(), 'swashbench-bench-'));
let missed = 0;
try {
  for (const part of parts) {
    if (asked.length > 0 && !asked.includes(part)) continue;
    await build({
      configFile: false,
      logLevel: 'error',
      root: here,
      ssr: { noExternal: true },
      build: {
        ssr: join(here, `${part}.ts`),
        outDir: folder,
        emptyOutDir: false,
        minify: false,
        target: 'node20',
        rollupOptions: { output: { entryFileNames: `${part}.mjs` } },
      },
    });
    const { measure } = await import(pathToFileURL(join(folder, `${part}.mjs`)).href);
    console.log(`\n${part}`);
    for (const { name, value, unit, goal } of await measure()) {
      const verdict = goal === undefined ? '' : value <= goal ? `  (goal ${goal} ${unit}: met)` : `  (goal ${goal} ${unit}: MISSED)`;
      if (goal !== undefined && value > goal) missed++;
      console.log(`  ${name.padEnd(58)} ${Number(value.toPrecision(4)).toString().padStart(10)} ${unit}${verdict}`);
    }
  }
} finally {
  await rm(folder, { recursive: true, force: true });
}
process.exitCode = missed > 0 ? 1 : 0;
