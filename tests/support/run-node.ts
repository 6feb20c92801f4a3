import { type ChildProcess, spawn } from 'node:child_process';
import { fileURLToPath } from 'node:url';

export const projectRoot = fileURLToPath(new URL('../..', import.meta.url));

export interface Ended {
  readonly code: number | null;
  readonly out: string;
  readonly err: string;
}

/** Environment without anything this machine may have set for the product. */
export function cleanEnvironment(env: Readonly<Record<string, string>> = {}): NodeJS.ProcessEnv {
  const mine = ['DATABASE_URL', 'PORT', 'HOST', 'DATA_DIR', 'PUBLIC_URL', 'TRUST_PROXY', 'SMTP_URL', 'LOG_LEVEL', 'NODE_OPTIONS', 'VITEST'];
  const kept = Object.entries(process.env).filter(([name]) => !mine.includes(name) && !name.startsWith('VITEST_'));
  return { ...Object.fromEntries(kept), NODE_ENV: 'production', ...env };
}

/** Runs a script of the project with Node to its end. */
export function runNode(args: readonly string[], env: Readonly<Record<string, string>> = {}): Promise<Ended> {
  const child = spawn(process.execPath, args, { cwd: projectRoot, env: cleanEnvironment(env), stdio: ['ignore', 'pipe', 'pipe'] });
  return collected(child);
}

/** What a child says until it ends. */
export function collected(child: ChildProcess): Promise<Ended> {
  let out = '';
  let err = '';
  child.stdout?.on('data', (data) => {
    out += data;
  });
  child.stderr?.on('data', (data) => {
    err += data;
  });
  return new Promise((resolve, reject) => {
    child.on('error', reject);
    child.on('close', (code) => resolve({ code, out, err }));
  });
}
