/** One line to standard error, which the launcher keeps with the other logs. */
export function complain(about: string, error: unknown): void {
  const text = error instanceof Error ? (error.stack ?? error.message) : String(error);
  process.stderr.write(`payment fake: ${about}: ${text}\n`);
}
