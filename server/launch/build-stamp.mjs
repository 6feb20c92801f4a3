import { createHash } from 'node:crypto';
import { existsSync, mkdirSync, readdirSync, readFileSync, rmSync, statSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { root } from './paths.mjs';

/** What each half is built from. */
export const halves = {
  client: {
    sources: ['index.html', 'public', 'src', 'shared', 'vite.config.ts', 'package-lock.json'],
    made: 'dist/client/index.html',
  },
  server: {
    sources: ['server', 'shared', 'package-lock.json'],
    made: 'dist/server/main.js',
  },
};

function* filesUnder(path) {
  if (!existsSync(path)) return;
  if (!statSync(path).isDirectory()) {
    yield path;
    return;
  }
  for (const name of readdirSync(path).sort()) yield* filesUnder(join(path, name));
}

/** Hash over names and contents of a half's sources; tests beside the code do not count. */
export function sourceStamp(half) {
  const hash = createHash('sha256');
  for (const source of halves[half].sources) {
    for (const file of filesUnder(join(root, source))) {
      if (/\.test\.tsx?$/.test(file)) continue;
      hash.update(file.slice(root.length)).update('\0').update(readFileSync(file)).update('\0');
    }
  }
  return hash.digest('hex');
}

const stampFile = (half) => join(root, 'dist', `${half}.stamp`);

/** True when the half was built from exactly these sources. */
export function isBuilt(half, stamp = sourceStamp(half)) {
  return existsSync(join(root, halves[half].made)) && existsSync(stampFile(half)) && readFileSync(stampFile(half), 'utf8') === stamp;
}

export function markBuilt(half, stamp) {
  mkdirSync(join(root, 'dist'), { recursive: true });
  writeFileSync(stampFile(half), stamp);
}

export function unmarkBuilt(half) {
  rmSync(stampFile(half), { force: true });
}
