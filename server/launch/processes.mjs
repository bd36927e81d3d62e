import { fork } from 'node:child_process';
import { ROOT } from './paths.mjs';
import { say, Sentence } from './say.mjs';

/** @typedef {{ name: string, module: string, env: NodeJS.ProcessEnv, execArgv?: string[] }} Part */

/**
 * A house of processes: each is started and waited for; when one dies, everything ends.
 * @param {(sentence: string) => void} onDeath
 */
export function makeHouse(onDeath) {
  /** @type {Array<{ name: string, child: import('node:child_process').ChildProcess }>} */
  const running = [];
  let ending = false;

  /**
   * @param {Part} part
   * @returns {Promise<void>}
   */
  function start({ name, module, env, execArgv = [] }) {
    return new Promise((resolve, reject) => {
      // In a process group of its own: Ctrl-C reaches the launcher, which ends the parts in order.
      const child = fork(module, [], {
        cwd: ROOT,
        env,
        execArgv,
        detached: true,
        stdio: ['ignore', 'ignore', 'inherit', 'ipc'],
      });
      running.push({ name, child });
      child.on('message', (message) => message === 'ready' && resolve());
      child.once('error', (error) => reject(new Sentence(`The ${name} could not be started: ${error.message}`)));
      child.once('exit', (code, signal) => {
        const sentence = `The ${name} has ended (${signal ?? code}).`;
        reject(new Sentence(sentence));
        if (!ending) onDeath(sentence);
      });
    });
  }

  /** Ends the parts in reverse order, each asked first and killed after ten seconds. */
  async function stop() {
    ending = true;
    for (const { name, child } of running.reverse()) {
      if (child.exitCode !== null || child.signalCode !== null) continue;
      await new Promise((resolve) => {
        const timer = setTimeout(() => {
          say(`The ${name} did not end by itself.`);
          child.kill('SIGKILL');
        }, 10_000);
        child.once('exit', () => {
          clearTimeout(timer);
          resolve(undefined);
        });
        child.kill('SIGTERM');
      });
    }
  }

  return { start, stop };
}
