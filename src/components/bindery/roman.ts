const SIGNS = [
  [1000, 'm'],
  [900, 'cm'],
  [500, 'd'],
  [400, 'cd'],
  [100, 'c'],
  [90, 'xc'],
  [50, 'l'],
  [40, 'xl'],
  [10, 'x'],
  [9, 'ix'],
  [5, 'v'],
  [4, 'iv'],
  [1, 'i'],
] as const;

/** A whole number from 1 to 3999 in small Roman numerals. */
export function toRoman(value: number): string {
  let rest = value;
  let text = '';
  for (const [worth, sign] of SIGNS) for (; rest >= worth; rest -= worth) text += sign;
  return text;
}
