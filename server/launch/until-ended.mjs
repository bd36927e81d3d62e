import { Sentence } from './say.mjs';

/** @typedef {{ closing: Array<() => Promise<void>>, end: (sentence?: string | undefined) => void }} Opening */

/**
 * Opens a house part by part. Ctrl-C, SIGTERM, a failure on the way and the call of `end` do the closing work once, in
 * reverse order, and exit: with 0 when it was asked for, with 1 and the sentence when something died.
 * @param {(opening: Opening) => Promise<void>} open
 */
export function untilEnded(open) {
  /** @type {Opening['closing']} */
  const closing = [];
  let ending = false;

  /** @param {string} [sentence] */
  const end = (sentence) => {
    if (ending) return;
    ending = true;
    if (sentence) process.stderr.write(`${sentence}\n`);
    closeAll().then(
      () => process.exit(sentence ? 1 : 0),
      (error) => {
        process.stderr.write(`${String(error?.message ?? error)}\n`);
        process.exit(1);
      },
    );
  };
  async function closeAll() {
    for (const close of closing.reverse()) await close();
  }

  for (const signal of ['SIGINT', 'SIGTERM', 'SIGHUP']) process.on(signal, () => end());
  open({ closing, end }).catch((error) =>
    end(error instanceof Sentence ? error.message : String(error?.stack ?? error)),
  );
}
