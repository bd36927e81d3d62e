import { defineComponent, h } from 'vue';
import { describe, expect, it } from 'vitest';
import { parseDecimal } from '@/components/parse-decimal.ts';
import {
  durationParts,
  formatDate,
  formatDay,
  formatMoment,
  formatMoney,
  formatRange,
  formatTimeCode,
} from '@/composables/format.ts';
import { useFormat } from '@/composables/useFormat.ts';
import { globalParts, mount } from './mount-part.ts';

const house = { locale: 'en-GB', zone: 'Europe/London', currency: 'GBP' };
const MINUTE = 60;
const HOUR = 3600;
const DAY = 86_400;

function formatter(): ReturnType<typeof useFormat> {
  let format: ReturnType<typeof useFormat> | undefined;
  const probe = defineComponent({
    setup() {
      format = useFormat();
      return () => h('div');
    },
  });
  mount(probe, { global: globalParts() });
  if (!format) throw new Error('The probe did not mount.');
  return format;
}

/** No-break spaces as plain ones, for reading. */
const plain = (text: string) => text.replaceAll('\u00a0', ' ');

describe('durations', () => {
  it.each([
    { seconds: 20, said: '20 s' },
    { seconds: 32 * MINUTE, said: '32 min' },
    { seconds: 2 * HOUR, said: '2 h' },
    { seconds: 13 * HOUR + 40 * MINUTE, said: '13 h 40 min' },
    { seconds: 2 * DAY, said: '2 days' },
    { seconds: 3 * DAY + 6 * HOUR, said: '3 days 6 h' },
    { seconds: 7 * DAY, said: '7 days' },
    { seconds: 63 * DAY, said: '9 weeks' },
    { seconds: 64 * DAY, said: '64 days' },
  ])('says $said', ({ seconds, said }) => {
    expect(plain(formatter().duration(seconds))).toBe(said);
  });

  it('keeps a number and its unit on one line', () => {
    expect(formatter().duration(32 * MINUTE)).toBe('32\u00a0min');
  });

  it('carries minutes that round to an hour', () => {
    expect(durationParts(HOUR - 10)).toEqual([[1, 'hour']]);
  });

  it.each([
    { min: 8 * MINUTE, max: 10 * MINUTE, said: '8–10 min' },
    { min: 10 * DAY, max: 12 * DAY, said: '10–12 days' },
    { min: 50 * MINUTE, max: 70 * MINUTE, said: '50 min – 1 h 10 min' },
    { min: HOUR, max: HOUR, said: '1 h' },
  ])('says a range as $said', ({ min, max, said }) => {
    expect(plain(formatter().durationRange({ min, max }))).toBe(said);
  });
});

describe('money, dates and numbers', () => {
  it.each([
    { minor: 700, said: '£7' },
    { minor: 795, said: '£7.95' },
    { minor: 1_234_500, said: '£12,345' },
  ])('writes $minor pence as $said', ({ minor, said }) => {
    expect(formatMoney(house, minor)).toBe(said);
  });

  // British summer time began on 29 March 2026 at 01:00 UTC (directive 2000/84/EC's last Sunday in March, kept in UK law).
  it('tells an instant in the zone of the imprint, summer time included', () => {
    expect(formatDay(house, '2026-06-30T23:30:00Z')).toBe('1 July 2026');
    expect(formatMoment(house, '2026-03-29T00:59:00Z')).toContain('00:59');
    expect(formatMoment(house, '2026-03-29T01:00:00Z')).toContain('02:00');
  });

  it('leaves a calendar date alone whatever the zone', () => {
    expect(formatDate({ ...house, zone: 'Pacific/Auckland' }, '2026-11-21')).toBe('21 November 2026');
  });

  it('writes a range with an en dash, and equal ends once', () => {
    expect(formatRange(house, { min: 11, max: 14 })).toBe('11–14');
    expect(formatRange(house, { min: 11.02, max: 11.04 })).toBe('11');
  });

  it.each([
    { ms: 134_000, said: '2:14' },
    { ms: 9_900, said: '0:09' },
    { ms: 3_725_000, said: '1:02:05' },
  ])('writes a time code as $said', ({ ms, said }) => {
    expect(formatTimeCode(ms)).toBe(said);
  });

  it.each([
    { typed: '12.5', value: 12.5 },
    { typed: '12,5', value: 12.5 },
    { typed: ' 7 ', value: 7 },
    { typed: '', value: null },
    { typed: 'a dozen', value: undefined },
    { typed: '1.2.3', value: undefined },
  ])('reads "$typed"', ({ typed, value }) => {
    expect(parseDecimal(typed)).toBe(value);
  });
});
