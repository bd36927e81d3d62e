import type { BookView, ChapterView, RunningOrder } from '@shared/contracts/books.ts';
import { computed, ref, shallowRef, watch } from 'vue';
import type { SaveState } from '@/components/AppSaveState.vue';

interface Options {
  book: () => BookView | undefined;
  /** Saves the order under the book's version; resolves to the book as it is then. */
  save: (order: RunningOrder, version: number) => Promise<BookView>;
  /** Fetches the book as it is after a refusal. */
  reload: () => Promise<unknown>;
}

/**
 * The running order as it is being moved: shown at once, saved one save at a time, and laid back to what the house
 * holds where that is refused.
 */
export function useRunningOrder({ book, save, reload }: Options) {
  const chapters = shallowRef<ChapterView[]>([]);
  const state = ref<SaveState>('saved');
  const error = shallowRef<unknown>(null);
  let saving = false;

  watch(book, lay, { immediate: true });

  function lay(): void {
    // While moves are on their way the page shows what was asked for; words and states may be fresher.
    if (!saving) chapters.value = book()?.chapters ?? [];
  }

  const places = computed(() => {
    const ids = chapters.value.flatMap((chapter) => chapter.recipes.map((recipe) => recipe.recipeId));
    return new Map(ids.map((id, index) => [id, index + 1]));
  });

  /** Lays one chapter's recipes as they were dropped. */
  function setRecipes(chapterId: string, recipes: ChapterView['recipes']): void {
    chapters.value = chapters.value.map((chapter) => (chapter.id === chapterId ? { ...chapter, recipes } : chapter));
  }

  /** One place up or down; past the end of a chapter into the neighbouring one. Null where it stands at the edge. */
  function moveRecipe(recipeId: string, by: -1 | 1): ChapterView | null {
    const from = chapters.value.findIndex((chapter) => chapter.recipes.some((row) => row.recipeId === recipeId));
    const chapter = chapters.value[from];
    const at = chapter?.recipes.findIndex((row) => row.recipeId === recipeId) ?? -1;
    const row = chapter?.recipes[at];
    if (!chapter || !row) return null;

    const within = at + by >= 0 && at + by < chapter.recipes.length;
    const target = within ? chapter : chapters.value[from + by];
    if (!target) return null;
    const rest = chapter.recipes.filter((each) => each !== row);
    setRecipes(chapter.id, rest);
    const others = within ? rest : target.recipes;
    const place = within ? at + by : by < 0 ? others.length : 0;
    setRecipes(target.id, others.toSpliced(place, 0, row));
    void commit();
    return target;
  }

  function moveChapter(chapterId: string, by: -1 | 1): void {
    const at = chapters.value.findIndex((chapter) => chapter.id === chapterId);
    const chapter = chapters.value[at];
    if (!chapter || !chapters.value[at + by]) return;
    chapters.value = chapters.value.toSpliced(at, 1).toSpliced(at + by, 0, chapter);
    void commit();
  }

  /** Saves what is shown, again for as long as it has been moved meanwhile. */
  async function commit(): Promise<void> {
    if (saving) return;
    error.value = null;
    try {
      for (let held = book(); held && !isSame(chapters.value, held.chapters);) {
        saving = true;
        state.value = 'saving';
        held = await save(toOrder(chapters.value), held.version);
      }
      state.value = 'saved';
    } catch (caught) {
      error.value = caught;
      state.value = 'failed';
      await reload().catch(() => undefined);
    } finally {
      saving = false;
      lay();
    }
  }

  return { chapters, places, state, error, setRecipes, moveRecipe, moveChapter, commit };
}

function toOrder(chapters: readonly ChapterView[]): RunningOrder {
  return { chapters: chapters.map(({ id, recipes }) => ({ id, recipes: recipes.map((row) => row.recipeId) })) };
}

function isSame(one: readonly ChapterView[], other: readonly ChapterView[]): boolean {
  return JSON.stringify(toOrder(one)) === JSON.stringify(toOrder(other));
}
