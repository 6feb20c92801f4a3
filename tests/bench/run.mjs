// Measures and prints. Each part is a module in this folder that exports `measure()`, which returns a list of
// { name, value, unit, goal? } (goal: value should stay below it). The engine is bundled first, as the product's workers are;
// the screen is measured in Chromium on the built product.
// `npm run bench` runs all parts, `npm run bench -- engine` or `npm run bench -- screen` one of them.
import { mkdtemp, rm } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { fileURLToPath, pathToFileURL } from 'node:url';
import { build } from 'vite';

const here = fileURLToPath(new URL('.', import.meta.url));
const parts = ['engine', 'screen'];
const asked = process.argv.slice(2);

const folder = await mkdtemp(join(tmpdir(), 'swashbench-bench-'));
let missed = 0;
async function bundled(part) {
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
  return import(pathToFileURL(join(folder, `${part}.mjs`)).href);
}

try {
  for (const part of parts) {
    if (asked.length > 0 && !asked.includes(part)) continue;
    const { measure } = part === 'screen' ? await import('./screen.mjs') : await bundled(part);
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
