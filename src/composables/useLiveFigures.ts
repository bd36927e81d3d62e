import { refDebounced } from '@vueuse/core';
import type { Figures } from '@shared/contracts/figures.ts';
import type { LarderItem } from '@shared/contracts/larder.ts';
import type { RecipeDocument } from '@shared/contracts/recipe-document.ts';
import { componentIdsOf } from '@shared/engine/components.ts';
import { computeFigures } from '@shared/engine/figures.ts';
import { computed, shallowRef, toValue, watch, type MaybeRefOrGetter } from 'vue';
import { fetchRecipe } from '@/api/recipes.ts';

/**
 * The figures of a text while it is being written, by the same engine as the server's. Null until the larder and the recipes
 * it is made of are here.
 */
export function useLiveFigures(
  draft: MaybeRefOrGetter<RecipeDocument>,
  larder: MaybeRefOrGetter<readonly LarderItem[] | undefined>,
) {
  const components = shallowRef<ReadonlyMap<string, RecipeDocument | null>>(new Map());
  const byId = computed(() => new Map(toValue(larder)?.map((item) => [item.id, item])));
  const settled = refDebounced(
    computed(() => JSON.stringify(toValue(draft))),
    250,
  );

  const wanted = computed(() => {
    const known = [...components.value.values()].filter((document) => document !== null);
    const ids = new Set([toValue(draft), ...known].flatMap(componentIdsOf));
    return [...ids].filter((id) => !components.value.has(id));
  });
  watch(wanted, (ids) => void Promise.all(ids.map(load)), { immediate: true });

  /** A recipe that cannot be read is known not to be here, so that it is not asked for again and again. */
  async function load(id: string): Promise<void> {
    const document = await fetchRecipe(id).then(
      (view) => view.document,
      () => null,
    );
    components.value = new Map([...components.value, [id, document]]);
  }

  return computed<Figures | null>(() => {
    if (!toValue(larder) || wanted.value.length > 0) return null;
    const known = new Map(
      [...components.value].filter((entry): entry is [string, RecipeDocument] => entry[1] !== null),
    );
    return computeFigures(JSON.parse(settled.value) as RecipeDocument, { larder: byId.value, components: known });
  });
}
