import type { Knex } from 'knex';
import { SNAPSHOT_SCHEMA, type BoundPlate, type BoundRecipe, type Snapshot } from '../../shared/contracts/editions.ts';
import type { LarderItem } from '../../shared/contracts/larder.ts';
import type { RecipeDocument } from '../../shared/contracts/recipe-document.ts';
import { computeFigures } from '../../shared/engine/figures.ts';
import { findChapters, findPlacements, type PlacedRow } from '../books/books.queries.ts';
import type { BookRow, ChapterRow } from '../books/books.rows.ts';
import { renderMarkdown } from '../content/markdown.ts';
import { resolveAccess } from '../gate/gate.ts';
import { readImprint } from '../imprint/imprint.queries.ts';
import { findLarder } from '../larder/larder.queries.ts';
import { findPlates } from '../plates/plates.queries.ts';
import type { PlateRow } from '../plates/plates.rows.ts';
import { loadComponentClosure } from '../recipes/component-closure.ts';
import { findCurrentDocuments } from '../recipes/recipes.queries.ts';

interface SnapshotOrder {
  book: BookRow;
  kind: Snapshot['kind'];
  number: number;
  /** Only this recipe, for a leaf. */
  onlyRecipe?: string;
}

/**
 * Takes the working copies of a book as they stand in this transaction: revisions, chapter texts, plates, figures,
 * and the access that holds for each recipe. The same content always gives the same snapshot.
 */
export async function takeSnapshot(db: Knex, { book, kind, number, onlyRecipe }: SnapshotOrder): Promise<Snapshot> {
  const imprint = await readImprint(db);
  const chapters = await findChapters(db, book.id);
  const placed = (await findPlacements(db, book.id)).filter((row) => !onlyRecipe || row.recipe_id === onlyRecipe);
  const documents = await findCurrentDocuments(
    db,
    placed.map((row) => row.recipe_id),
  );
  const bench = await readBench(
    db,
    [...documents.values()].map(({ document }) => document),
  );
  const bind = binderOf(book, placed, documents, bench);
  const bound = chapters
    .map((chapter) => bindChapter(chapter, book, placed, bind))
    .filter(({ recipes }) => recipes.length);
  return {
    schema: SNAPSHOT_SCHEMA,
    kind,
    imprint: { name: imprint.name, ageLimit: imprint.age_limit },
    book: {
      id: book.id,
      slug: book.slug,
      title: book.title,
      subtitle: book.subtitle,
      coverPlateId: book.cover_plate_id,
    },
    number,
    chapters: bound,
    plates: await bindPlates(db, [
      book.cover_plate_id,
      ...[...documents.values()].flatMap(({ document }) => platesOf(document)),
    ]),
  };
}

/** Plates that a recipe shows, its lead plate first. */
export function platesOf(document: RecipeDocument): string[] {
  return [document.leadPlateId, ...document.steps.map((step) => step.plateId)].filter(
    (id): id is string => id !== null,
  );
}

interface Bench {
  larder: ReadonlyMap<string, LarderItem>;
  components: ReadonlyMap<string, RecipeDocument>;
}

async function readBench(db: Knex, documents: readonly RecipeDocument[]): Promise<Bench> {
  const larder = new Map((await findLarder(db)).map((item) => [item.id, item]));
  return { larder, components: await loadComponentClosure(db, documents) };
}

type Bind = (row: PlacedRow, chapter: ChapterRow) => BoundRecipe;

function binderOf(
  book: BookRow,
  placed: readonly PlacedRow[],
  documents: Awaited<ReturnType<typeof findCurrentDocuments>>,
  bench: Bench,
): Bind {
  const addresses = new Map(placed.map((row) => [row.recipe_id, { slug: row.slug, title: row.title }]));
  return (row, chapter) => {
    const { recipe, document } = documents.get(row.recipe_id)!;
    const used = document.sections.flatMap((section) => section.lines.flatMap((line) => line.componentId ?? []));
    return {
      recipeId: row.recipe_id,
      slug: row.slug,
      revision: recipe.revision,
      access: resolveAccess(row.access, chapter.access, book.access),
      document,
      figures: computeFigures(document, bench),
      html: renderTexts(document),
      components: Object.fromEntries(used.flatMap((id) => (addresses.has(id) ? [[id, addresses.get(id)!]] : []))),
    };
  };
}

function renderTexts({ headnote, tips, variations, steps }: RecipeDocument): BoundRecipe['html'] {
  return {
    headnote: renderMarkdown(headnote),
    tips: renderMarkdown(tips),
    variations: renderMarkdown(variations),
    steps: steps.map((step) => renderMarkdown(step.text)),
  };
}

function bindChapter(chapter: ChapterRow, book: BookRow, placed: readonly PlacedRow[], bind: Bind) {
  return {
    id: chapter.id,
    title: chapter.title,
    introductionHtml: renderMarkdown(chapter.introduction),
    access: resolveAccess(null, chapter.access, book.access),
    recipes: placed.filter((row) => row.chapter_id === chapter.id).map((row) => bind(row, chapter)),
  };
}

async function bindPlates(db: Knex, ids: readonly (string | null)[]): Promise<BoundPlate[]> {
  const wanted = [...new Set(ids.filter((id): id is string => id !== null))].sort();
  const rows = new Map((await findPlates(db, wanted)).map((row) => [row.id, row]));
  return wanted.flatMap((id) => (rows.has(id) ? [toBoundPlate(rows.get(id)!)] : []));
}

function toBoundPlate({ id, alt, caption, credit, width, height, renditions }: PlateRow): BoundPlate {
  return { id, alt, caption, credit, width, height, renditions };
}
