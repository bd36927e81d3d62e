/** How one imprint writes numbers, dates and money. */
export interface HouseFormat {
  locale: string;
  /** An IANA time zone. */
  zone: string;
  /** ISO 4217, two minor digits. */
  currency: string;
}

/** No-break space: stands between a number and its unit. */
export const NBSP = '\u00a0';

const EN_DASH = '–';
const MINUTE = 60;
const HOUR = 60 * MINUTE;
const DAY = 24 * HOUR;
const WEEK = 7 * DAY;

export type DurationUnit = 'second' | 'minute' | 'hour' | 'day' | 'week';
export type DurationPart = [count: number, unit: DurationUnit];

/**
 * A duration in the words a recipe uses: seconds below a minute, hours and minutes to two days, days beyond,
 * whole weeks from two weeks on.
 *
 * @example
 * durationParts(49_200) // [[13, 'hour'], [40, 'minute']]
 * durationParts(63 * 86_400) // [[9, 'week']]
 */
export function durationParts(seconds: number): DurationPart[] {
  if (seconds < MINUTE) return [[Math.round(seconds), 'second']];
  if (seconds < 2 * DAY) {
    const minutes = Math.round(seconds / MINUTE);
    return withoutZeros([Math.floor(minutes / 60), 'hour'], [minutes % 60, 'minute']);
  }
  if (seconds >= 2 * WEEK && seconds % WEEK === 0) return [[seconds / WEEK, 'week']];
  const hours = Math.round(seconds / HOUR);
  return withoutZeros([Math.floor(hours / 24), 'day'], [hours % 24, 'hour']);
}

function withoutZeros(...parts: DurationPart[]): DurationPart[] {
  return parts.filter(([count]) => count > 0);
}

/** A number with at most `digits` decimals; trailing zeros fall away. */
export function formatNumber({ locale }: HouseFormat, value: number, digits = 1): string {
  return new Intl.NumberFormat(locale, { maximumFractionDigits: digits }).format(value);
}

/** One number, or two with an en dash where they differ as written. */
export function formatRange(house: HouseFormat, { min, max }: { min: number; max: number }, digits = 1): string {
  const low = formatNumber(house, min, digits);
  const high = formatNumber(house, max, digits);
  return low === high ? low : `${low}${EN_DASH}${high}`;
}

/** Minor units as money; a whole amount is written without its zeros. */
export function formatMoney({ locale, currency }: HouseFormat, minor: number, other = currency): string {
  const whole = minor % 100 === 0;
  return new Intl.NumberFormat(locale, {
    style: 'currency',
    currency: other,
    minimumFractionDigits: whole ? 0 : 2,
    maximumFractionDigits: 2,
  }).format(minor / 100);
}

/** An instant as a day in the imprint's zone. */
export function formatDay({ locale, zone }: HouseFormat, instant: string | Date): string {
  return new Intl.DateTimeFormat(locale, { dateStyle: 'long', timeZone: zone }).format(new Date(instant));
}

/** An instant as day and time of day in the imprint's zone. */
export function formatMoment({ locale, zone }: HouseFormat, instant: string | Date): string {
  return new Intl.DateTimeFormat(locale, { dateStyle: 'medium', timeStyle: 'short', timeZone: zone }).format(
    new Date(instant),
  );
}

/** An instant as time of day in the imprint's zone. */
export function formatTime({ locale, zone }: HouseFormat, instant: string | Date): string {
  return new Intl.DateTimeFormat(locale, { timeStyle: 'short', timeZone: zone }).format(new Date(instant));
}

/** A calendar date (`2026-11-21`), which has no zone. */
export function formatDate({ locale }: HouseFormat, date: string): string {
  return new Intl.DateTimeFormat(locale, { dateStyle: 'long', timeZone: 'UTC' }).format(new Date(`${date}T00:00:00Z`));
}

/** A place in a video: minutes and seconds, hours where there are any. */
export function formatTimeCode(ms: number): string {
  const seconds = Math.floor(ms / 1000);
  const two = (value: number) => String(value).padStart(2, '0');
  const minutes = Math.floor(seconds / 60);
  const tail = two(seconds % 60);
  return minutes < 60 ? `${minutes}:${tail}` : `${Math.floor(minutes / 60)}:${two(minutes % 60)}:${tail}`;
}
