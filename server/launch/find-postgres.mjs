import { existsSync, readdirSync } from 'node:fs';
import { delimiter, join } from 'node:path';
import { aptInstall } from './apt.mjs';
import { Problem } from './problem.mjs';

const DEBIAN = '/usr/lib/postgresql';

/** Folder with initdb and postgres: PG_BIN, else the newest Debian folder, else the first on PATH; null when there is none. */
export function findPostgres() {
  const versions = existsSync(DEBIAN) ? readdirSync(DEBIAN).sort((a, b) => Number(b) - Number(a)) : [];
  const places = [
    process.env.PG_BIN,
    ...versions.map((version) => join(DEBIAN, version, 'bin')),
    ...(process.env.PATH ?? '').split(delimiter),
  ];
  return places.find((place) => place && existsSync(join(place, 'initdb')) && existsSync(join(place, 'postgres'))) ?? null;
}

/** As findPostgres, but installs Debian's package when there is none. */
export async function ensurePostgres(say) {
  const found = findPostgres();
  if (found) return found;
  say('Installing PostgreSQL …');
  await aptInstall('postgresql', 'set DATABASE_URL to a PostgreSQL server that runs already');
  const now = findPostgres();
  if (!now) throw new Problem('PostgreSQL was installed but its programs were not found: set PG_BIN to their folder.');
  return now;
}
