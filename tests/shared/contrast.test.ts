import { readFileSync } from 'node:fs';
import { describe, expect, it } from 'vitest';

/** The custom properties of one theme, as they stand in the style sheet. */
function readTheme(name: 'paper' | 'cellar'): Map<string, string> {
  const sheet = readFileSync(new URL('../../src/styles/tokens.scss', import.meta.url), 'utf8');
  const block = new RegExp(`\\[data-theme='${name}'\\] \\{([^}]*)\\}`).exec(sheet)?.[1];
  if (!block) throw new Error(`The style sheet has no theme "${name}".`);
  return new Map(
    [...block.matchAll(/--([\w-]+): (#[0-9a-f]{6});/g)].map(([, token = '', value = '']) => [token, value]),
  );
}

/** Relative luminance as WCAG 2.2 defines it (w3.org/TR/WCAG22/#dfn-relative-luminance). */
function luminance(hex: string): number {
  const [red = 0, green = 0, blue = 0] = [1, 3, 5].map((at) => {
    const share = parseInt(hex.slice(at, at + 2), 16) / 255;
    return share <= 0.04045 ? share / 12.92 : ((share + 0.055) / 1.055) ** 2.4;
  });
  return 0.2126 * red + 0.7152 * green + 0.0722 * blue;
}

/** Contrast ratio as WCAG 2.2 defines it (w3.org/TR/WCAG22/#dfn-contrast-ratio). */
function contrast(one: string, other: string): number {
  const [lighter = 0, darker = 0] = [luminance(one), luminance(other)].sort((a, b) => b - a);
  return (lighter + 0.05) / (darker + 0.05);
}

const SURFACES = ['ground', 'sheet', 'wash'];
const TEXT = ['ink', 'quiet', 'action', 'attention', 'caution'];
const GRAPHICS = ['edge', 'thread', 'action', 'attention', 'caution'];

describe('the contrast formula', () => {
  // The ends of the scale are stated in the definition; #767676 is the known last grey that passes 4.5 on white.
  it('gives the published values', () => {
    expect(contrast('#000000', '#ffffff')).toBeCloseTo(21, 5);
    expect(contrast('#1e1a15', '#1e1a15')).toBe(1);
    expect(contrast('#767676', '#ffffff')).toBeGreaterThanOrEqual(4.5);
    expect(contrast('#777777', '#ffffff')).toBeLessThan(4.5);
  });
});

describe.each(['paper', 'cellar'] as const)('the %s theme', (name) => {
  const theme = readTheme(name);
  const ratio = (one: string, other: string) => {
    const [a, b] = [theme.get(one), theme.get(other)];
    if (!a || !b) throw new Error(`The theme lacks ${a ? other : one}.`);
    return contrast(a, b);
  };
  const pairs = (inks: string[]) => inks.flatMap((ink) => SURFACES.map((surface) => [ink, surface] as const));

  // Success criterion 1.4.3, level AA: 4.5 to 1 for text.
  it.each([...pairs(TEXT), ['on-action', 'action'], ['on-action', 'caution'], ['on-spine', 'spine']] as const)(
    'lets %s be read on %s',
    (ink, surface) => {
      expect(ratio(ink, surface)).toBeGreaterThanOrEqual(4.5);
    },
  );

  // Success criterion 1.4.11: 3 to 1 for the edges of controls and for graphics that carry meaning.
  it.each(pairs(GRAPHICS))('lets %s be seen on %s', (mark, surface) => {
    expect(ratio(mark, surface)).toBeGreaterThanOrEqual(3);
  });
});
