import type { BookContents } from '@shared/contracts/reading.ts';

interface Neighbour {
  slug: string;
  title: string;
}

/** The recipes before and after one in the running order of its book; null at either end. */
export function neighboursOf(
  { chapters }: Pick<BookContents, 'chapters'>,
  slug: string,
): { previous: Neighbour | null; next: Neighbour | null } {
  const order = chapters.flatMap((chapter) => chapter.recipes);
  const at = order.findIndex((recipe) => recipe.slug === slug);
  if (at < 0) return { previous: null, next: null };
  return { previous: order[at - 1] ?? null, next: order[at + 1] ?? null };
}
