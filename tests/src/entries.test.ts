import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { words } from '../../src/locales/en/words.ts';
import {
  readDays,
  readDuration,
  readMeasure,
  readTemperature,
  writeDays,
  writeDuration,
  writeMeasure,
  writeTemperature,
} from '../../src/components/editor/entries.ts';
import { UNITS, type Unit } from '../../shared/contracts/words.ts';

const nameOf = (unit: Unit) => words.unit[unit].split(' | ');
const measure = (typed: string) => readMeasure(typed, nameOf);

describe('an amount typed in one go', () => {
  it.each([
    ['450 g', 450, 450, 'g'],
    ['450g', 450, 450, 'g'],
    ['0,5 l', 0.5, 0.5, 'l'],
    ['1–2 dashes', 1, 2, 'dash'],
    ['1-2', 1, 2, null],
    ['1 to 2 strips', 1, 2, 'strip'],
    ['1½ fl oz', 1.5, 1.5, 'floz'],
    ['1 1/2 cups', 1.5, 1.5, 'cup'],
    ['¾ fl. oz', 0.75, 0.75, 'floz'],
    ['2 imp fl oz', 2, 2, 'imp-floz'],
    ['1 imp pint', 1, 1, 'imp-pint'],
    ['6 leaves', 6, 6, 'leaf'],
    ['750 millilitres', 750, 750, 'ml'],
    ['2 drinks', 2, 2, 'drink'],
  ])('%s', (typed, min, max, unit) => {
    expect(measure(typed)).toEqual({ value: { amount: { min, max }, unit } });
  });

  it('says which unit it does not know, and what is no amount', () => {
    expect(measure('2 glugs')).toEqual({ fault: 'unit', about: 'glugs' });
    expect(measure('some')).toEqual({ fault: 'amount', about: 'some' });
    expect(measure('3–2 ml')).toEqual({ fault: 'order', about: '3–2 ml' });
    expect(measure('  ')).toEqual({ value: { amount: null, unit: null } });
  });

  it('reads what it writes, in every unit', () => {
    const quarters = fc.integer({ min: 1, max: 4000 }).map((n) => n / 4);
    fc.assert(
      fc.property(fc.constantFrom(...UNITS), quarters, quarters, (unit, one, other) => {
        const value = { amount: { min: Math.min(one, other), max: Math.max(one, other) }, unit };
        expect(measure(writeMeasure(value, nameOf))).toEqual({ value });
      }),
    );
  });
});

describe('a time, a temperature, days', () => {
  it.each([
    ['10–12 min', 600, 720],
    ['1 h 30 min', 5400, 5400],
    ['40 s', 40, 40],
    ['3 weeks', 1_814_400, 1_814_400],
    ['1½ hours', 5400, 5400],
  ])('%s', (typed, min, max) => {
    expect(readDuration(typed)).toEqual({ value: { min, max } });
  });

  it('wants a unit of time', () => {
    expect(readDuration('90')).toEqual({ fault: 'duration', about: '90' });
    expect(readDuration('10 min sharp')).toEqual({ fault: 'duration', about: '10 min sharp' });
  });

  it('reads the times, temperatures and days it writes', () => {
    const seconds = fc.integer({ min: 0, max: 10_000_000 });
    const ordered = (low: number, high: number) => ({ min: Math.min(low, high), max: Math.max(low, high) });
    fc.assert(
      fc.property(seconds, seconds, (one, other) => {
        for (const range of [ordered(one, other), ordered(one, one)])
          expect(readDuration(writeDuration(range))).toEqual({ value: range });
      }),
    );
    const degrees = fc.integer({ min: -200, max: 300 });
    fc.assert(
      fc.property(degrees, degrees, (one, other) => {
        const range = ordered(one, other);
        expect(readTemperature(writeTemperature(range))).toEqual({ value: range });
      }),
    );
    expect(readDays(writeDays({ min: 10, max: 14 }))).toEqual({ value: { min: 10, max: 14 } });
    expect(readDays('3 weeks')).toEqual({ value: { min: 21, max: 21 } });
  });

  it('turns Fahrenheit into Celsius (NIST SP 811, B.8: t/°C = (t/°F − 32)/1.8)', () => {
    expect(readTemperature('212 °F')).toEqual({ value: { min: 100, max: 100 } });
    expect(readTemperature('-18')).toEqual({ value: { min: -18, max: -18 } });
    expect(readTemperature('78–82 C')).toEqual({ value: { min: 78, max: 82 } });
    expect(readTemperature('hot')).toEqual({ fault: 'temperature', about: 'hot' });
    expect(readTemperature('5000')).toEqual({ fault: 'temperatureBounds', about: '5000' });
  });
});
