import { join } from 'node:path';
import { pathToFileURL } from 'node:url';
import { isBuilt, markBuilt, sourceStamp, unmarkBuilt } from './build-stamp.mjs';
import { ensurePackages } from './ensure-packages.mjs';
import { root } from './paths.mjs';
import { sayProblem } from './problem.mjs';
import { mustRun } from './run-tool.mjs';

const vite = join(root, 'node_modules', 'vite', 'bin', 'vite.js');
const configs = { client: [], server: ['-c', 'server/vite.server.config.ts'] };

async function buildHalf(half, say) {
  const stamp = sourceStamp(half);
  if (isBuilt(half, stamp)) return;
  say(`Building the ${half} …`);
  unmarkBuilt(half);
  await mustRun(process.execPath, [vite, 'build', ...configs[half]], {
    doing: `Building the ${half}`,
    where: `${root}/dist`,
    env: { ...process.env, NODE_ENV: 'production' },
  });
  markBuilt(half, stamp);
}

/** Builds what changed since the last build: server first (it is quick), then client. */
export async function ensureBuilt(say, which = ['server', 'client']) {
  for (const half of which) await buildHalf(half, say);
}

if (import.meta.url === pathToFileURL(process.argv[1] ?? '').href) {
  const say = (line) => process.stderr.write(`${line}\n`);
  const which = process.argv.slice(2);
  try {
    await ensurePackages(say);
    await ensureBuilt(say, which.length > 0 ? which : undefined);
  } catch (error) {
    sayProblem(error);
    process.exitCode = 1;
  }
}
