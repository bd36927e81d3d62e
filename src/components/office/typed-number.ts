export type TypedFault =
  { kind: 'missing' | 'whole' } | { kind: 'tooLittle'; min: number } | { kind: 'tooMuch'; max: number };

/** A whole number as it was typed, between bounds that are both included, or what is wrong with it. */
export function readWhole(typed: string, { min, max }: { min: number; max: number }): number | TypedFault {
  const text = typed.trim();
  if (text === '') return { kind: 'missing' };
  if (!/^-?\d{1,9}$/.test(text)) return { kind: 'whole' };
  const value = Number(text);
  if (value < min) return { kind: 'tooLittle', min };
  if (value > max) return { kind: 'tooMuch', max };
  return value;
}
