import { existsSync, mkdirSync } from 'node:fs';
import { dirname } from 'node:path';
import { guarded, Problem } from './problem.mjs';

/** Makes a folder and its missing parents, one by one: the recursive way never returns on file systems that take no folders.
 *  @param {string} path absolute */
export function makeFolder(path, mode = 0o755) {
  const missing = [];
  for (let at = path; !existsSync(at); at = dirname(at)) missing.unshift(at);
  for (const folder of missing) {
    try {
      guarded(folder, () => mkdirSync(folder, { mode }));
    } catch (error) {
      if (error.code === 'EEXIST') continue;
      if (error instanceof Problem) throw error;
      throw new Problem(`The folder ${folder} cannot be made (${error.code}): set DATA_DIR to another place.`, { cause: error });
    }
  }
}
