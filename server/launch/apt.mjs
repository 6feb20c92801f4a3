import { Problem } from './problem.mjs';
import { runTool } from './run-tool.mjs';

const options = ['-o', 'DPkg::Lock::Timeout=300', '-y', '--no-install-recommends'];

/** Installs a Debian package: tries with the lists at hand first and refreshes them only if that fails.
 *  @param {string} name @param {string} otherwise what the person can do instead, as the end of a sentence */
export async function aptInstall(name, otherwise) {
  if (process.getuid?.() !== 0) {
    throw new Problem(
      `${name} is missing and only root may install it: run "sudo apt-get install --no-install-recommends ${name}" once, or ${otherwise}.`,
    );
  }
  const env = { ...process.env, DEBIAN_FRONTEND: 'noninteractive' };
  const install = () => runTool('apt-get', ['install', ...options, name], { env, cwd: '/' });
  try {
    if ((await install()).code === 0) return;
    await runTool('apt-get', ['update'], { env, cwd: '/' });
    const again = await install();
    if (again.code === 0) return;
    const tail = again.output.trim().split('\n').slice(-4).join(' ');
    throw new Problem(`${name} could not be installed by apt-get (${tail}); install it by hand, or ${otherwise}.`);
  } catch (cause) {
    if (cause instanceof Problem) throw cause;
    throw new Problem(`${name} is missing and there is no apt-get on this machine: install it by hand, or ${otherwise}.`, { cause });
  }
}
