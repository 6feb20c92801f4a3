import { spawnSync } from 'node:child_process';
import { readFileSync } from 'node:fs';
import { Problem } from './problem.mjs';

/** PostgreSQL refuses to run as root. As root, its files and processes belong to the system user postgres (nobody if there is none).
 *  @returns {{ uid: number, gid: number, name: string } | null} null = the present user */
export function databaseUser() {
  if (process.getuid?.() !== 0) return null;
  const users = readFileSync('/etc/passwd', 'utf8')
    .split('\n')
    .map((line) => line.split(':'));
  const entry = users.find(([name]) => name === 'postgres') ?? users.find(([name]) => name === 'nobody');
  if (!entry) throw new Problem('PostgreSQL cannot run as root and there is no other user: start Swashbench as an ordinary user.');
  return { name: entry[0], uid: Number(entry[2]), gid: Number(entry[3]) };
}

/** Every folder above the database's must be open to its user. */
export function checkReach(folder, user) {
  if (!user) return;
  const { status } = spawnSync('test', ['-x', folder], {
    uid: user.uid,
    gid: user.gid,
    cwd: '/',
  });
  if (status === 0) return;
  throw new Problem(
    `The system user ${user.name}, who runs the database, may not enter ${folder}: choose a DATA_DIR whose parent folders are open to everyone, or start as an ordinary user.`,
  );
}
