import type { RecipeLine } from '@shared/contracts/recipe-document.ts';
import { computed } from 'vue';
import { useI18n } from 'vue-i18n';
import type { RouteLocationRaw } from 'vue-router';
import { useDesk } from './editor-desk.ts';

type Tie = Pick<RecipeLine, 'larderId' | 'componentId'>;

interface Behind {
  kind: 'larder' | 'recipe' | 'nothing';
  words: string;
  to?: RouteLocationRaw;
}

/** What stands behind a line: an entry of the larder, another recipe, or nothing, and then its figures are not known. */
export function useBehind() {
  const { t } = useI18n();
  const { larder, recipes } = useDesk();

  const larderNames = computed(() => new Map(larder.value.map((item) => [item.id, item.name])));
  const recipeTitles = computed(() => new Map(recipes.value.map((recipe) => [recipe.id, recipe.title])));
  /** By name in small letters; the house's own recipes win over the larder. */
  const ties = computed(() => {
    const byName = new Map<string, Tie>();
    for (const { id, name, otherNames } of larder.value)
      for (const known of [...otherNames, name]) byName.set(plain(known), { larderId: id, componentId: null });
    for (const { id, title } of recipes.value) byName.set(plain(title), { larderId: null, componentId: id });
    return byName;
  });

  function behindOf({ larderId, componentId }: Tie): Behind {
    if (componentId) {
      const title = recipeTitles.value.get(componentId) ?? t('workroom.editor.behind.gone');
      return {
        kind: 'recipe',
        words: t('workroom.editor.behind.recipe', { title }),
        to: { name: 'recipe', params: { id: componentId } },
      };
    }
    if (larderId) {
      const name = larderNames.value.get(larderId) ?? larderId;
      return { kind: 'larder', words: t('workroom.editor.behind.larder', { name }) };
    }
    return { kind: 'nothing', words: t('workroom.editor.behind.nothing') };
  }

  /** What bears this name; nothing where the house does not know it. */
  function match(name: string): Tie {
    return ties.value.get(plain(name)) ?? { larderId: null, componentId: null };
  }

  /** The name that {@link match} finds the same thing by. */
  function nameOf({ larderId, componentId }: Tie): string {
    if (componentId) return recipeTitles.value.get(componentId) ?? '';
    return larderId ? (larderNames.value.get(larderId) ?? '') : '';
  }

  return { behindOf, match, nameOf };
}

function plain(name: string): string {
  return name.trim().toLowerCase();
}
