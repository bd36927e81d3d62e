import { describe, expect, it } from 'vitest';
import { dilute, iceDilution, regressedDilution } from '../../../shared/engine/dilution.ts';
import { ethanolKept, retained, waterKept } from '../../../shared/engine/heating.ts';
import { NOTHING, strengthOf, volumeOf, type Matter } from '../../../shared/engine/matter.ts';
import { densityFromStrength, massFractionFromStrength } from '../../../shared/engine/oiml.ts';

// Regressions of D. Arnold, Liquid Intelligence (2014), p. 123: strength in % vol, ml of water per ml of drink before ice.
const SHAKEN = [
  [10, 0.3615],
  [15, 0.429],
  [20, 0.4887],
  [35, 0.6207],
  [45, 0.6696],
] as const;
const STIRRED = [
  [15, 0.3047],
  [20, 0.3458],
  [25, 0.3809],
  [29, 0.4046],
  [35, 0.4329],
] as const;

const drink = (ml: number, strength: number): Matter => {
  const grams = ml * densityFromStrength(strength);
  const share = massFractionFromStrength(strength);
  return { ...NOTHING, ethanol: grams * share, water: grams * (1 - share) };
};

describe('water from ice', () => {
  it.each(SHAKEN)('shaking a drink of %d %% vol takes up %d of its volume', (strength, share) => {
    expect(regressedDilution('shake', strength)).toBeCloseTo(share, 3);
  });

  it.each(STIRRED)('stirring a drink of %d %% vol takes up %d of its volume', (strength, share) => {
    expect(regressedDilution('stir', strength)).toBeCloseTo(share, 3);
  });

  // The same source with volumes added: 90 ml at 30 % stirred is 21.28 % vol, 90 ml at 25 % shaken 16.23 % vol.
  it.each([
    ['stir', 30, 21.28],
    ['shake', 25, 16.23],
    ['shake', 20, 13.43],
  ] as const)('%s at %d %% vol brackets %d %% vol', (method, strength, final) => {
    const before = drink(90, strength);
    expect(strengthOf(dilute(before, method, 'max'))).toBeLessThan(final);
    expect(strengthOf(dilute(before, method, 'min'))).toBeGreaterThan(final);
  });

  it('stays at the value for 45 % vol above it, where the regressions turn down', () => {
    expect(regressedDilution('stir', 60)).toBe(regressedDilution('stir', 45));
    expect(regressedDilution('shake', 60)).toBe(regressedDilution('shake', 45));
  });

  it('is a share of the volume before ice and not of the glass', () => {
    const before = drink(90, 30);
    const added = volumeOf(dilute(before, 'stir', 'max')) - volumeOf(before);
    expect(added / 90).toBeCloseTo(iceDilution('stir', 30).max, 1);
    expect(iceDilution('stir', 30).min).toBeLessThan(iceDilution('stir', 30).max);
  });
});

describe('heat', () => {
  // USDA Table of Nutrient Retention Factors, release 6 (2007), nutrient 221: minutes, share of the ethanol left.
  it.each([
    [0, 0.85],
    [15, 0.4],
    [30, 0.35],
    [60, 0.25],
    [90, 0.2],
    [120, 0.1],
    [150, 0.05],
  ])('keeps the published share after %d minutes', (minutes, share) => {
    expect(retained(minutes)).toBeCloseTo(share, 12);
    const kept = ethanolKept({ liveliness: 'simmer', covered: false, minutes: { min: minutes, max: minutes } });
    expect(kept!.min).toBeLessThan(share);
    expect(kept!.max).toBeGreaterThan(share);
  });

  it('lies between the measured times and never goes past the last one', () => {
    expect(retained(22.5)).toBeCloseTo(0.375, 12);
    expect(ethanolKept({ liveliness: 'simmer', covered: false, minutes: { min: 100, max: 151 } })).toBeNull();
  });

  it('may keep all ethanol under a lid', () => {
    expect(ethanolKept({ liveliness: 'simmer', covered: true, minutes: { min: 15, max: 15 } })!.max).toBe(1);
  });

  it('loses more water boiling than simmering, and less under a lid', () => {
    const minutes = { min: 10, max: 20 };
    const boiled = waterKept({ liveliness: 'boil', covered: false, minutes });
    const simmered = waterKept({ liveliness: 'simmer', covered: false, minutes });
    const covered = waterKept({ liveliness: 'simmer', covered: true, minutes });
    expect(boiled.min).toBeLessThan(simmered.min);
    expect(covered.min).toBeGreaterThan(simmered.min);
    expect(simmered.min).toBeLessThan(simmered.max);
  });
});
