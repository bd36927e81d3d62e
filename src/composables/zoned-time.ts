const DAY_MS = 86_400_000;

/**
 * An instant as the clock on the wall of a zone shows it: `2026-03-29T18:30`, as a field for date and time holds it.
 *
 * @param zone an IANA time zone
 */
export function toWallClock(instant: Date, zone: string): string {
  const parts = new Intl.DateTimeFormat('en-GB', {
    timeZone: zone,
    year: 'numeric',
    month: '2-digit',
    day: '2-digit',
    hour: '2-digit',
    minute: '2-digit',
    hourCycle: 'h23',
  }).formatToParts(instant);
  const part = (type: Intl.DateTimeFormatPartTypes) => parts.find((each) => each.type === type)?.value ?? '';
  return `${part('year').padStart(4, '0')}-${part('month')}-${part('day')}T${part('hour')}:${part('minute')}`;
}

/**
 * The instant at which the clock on the wall of a zone shows this. A time that occurs twice, when clocks go back, is
 * the first of the two; one that is left out, when they go forward, is read as if they had not yet.
 *
 * @param wall day and time, `2026-03-29T18:30`
 * @returns null for what is no day and time
 */
export function fromWallClock(wall: string, zone: string): Date | null {
  const asUtc = /^\d{4}-\d{2}-\d{2}T\d{2}:\d{2}$/.test(wall) ? Date.parse(`${wall}Z`) : NaN;
  if (Number.isNaN(asUtc)) return null;
  // No zone changes its offset twice within two days, so one of these two holds.
  const offsets = [-DAY_MS, DAY_MS].map((away) => offsetAt(new Date(asUtc + away), zone));
  const matching = offsets.map((offset) => asUtc - offset).filter((ms) => toWallClock(new Date(ms), zone) === wall);
  return new Date(matching.length > 0 ? Math.min(...matching) : asUtc - offsets[0]!);
}

/** How far a zone's clocks are ahead of UTC, in milliseconds. */
function offsetAt(instant: Date, zone: string): number {
  const minutes = Math.floor(instant.getTime() / 60_000) * 60_000;
  return Date.parse(`${toWallClock(instant, zone)}Z`) - minutes;
}
