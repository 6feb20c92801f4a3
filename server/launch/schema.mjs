import { runCommand } from './run-command.mjs';

await runCommand('schema');
