/** A number typed with a decimal point or comma; null where nothing is typed, undefined where it is no number. */
export function parseDecimal(typed: string): number | null | undefined {
  const text = typed.trim();
  if (text === '') return null;
  return /^-?\d+(?:[.,]\d+)?$/.test(text) ? Number(text.replace(',', '.')) : undefined;
}
