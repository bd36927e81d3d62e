/** A refusal that is told as its sentence, without a stack. */
export class Sentence extends Error {}

/**
 * Says on stderr what takes a while; stdout is left to the one line that others read.
 * @param {string} text
 */
export function say(text) {
  process.stderr.write(`${text}\n`);
}

/**
 * Runs a launcher's main function; what it throws is told and ends the process with 1.
 * @param {() => Promise<void>} main
 */
export function runMain(main) {
  main().catch((error) => {
    say(error instanceof Sentence ? error.message : String(error?.stack ?? error));
    process.exit(1);
  });
}
