export interface LetterPiece {
  text: string;
  /** The address it leads to; null for plain words. */
  href: string | null;
}

/**
 * The text of a letter cut at its links, in order; joined again it is the text itself.
 * Only web addresses become links, and of two that begin alike the longer one is meant.
 *
 * @example letterPieces('See: https://a.example/x', ['https://a.example/x'])
 */
export function letterPieces(text: string, links: readonly string[]): LetterPiece[] {
  const known = links.filter((link) => /^https?:\/\//i.test(link)).sort((a, b) => b.length - a.length);
  const pieces: LetterPiece[] = [];
  let from = 0;
  while (from < text.length) {
    const next = firstLink(text, known, from);
    const end = next?.at ?? text.length;
    if (end > from) pieces.push({ text: text.slice(from, end), href: null });
    if (!next) break;
    pieces.push({ text: next.link, href: next.link });
    from = end + next.link.length;
  }
  return pieces;
}

function firstLink(text: string, known: readonly string[], from: number): { link: string; at: number } | null {
  let first: { link: string; at: number } | null = null;
  for (const link of known) {
    const at = text.indexOf(link, from);
    if (at >= 0 && (first === null || at < first.at)) first = { link, at };
  }
  return first;
}
