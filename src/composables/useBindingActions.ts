import type { Access } from '@shared/contracts/access.ts';
import type { ChapterView, PlacedRecipe } from '@shared/contracts/books.ts';
import { nextTick } from 'vue';
import { useI18n } from 'vue-i18n';
import { announce } from './useAnnounce.ts';
import type { useBinding } from './useBinding.ts';
import { useConfirm } from './useConfirm.ts';
import type { useEditions } from './useEditions.ts';

/** What a person does to a book at work: asked first where something goes, and said when it is done. */
export function useBindingActions(binding: ReturnType<typeof useBinding>, editions: ReturnType<typeof useEditions>) {
  const { t } = useI18n();
  const confirm = useConfirm();
  const say = (key: string, values: Record<string, unknown>) => announce(t(`workroom.bindery.${key}`, values));

  async function moveRecipe(recipeId: string, by: -1 | 1): Promise<void> {
    const chapter = binding.order.moveRecipe(recipeId, by);
    if (!chapter) return;
    const recipe = chapterOf(chapter.id)?.recipes.find((row) => row.recipeId === recipeId);
    say('order.moved', { title: recipe?.title, n: binding.order.places.value.get(recipeId), chapter: chapter.title });
    await refocus(recipeId, by);
  }

  async function moveChapter(chapterId: string, by: -1 | 1): Promise<void> {
    binding.order.moveChapter(chapterId, by);
    const n = binding.order.chapters.value.findIndex((chapter) => chapter.id === chapterId) + 1;
    say('order.chapterMoved', { title: chapterOf(chapterId)?.title, n });
    await refocus(chapterId, by);
  }

  async function removeChapter({ id, title, recipes }: ChapterView): Promise<boolean> {
    const sure = await confirm({
      title: t('workroom.bindery.chapter.removeTitle', { title }),
      text: t(`workroom.bindery.chapter.${recipes.length ? 'removeText' : 'removeEmptyText'}`, { n: recipes.length }),
      yes: t('workroom.bindery.chapter.remove'),
      no: t('workroom.bindery.chapter.keep'),
      danger: true,
    });
    if (!sure || !(await binding.removingChapter.run(id))) return false;
    say('chapter.removed', { title });
    return true;
  }

  async function saveAccess({ recipeId, title }: PlacedRecipe, access: Access | null): Promise<void> {
    if (await binding.savingAccess.run(recipeId, access)) say('placed.saved', { title });
  }

  async function release({ recipeId, title }: PlacedRecipe): Promise<boolean> {
    const sure = await confirm({
      title: t('workroom.bindery.placed.leafAsk', { title }),
      text: t('workroom.bindery.placed.leafAskText'),
      yes: t('workroom.bindery.placed.leafYes'),
      no: t('workroom.bindery.placed.leafNo'),
    });
    if (!sure || !(await editions.release.run(recipeId))) return false;
    say('placed.leafDone', { title });
    return true;
  }

  async function takeOut({ recipeId, title }: PlacedRecipe): Promise<boolean> {
    const sure = await confirm({
      title: t('workroom.bindery.placed.outAsk', { title }),
      text: t('workroom.bindery.placed.outText'),
      yes: t('workroom.bindery.placed.out'),
      no: t('workroom.bindery.placed.outNo'),
      danger: true,
    });
    if (!sure || !(await binding.takingOut.run(recipeId))) return false;
    say('placed.outDone', { title });
    return true;
  }

  function chapterOf(id: string): ChapterView | undefined {
    return binding.order.chapters.value.find((chapter) => chapter.id === id);
  }

  return { moveRecipe, moveChapter, removeChapter, saveAccess, release, takeOut };
}

/** A row that moves is drawn anew; the arrow that moved it keeps the focus, or the other one where it can go no further. */
async function refocus(id: string, by: -1 | 1): Promise<void> {
  await nextTick();
  const arrows = (by < 0 ? ['up', 'down'] : ['down', 'up']).map((way) => document.getElementById(`${way}-${id}`));
  arrows.find((arrow) => arrow instanceof HTMLButtonElement && !arrow.disabled)?.focus();
}
