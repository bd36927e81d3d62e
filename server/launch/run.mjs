import { spawn } from 'node:child_process';
import { ROOT } from './paths.mjs';
import { Sentence } from './say.mjs';

/**
 * Runs a command to its end and returns what it printed.
 * @param {string} command
 * @param {string[]} args
 * @param {{ env?: NodeJS.ProcessEnv, cwd?: string, show?: boolean, allowFailure?: boolean, detached?: boolean }} [options]
 *   `show` lets its output through to stderr.
 * @returns {Promise<{ code: number, stdout: string, stderr: string }>}
 */
export function run(
  command,
  args,
  { env = process.env, cwd = ROOT, show = false, allowFailure = false, detached = false } = {},
) {
  return new Promise((resolve, reject) => {
    const child = spawn(command, args, { cwd, env, detached, stdio: ['ignore', 'pipe', 'pipe'] });
    let stdout = '';
    let stderr = '';
    child.stdout.on('data', (chunk) => {
      stdout += chunk;
      if (show) process.stderr.write(chunk);
    });
    child.stderr.on('data', (chunk) => {
      stderr += chunk;
      if (show) process.stderr.write(chunk);
    });
    child.once('error', (error) => reject(new Sentence(`${command} could not be run: ${error.message}`)));
    child.once('exit', (exitCode, signal) => {
      // A daemon that was started may hold the pipes open; its starter's end is what counts.
      const code = exitCode ?? 1;
      if (code !== 0 && !allowFailure)
        reject(
          new Sentence(
            `${command} ${args.join(' ')} ended with ${signal ?? code}.\n${(stderr || stdout).slice(-4000)}`,
          ),
        );
      else resolve({ code, stdout, stderr });
    });
  });
}
