import { spawn } from 'node:child_process';
import { stripVTControlCharacters } from 'node:util';
import { root } from './paths.mjs';
import { Problem, systemSentence } from './problem.mjs';

const running = new Set();

/** Ends every tool that is still at work: called when the launcher is told to stop. */
export function endTools() {
  for (const child of running) child.kill('SIGTERM');
}

/** Runs a program to its end. Its output is kept back and shown only if it fails, unless `show` is set.
 *  @returns {Promise<{ code: number, output: string }>} */
export function runTool(file, args, { cwd = root, env = process.env, show = false, uid, gid } = {}) {
  return new Promise((resolve, reject) => {
    const child = spawn(file, args, {
      cwd,
      env,
      uid,
      gid,
      stdio: show ? ['ignore', 2, 2] : ['ignore', 'pipe', 'pipe'],
    });
    running.add(child);
    let output = '';
    const keep = (data) => {
      output = (output + data).slice(-20_000);
    };
    child.stdout?.on('data', keep);
    child.stderr?.on('data', keep);
    child.on('error', (error) => {
      running.delete(child);
      reject(error);
    });
    child.on('close', (code) => {
      running.delete(child);
      resolve({ code: code ?? 1, output });
    });
  });
}

/** As runTool, but a failure is a Problem: the usual reasons in a sentence, anything else with the tool's last lines. */
export async function mustRun(file, args, { where = 'the project folder', doing, ...options }) {
  const { code, output } = await runTool(file, args, options);
  if (code === 0) return output;
  const sentence = systemSentence(output, where);
  const tail = gist(output);
  throw new Problem(sentence ?? `${doing} failed (exit code ${code}):\n${tail}`);
}

/** What a tool said, without colours and stacks: the last dozen lines. */
function gist(output) {
  const plain = stripVTControlCharacters(output).split('\n');
  const lines = plain.map((line) => line.trimEnd()).filter((line) => line !== '' && !/^\s+at /.test(line));
  return lines.slice(-12).join('\n');
}
