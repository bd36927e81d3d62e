export interface Interval {
  unit: 'day' | 'week' | 'month' | 'year';
  count: number;
}

const DAY = 86_400;

function monthIndex(date: Date): number {
  return date.getUTCFullYear() * 12 + date.getUTCMonth();
}

/** Adds months in UTC; a day the month does not have becomes its last: 31 January + 1 is 28 February. */
export function addMonths(seconds: number, months: number): number {
  const date = new Date(seconds * 1000);
  const index = monthIndex(date) + months;
  const [year, month] = [Math.floor(index / 12), index % 12];
  const lastDay = new Date(Date.UTC(year, month + 1, 0)).getUTCDate();
  const day = Math.min(date.getUTCDate(), lastDay);
  return Date.UTC(year, month, day, date.getUTCHours(), date.getUTCMinutes(), date.getUTCSeconds()) / 1000;
}

/**
 * The end of the period that starts at `start`, in seconds. Months and years are counted from the
 * anchor, so that an anchor on the 31st comes back to the 31st after a shorter month.
 */
export function periodEnd(anchor: number, start: number, { unit, count }: Interval): number {
  if (unit === 'day' || unit === 'week') return start + count * DAY * (unit === 'week' ? 7 : 1);
  const passed = monthIndex(new Date(start * 1000)) - monthIndex(new Date(anchor * 1000));
  return addMonths(anchor, passed + count * (unit === 'year' ? 12 : 1));
}
