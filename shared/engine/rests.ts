/**
 * What a figure may rest on, written into `rests` as the code alone or as `code:value`; the catalogue of messages words it.
 * `dash` to `bottle` carry the millilitres taken, `part` the millilitres of a part, `ice-strongest` % vol.
 */
export const REST_CODES = [
  'dash',
  'drop',
  'barspoon',
  'pinch',
  'splash',
  'bottle',
  'water-lost-by-time',
  'ethanol-lost-by-time',
  'warming-taken-as-minutes',
  'measured-yield',
  'reduced-to',
  'fruit-gives-up-juice',
  'botanicals-soak-up',
  'shaken-over-ice',
  'stirred-over-ice',
  'thrown-over-ice',
  'blended-with-ice',
  'ice-strongest',
  'before-ice',
  'dissolved-solids',
  'optional-lines',
] as const;
export type RestCode = (typeof REST_CODES)[number];

/** Writes one. */
export function rest(code: RestCode, value?: number): string {
  return value === undefined ? code : `${code}:${value}`;
}

/** Reads one back; null where it is not one of the codes. */
export function parseRest(text: string): { code: RestCode; value: number | null } | null {
  const [code, value] = text.split(':');
  const found = REST_CODES.find((each) => each === code);
  return found ? { code: found, value: value === undefined ? null : Number(value) } : null;
}
