import type { EditionRow } from '@shared/contracts/editions.ts';
import { useQuery } from '@pinia/colada';
import { useIntervalFn } from '@vueuse/core';
import { computed, watch } from 'vue';
import { useI18n } from 'vue-i18n';
import { fetchEditions, issueEdition, pressEdition, releaseLeaf } from '@/api/editions.ts';
import { announce } from './useAnnounce.ts';
import { useSubmit } from './useSubmit.ts';

/** How often a pressing is asked how far it is. */
const EVERY_MS = 1000;

/** The editions and leaves of a book, followed while one is pressed. `onIssue` is told when something went out. */
export function useEditions(bookId: () => string, onIssue: () => void) {
  const { t } = useI18n();
  const { data, error, refetch } = useQuery({
    key: () => ['editions', bookId()],
    query: () => fetchEditions(bookId()),
  });

  const editions = computed(() => data.value?.filter((row) => row.kind === 'edition'));
  const leaves = computed(() => data.value?.filter((row) => row.kind === 'leaf') ?? []);
  const pressing = computed(() => editions.value?.find((row) => row.state === 'pressing'));

  const { pause, resume } = useIntervalFn(() => refetch(), EVERY_MS, { immediate: false });
  watch(
    pressing,
    (now, before) => {
      if (now) resume();
      else pause();
      const ended = before && !now ? editions.value?.find((row) => row.id === before.id) : undefined;
      if (ended) announceEnd(ended);
    },
    { immediate: true },
  );

  function announceEnd({ state, number }: EditionRow): void {
    if (state === 'failed') announce(t('workroom.bindery.press.failed', { n: number }), 'attention');
    else announce(t('workroom.bindery.press.done', { n: number }));
  }

  return {
    editions,
    leaves,
    pressing,
    error,
    refetch,
    press: useSubmit(async () => {
      const { number } = await pressEdition(bookId());
      await refetch();
      announce(t('workroom.bindery.press.started', { n: number }));
    }),
    issue: useSubmit(async (edition: EditionRow, opens: readonly { rank: number; at: string }[]) => {
      await issueEdition(edition.id, opens);
      await refetch();
      onIssue();
      announce(t('workroom.bindery.issue.done', { n: edition.number }));
    }),
    release: useSubmit(async (recipeId: string) => {
      await releaseLeaf(recipeId, bookId());
      await refetch();
      onIssue();
    }),
  };
}
