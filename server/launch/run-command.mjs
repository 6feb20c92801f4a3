import { join } from 'node:path';
import { pathToFileURL } from 'node:url';
import { isBuilt } from './build-stamp.mjs';
import { ensurePackages } from './ensure-packages.mjs';
import { root } from './paths.mjs';
import { sayProblem } from './problem.mjs';

/** Runs a command line of server/cli in this process: the built one when it is up to date, else its sources. */
export async function runCommand(name) {
  try {
    await ensurePackages((line) => process.stderr.write(`${line}\n`));
  } catch (error) {
    sayProblem(error);
    process.exit(1);
  }
  if (isBuilt('server')) {
    await import(pathToFileURL(join(root, 'dist', 'server', `${name}.js`)).href);
    return;
  }
  const { register } = await import('tsx/esm/api');
  register();
  await import(pathToFileURL(join(root, 'server', 'cli', `${name}.ts`)).href);
}
