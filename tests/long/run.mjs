// The long checks, one after the other; each prints what it found and ends with a code other than 0 when something is wrong.
import { spawnSync } from 'node:child_process';
import { fileURLToPath } from 'node:url';

const checks = ['random-circuits.ts'];
let failed = 0;
for (const check of checks) {
  console.log(`\n${check}`);
  const path = fileURLToPath(new URL(check, import.meta.url));
  const { status } = spawnSync(process.execPath, ['--import', 'tsx', path], { stdio: 'inherit' });
  if (status !== 0) failed++;
}
process.exitCode = failed > 0 ? 1 : 0;
