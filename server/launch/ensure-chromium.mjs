import { existsSync } from 'node:fs';
import { delimiter, join } from 'node:path';
import { aptInstall } from './apt.mjs';

/** Path of a Chromium, or null. */
export function findChromium() {
  const names = ['chromium', 'chromium-browser'];
  const folders = (process.env.PATH ?? '').split(delimiter).filter(Boolean);
  for (const folder of folders) for (const name of names) if (existsSync(join(folder, name))) return join(folder, name);
  return null;
}

/** Chromium for the browser tests, by apt when it is missing. */
export async function ensureChromium(say) {
  if (findChromium()) return;
  say('Installing Chromium for the browser tests …');
  await aptInstall('chromium', 'run the other tests one project at a time');
}
