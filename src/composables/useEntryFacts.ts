import type { BookContents } from '@shared/contracts/reading.ts';
import { computed, toValue, type MaybeRefOrGetter } from 'vue';
import { useI18n } from 'vue-i18n';
import { useRecipeFacts } from './useRecipeFacts.ts';

type Entry = BookContents['chapters'][number]['recipes'][number];

/** What a line of contents says of a recipe: yield, strength, time, and the allergens, which are never kept back. */
export function useEntryFacts(entry: MaybeRefOrGetter<Entry>) {
  const { t } = useI18n();
  const facts = useRecipeFacts(() => ({
    ...toValue(entry),
    view: 'teaser' as const,
    chapterTitle: '',
    headnoteHtml: '',
    book: { slug: '', title: '' },
    closed: { why: 'account' as const },
  }));
  const meta = computed(() => facts.value.slice(0, 3).map((fact) => fact.value));
  const contains = computed(() => {
    const names = toValue(entry).allergens.map(({ allergen }) => t(`words.allergen.${allergen}`).toLocaleLowerCase());
    return names.length > 0 ? t('reading.book.contains', { names: names.join(', ') }) : '';
  });
  return { meta, contains };
}
