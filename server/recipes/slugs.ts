import type { Knex } from 'knex';
import { findSlugsLike } from './recipes.queries.ts';

/** Letters that Unicode does not take apart into a plain letter and a mark. */
const LIGATURES: Readonly<Record<string, string>> = { æ: 'ae', œ: 'oe', ø: 'o', ß: 'ss', ł: 'l', đ: 'd', þ: 'th' };
const MOST = 100;

/** A title as a path segment: plain lower case letters, digits and single hyphens. */
export function toSlug(title: string): string {
  const words = title
    .toLowerCase()
    .normalize('NFKD')
    .replace(/\p{M}|['’]/gu, '')
    .replace(/[æœøßłđþ]/g, (letter) => LIGATURES[letter] ?? '')
    .match(/[a-z0-9]+/g);
  return words?.join('-').slice(0, MOST).replace(/-$/, '') ?? 'recipe';
}

/** The first address of a new recipe that nobody has: its title's, else with -2, -3 and so on. It stays when the title changes. */
export async function findFreeSlug(db: Knex, title: string): Promise<string> {
  const slug = toSlug(title);
  const taken = new Set(await findSlugsLike(db, slug));
  let free = slug;
  for (let number = 2; taken.has(free); number += 1) free = `${slug}-${number}`;
  return free;
}
