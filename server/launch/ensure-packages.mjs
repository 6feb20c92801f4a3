import { createHash } from 'node:crypto';
import { existsSync, readFileSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { root } from './paths.mjs';
import { Problem } from './problem.mjs';
import { mustRun } from './run-tool.mjs';

const LEAST_NODE = [20, 19];
const stampFile = join(root, 'node_modules', '.swashbench-stamp');
const installedLock = join(root, 'node_modules', '.package-lock.json');

function wantedStamp() {
  const hash = createHash('sha256').update(readFileSync(join(root, 'package-lock.json')));
  return hash.update(`${process.versions.modules} ${process.platform} ${process.arch}`).digest('hex');
}

/** True when npm's own record of what it installed holds everything in the lock (someone ran npm by hand). More does no harm. */
function agreesWithLock() {
  if (!existsSync(installedLock)) return false;
  const wanted = JSON.parse(readFileSync(join(root, 'package-lock.json'), 'utf8')).packages;
  const present = JSON.parse(readFileSync(installedLock, 'utf8')).packages;
  const missing = Object.entries(wanted).some(([path, entry]) => {
    if (path === '' || (entry.optional && !present[path])) return false;
    return present[path]?.version !== entry.version || present[path]?.integrity !== entry.integrity;
  });
  return !missing;
}

function checkNode() {
  const [major, minor] = process.versions.node.split('.').map(Number);
  if (major > LEAST_NODE[0] || (major === LEAST_NODE[0] && minor >= LEAST_NODE[1])) return;
  throw new Problem(`Swashbench needs Node ${LEAST_NODE.join('.')} or newer; this is Node ${process.versions.node}.`);
}

/** Installs the packages of package-lock.json unless exactly these are there already. `say` gets one line when work starts. */
export async function ensurePackages(say) {
  checkNode();
  const wanted = wantedStamp();
  if (existsSync(stampFile) && readFileSync(stampFile, 'utf8') === wanted) return;
  if (!agreesWithLock()) {
    say('Installing packages (about a minute the first time) …');
    const npm = process.env.npm_execpath;
    const [file, first] = npm?.endsWith('.js') ? [process.execPath, [npm]] : ['npm', []];
    await mustRun(file, [...first, 'ci', '--include=dev', '--no-audit', '--no-fund', '--loglevel=error'], {
      doing: 'Installing packages',
      env: { ...process.env, NODE_ENV: 'development' },
    });
  }
  writeFileSync(stampFile, wanted);
}
