/** Where an error came from matters, unless it is a known one of the network or the database. */
function textOf(error: unknown): string {
  if (!(error instanceof Error)) return String(error);
  return 'code' in error ? error.message : (error.stack ?? error.message);
}

/** Writes to standard error, which the launcher keeps with the other logs. */
export function complain(about: string, error: unknown): void {
  const text = textOf(error);
  process.stderr.write(`payment fake: ${about}: ${text}\n`);
}
