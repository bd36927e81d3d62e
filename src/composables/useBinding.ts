import type { Access } from '@shared/contracts/access.ts';
import type { BookDraft, BookView, ChapterDraft } from '@shared/contracts/books.ts';
import { useQuery, useQueryCache } from '@pinia/colada';
import {
  addChapter,
  fetchBook,
  placeRecipe,
  removeChapter,
  saveBook,
  saveChapter,
  saveOrder,
  setRecipeAccess,
  takeRecipeOut,
} from '@/api/books.ts';
import { hasCode } from '@/api/problem.ts';
import { useRunningOrder } from './useRunningOrder.ts';
import { useSubmit } from './useSubmit.ts';

/**
 * A book at work: what the house holds of it, its running order as it is being moved, and everything that changes it.
 * Where somebody else saved first, the book is fetched again, so that theirs can be shown beside what was written.
 */
export function useBinding(id: () => string) {
  const cache = useQueryCache();
  const key = () => ['book', id()];
  const { data: book, error, refetch } = useQuery({ key, query: () => fetchBook(id()) });

  function keep(fresh: BookView): BookView {
    cache.setQueryData(key(), fresh);
    void cache.invalidateQueries({ key: ['books'] });
    return fresh;
  }

  /** Runs a change; on a conflict the book as it is now comes along with the refusal. */
  async function changing(change: () => Promise<BookView | null>): Promise<void> {
    try {
      const fresh = await change();
      if (fresh) keep(fresh);
      else await refetch();
    } catch (caught) {
      if (hasCode(caught, 'request.version_conflict')) await refetch();
      throw caught;
    }
  }

  const order = useRunningOrder({
    book: () => book.value,
    save: async (wanted, version) => keep(await saveOrder(id(), wanted, version)),
    reload: () => refetch(),
  });

  return {
    book,
    error,
    refetch,
    order,
    savingBook: useSubmit((draft: BookDraft, version: number) => changing(() => saveBook(id(), draft, version))),
    savingChapter: useSubmit((chapterId: string | null, draft: ChapterDraft, version: number) =>
      changing(async () => {
        if (chapterId === null) return addChapter(id(), draft);
        await saveChapter(chapterId, draft, version);
        return null;
      }),
    ),
    removingChapter: useSubmit((chapterId: string) => changing(() => removeChapter(chapterId))),
    placing: useSubmit((chapterId: string, recipeId: string) => changing(() => placeRecipe(chapterId, recipeId))),
    savingAccess: useSubmit((recipeId: string, access: Access | null) =>
      changing(() => setRecipeAccess(id(), recipeId, access)),
    ),
    takingOut: useSubmit((recipeId: string) => changing(() => takeRecipeOut(id(), recipeId))),
  };
}
