import { describe, expect, it } from 'vitest';
import { en } from '../../src/locales/en/index.ts';
import { office } from '../../src/locales/en/office.ts';
import { workroomArea } from '../../src/locales/en/workroom-area.ts';

const catalogue = { ...en, office, workroom: workroomArea };
const SOURCES = import.meta.glob<string>('../../src/**/*.{vue,ts}', { query: '?raw', import: 'default', eager: true });

/** Every key that a source names in full, and the beginning of every key that is put together. */
function keysOf(text: string): { whole: string[]; begun: string[] } {
  const whole = [...text.matchAll(/\bt\(\s*'([a-zA-Z][\w.-]*\.[\w.-]+)'/g)].map(([, key]) => key!);
  const begun = [...text.matchAll(/\bt\(\s*`([a-zA-Z][\w.-]*\.)\$\{/g)].map(([, key]) => key!.slice(0, -1));
  return { whole, begun };
}

function find(key: string): unknown {
  return key.split('.').reduce<unknown>((at, name) => (at as Record<string, unknown> | undefined)?.[name], catalogue);
}

const read = Object.entries(SOURCES).map(([file, text]) => ({ file, ...keysOf(text) }));

describe('the catalogue of strings', () => {
  it('holds every sentence that a source asks for by its key', () => {
    const missing = read.flatMap(({ file, whole }) =>
      whole.filter((key) => typeof find(key) !== 'string').map((key) => `${file}: ${key}`),
    );
    expect(missing).toEqual([]);
    expect(read.flatMap(({ whole }) => whole).length).toBeGreaterThan(400);
  });

  it('holds the group of every key that a source puts together', () => {
    const missing = read.flatMap(({ file, begun }) =>
      begun.filter((key) => typeof find(key) !== 'object').map((key) => `${file}: ${key}`),
    );
    expect(missing).toEqual([]);
  });
});
