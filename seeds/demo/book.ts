import type { AppContext } from '../../server/context.ts';
import { insertBook, insertChapter, insertPlacement } from '../../server/books/books.queries.ts';
import { issueEdition, startPressing } from '../../server/editions/editions.service.ts';
import { pressEdition } from '../../server/editions/press.job.ts';
import type { DemoContent } from '../content/content.ts';
import type { DemoPeople } from './house.ts';

/** The book with its first edition, pressed by the editor and issued by the creator; what was cleared since is placed last. */
export async function seedBook(
  ctx: Pick<AppContext, 'db' | 'files' | 'now' | 'log'>,
  { book, chapters, recipes }: DemoContent,
  people: DemoPeople,
): Promise<void> {
  const { db } = ctx;
  const { title, subtitle, slug, access, coverPlateId } = book;
  const { id: bookId } = await insertBook(db, { title, subtitle, slug, access, cover_plate_id: coverPlateId });
  const chapterIds = new Map<string, string>();
  for (const { slug: chapter, position, ...written } of chapters) {
    const row = await insertChapter(db, { ...written, book_id: bookId, position: position + 1 });
    chapterIds.set(chapter, row.id);
  }
  const place = async (recipe: DemoContent['recipes'][number]) =>
    insertPlacement(db, {
      book_id: bookId,
      chapter_id: chapterIds.get(recipe.chapter!)!,
      recipe_id: recipe.id,
      position: recipe.position! + 1,
      access: recipe.access,
    });

  const placed = recipes.filter((recipe) => recipe.chapter !== null);
  for (const recipe of placed.filter(({ state }) => state === 'out')) await place(recipe);
  const { id } = await startPressing(ctx, bookId, people.editor);
  await pressEdition(ctx, { editionId: id }, { last: true });
  await issueEdition(ctx, { id, personId: people.creator, opens: [] });
  for (const recipe of placed.filter(({ state }) => state !== 'out')) await place(recipe);
}
