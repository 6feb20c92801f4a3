import { existsSync, readFileSync, rmSync } from 'node:fs';
import { join } from 'node:path';
import { setTimeout as pause } from 'node:timers/promises';

/** Process id in postmaster.pid if that process is alive and really serves this folder; null otherwise.
 *  A zombie (nobody collected it) or another program that got the same number counts as gone. */
export function livePostmaster(cluster) {
  const file = join(cluster, 'postmaster.pid');
  if (!existsSync(file)) return null;
  const pid = Number.parseInt(readFileSync(file, 'utf8'), 10);
  try {
    const state = readFileSync(`/proc/${pid}/stat`, 'utf8').split(') ').pop()?.[0];
    const command = readFileSync(`/proc/${pid}/cmdline`, 'utf8').split('\0');
    return state !== 'Z' && command.includes(cluster) ? pid : null;
  } catch {
    return null;
  }
}

/** Clears what an earlier start left behind: ends a server nobody looks after any more, removes a stale pid file.
 *  Only called by the one launcher that holds the lock of this data folder. */
export async function clearRemains(cluster) {
  const pid = livePostmaster(cluster);
  if (pid) {
    process.kill(pid, 'SIGINT');
    for (let i = 0; i < 200 && livePostmaster(cluster); i++) await pause(50);
    if (livePostmaster(cluster)) process.kill(pid, 'SIGQUIT');
    for (let i = 0; i < 100 && livePostmaster(cluster); i++) await pause(50);
  }
  if (!livePostmaster(cluster)) rmSync(join(cluster, 'postmaster.pid'), { force: true });
}
