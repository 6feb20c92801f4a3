import { readFileSync, rmSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { makeFolder } from './make-folder.mjs';
import { guarded, Problem } from './problem.mjs';

/** When the process was born, in clock ticks since boot: tells a process from a later one with the same number. */
function birth(pid) {
  try {
    const fields = readFileSync(`/proc/${pid}/stat`, 'utf8').split(') ').pop().split(' ');
    return fields[0] === 'Z' ? null : fields[19];
  } catch {
    return null;
  }
}

/** One launcher per data folder. @returns {() => void} gives the folder free again */
export function lockData(folder) {
  const file = join(folder, 'launcher.json');
  makeFolder(folder);
  const mine = JSON.stringify({ pid: process.pid, birth: birth(process.pid) });
  const take = () => guarded(folder, () => writeFileSync(file, mine, { flag: 'wx' }));
  try {
    take();
  } catch (error) {
    if (error.code !== 'EEXIST') throw error;
    const holder = readHolder(file);
    if (holder && holder.birth !== null && birth(holder.pid) === holder.birth) {
      throw new Problem(
        `Swashbench already runs on the data in ${folder} (process ${holder.pid}): stop that one or set DATA_DIR to another folder.`,
      );
    }
    rmSync(file, { force: true });
    take();
  }
  return () => {
    if (readHolder(file)?.pid === process.pid) rmSync(file, { force: true });
  };
}

function readHolder(file) {
  try {
    return JSON.parse(readFileSync(file, 'utf8'));
  } catch {
    return null;
  }
}
