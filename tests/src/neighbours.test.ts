import { describe, expect, it } from 'vitest';
import type { BookContents } from '../../shared/contracts/reading.ts';
import { neighboursOf } from '../../src/components/reading/neighbours.ts';

const entry = (slug: string) => ({ slug, title: slug.toUpperCase() });
const book = {
  chapters: [{ recipes: ['a', 'b'].map(entry) }, { recipes: [] }, { recipes: [entry('c')] }],
} as unknown as BookContents;

describe('the neighbours of a recipe', () => {
  it('stand before and after it in the running order, over the end of a chapter', () => {
    expect(neighboursOf(book, 'b')).toMatchObject({ previous: { slug: 'a' }, next: { slug: 'c' } });
  });

  it('are missing at the ends of the book, and where the book does not hold the recipe', () => {
    expect(neighboursOf(book, 'a')).toMatchObject({ previous: null, next: { slug: 'b' } });
    expect(neighboursOf(book, 'c').next).toBeNull();
    expect(neighboursOf(book, 'z')).toEqual({ previous: null, next: null });
  });
});
