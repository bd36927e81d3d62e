import type { Knex } from 'knex';
import { expect } from 'vitest';
import { insertBook, insertChapter, insertPlacement } from '../../server/books/books.queries.ts';
import type { AppContext } from '../../server/context.ts';
import { issueEdition, startPressing } from '../../server/editions/editions.service.ts';
import { pressEdition } from '../../server/editions/press.job.ts';
import { makeRenditions } from '../../server/plates/renditions.ts';
import type { PlateRow } from '../../server/plates/plates.rows.ts';
import type { Access } from '../../shared/contracts/access.ts';
import sharp from 'sharp';
import { makePlate, makeRecipe, type RecipeWish } from './factories.ts';
import { makePerson } from './people.ts';

/** A plate with real sizes, of one plain colour. */
export async function makePicture({ db, files }: AppContext, wish: Partial<PlateRow> = {}): Promise<PlateRow> {
  const bytes = await sharp({ create: { width: 640, height: 480, channels: 3, background: '#1d4d3f' } })
    .jpeg()
    .toBuffer();
  const renditions = await makeRenditions(bytes, files);
  return makePlate(db, {
    original_hash: await files.keep(bytes),
    width: 640,
    height: 480,
    renditions: JSON.stringify(renditions) as never,
    ...wish,
  });
}

export interface BookWish {
  slug?: string;
  title?: string;
  access?: Access;
  introduction?: string;
  coverPlateId?: string;
  recipes: (RecipeWish & { access?: Access | null })[];
}

/** A book of one chapter with these recipes, cleared and placed. */
export async function makeBook(db: Knex, wish: BookWish) {
  const {
    slug = `book-${Math.random().toString(36).slice(2, 8)}`,
    title = 'A Book',
    access = { kind: 'tier', rank: 1 },
  } = wish;
  const book = await insertBook(db, {
    ...{ slug, title, access, subtitle: 'For tests' },
    cover_plate_id: wish.coverPlateId ?? null,
  });
  const chapter = await insertChapter(db, {
    book_id: book.id,
    position: 1,
    title: 'The only chapter',
    introduction: wish.introduction ?? '',
    access: null,
  });
  const recipes = [];
  for (const [index, { access: own = null, ...recipeWish }] of wish.recipes.entries()) {
    const recipe = await makeRecipe(db, { state: 'cleared', ...recipeWish });
    await insertPlacement(db, {
      book_id: book.id,
      chapter_id: chapter.id,
      recipe_id: recipe.id,
      position: index + 1,
      access: own,
    });
    recipes.push(recipe);
  }
  return { book, chapter, recipes };
}

/** The same, pressed and issued. */
export async function makeIssuedBook(ctx: AppContext, wish: BookWish) {
  const made = await makeBook(ctx.db, wish);
  const presser = await makePerson(ctx.db, { roles: ['editor'] });
  const { id } = await startPressing(ctx, made.book.id, presser.id);
  await pressEdition(ctx, { editionId: id }, { last: true });
  const edition = await issueEdition(ctx, { id, personId: presser.id, opens: [] });
  expect(edition.state).toBe('issued');
  return { ...made, edition };
}
