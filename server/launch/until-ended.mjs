/**
 * Waits for Ctrl-C, SIGTERM or the call of `end`, then does the closing work once and exits.
 * @param {() => Promise<void>} close
 * @returns {(sentence?: string) => void} ends everything, with 1 and the sentence when something died
 */
export function untilEnded(close) {
  let ending = false;
  const end = (/** @type {string | undefined} */ sentence) => {
    if (ending) return;
    ending = true;
    if (sentence) process.stderr.write(`${sentence}\n`);
    close().then(
      () => process.exit(sentence ? 1 : 0),
      (error) => {
        process.stderr.write(`${String(error?.message ?? error)}\n`);
        process.exit(1);
      },
    );
  };
  process.on('SIGINT', () => end());
  process.on('SIGTERM', () => end());
  process.on('SIGHUP', () => end());
  return end;
}
