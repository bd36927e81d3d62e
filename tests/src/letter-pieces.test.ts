import { describe, expect, it } from 'vitest';
import { letterPieces } from '@/components/front/letter-pieces.ts';

const joined = (text: string, links: string[]) =>
  letterPieces(text, links)
    .map((piece) => piece.text)
    .join('');

describe('the text of a letter cut at its links', () => {
  const text = 'Confirm:\nhttps://h.example/verify?token=ab\n\nOr read https://h.example/verify first.';

  it('finds each link in the order of the text, whatever the order they are told in', () => {
    const links = ['https://h.example/verify', 'https://h.example/verify?token=ab'];
    expect(letterPieces(text, links)).toEqual([
      { text: 'Confirm:\n', href: null },
      { text: 'https://h.example/verify?token=ab', href: 'https://h.example/verify?token=ab' },
      { text: '\n\nOr read ', href: null },
      { text: 'https://h.example/verify', href: 'https://h.example/verify' },
      { text: ' first.', href: null },
    ]);
    expect(joined(text, links)).toBe(text);
  });

  it('finds the same link twice', () => {
    const links = ['http://a.example'];
    expect(letterPieces('http://a.example http://a.example', links).filter(({ href }) => href)).toHaveLength(2);
  });

  it('leaves words alone that lead nowhere on the web', () => {
    const script = 'javascript:alert(1)';
    expect(letterPieces(`See ${script}`, [script])).toEqual([{ text: `See ${script}`, href: null }]);
    expect(letterPieces('', [])).toEqual([]);
  });
});
