import { computed } from 'vue';
import { useI18n } from 'vue-i18n';
import { useSessionStore } from '@/stores/session.ts';
import {
  durationParts,
  formatDate,
  formatDay,
  formatMoment,
  formatMoney,
  formatNumber,
  formatRange,
  formatTime,
  formatTimeCode,
  NBSP,
  type HouseFormat,
} from './format.ts';

/** Numbers, dates, money and durations as this imprint writes them. */
export function useFormat() {
  const { t, locale } = useI18n();
  const session = useSessionStore();
  const house = computed<HouseFormat>(() => ({
    locale: locale.value,
    zone: session.imprint?.zone ?? 'UTC',
    currency: session.imprint?.currency ?? 'GBP',
  }));

  /** Seconds in words: "13 h 40 min", "9 weeks". */
  function duration(seconds: number): string {
    return durationParts(seconds)
      .map(([count, unit]) => t(`common.duration.${unit}`, { n: number(count) }, count).replaceAll(' ', NBSP))
      .join(' ');
  }

  /** A range of seconds; "8–10 min" where both ends are told in the same single unit. */
  function durationRange({ min, max }: { min: number; max: number }): string {
    if (min === max) return duration(min);
    const [low, lowRest] = durationParts(min);
    const [high, highRest] = durationParts(max);
    if (!low || !high || lowRest || highRest || low[1] !== high[1]) return `${duration(min)} – ${duration(max)}`;
    const both = formatRange(house.value, { min: low[0], max: high[0] }, 0);
    return t(`common.duration.${high[1]}`, { n: both }, high[0]).replaceAll(' ', NBSP);
  }

  function number(value: number, digits?: number): string {
    return formatNumber(house.value, value, digits);
  }

  return {
    number,
    duration,
    durationRange,
    range: (value: { min: number; max: number }, digits?: number) => formatRange(house.value, value, digits),
    money: (minor: number, currency?: string) => formatMoney(house.value, minor, currency),
    day: (instant: string | Date) => formatDay(house.value, instant),
    moment: (instant: string | Date) => formatMoment(house.value, instant),
    time: (instant: string | Date) => formatTime(house.value, instant),
    date: (date: string) => formatDate(house.value, date),
    timeCode: formatTimeCode,
  };
}
