import { watchDebounced } from '@vueuse/core';
import { RECIPE_DOCUMENT_SCHEMA, type RecipeDocument } from '@shared/contracts/recipe-document.ts';
import { instant } from '@shared/contracts/primitives.ts';
import { recipeView, type RecipeView } from '@shared/contracts/recipes.ts';
import { ref, shallowRef, toValue, type MaybeRefOrGetter } from 'vue';
import { z } from 'zod';

// A text half written need not be a whole recipe yet; it is still the writer's.
const keptText = z.object({
  at: instant,
  from: recipeView,
  document: z.looseObject({ schema: z.literal(RECIPE_DOCUMENT_SCHEMA), sections: z.array(z.unknown()) }),
});

/** Text that was not saved, kept by this browser. */
export interface KeptText {
  at: string;
  /** The working copy it was written over. */
  from: RecipeView;
  document: RecipeDocument;
}

interface Watched {
  /** Tells one person's text of one recipe from all others on this machine. */
  key: string;
  draft: MaybeRefOrGetter<RecipeDocument>;
  saved: MaybeRefOrGetter<RecipeView>;
  dirty: MaybeRefOrGetter<boolean>;
}

/**
 * Keeps what is not saved in this browser, so that a crash, a flat battery or an ended session loses nothing. Text found from
 * an earlier visit is offered in `found` and nothing is kept over it until it is taken up or let go.
 */
export function useKeptText({ key, draft, saved, dirty }: Watched) {
  const found = shallowRef<KeptText | null>(readKept(key));
  /** The browser has no room or refuses: then only the warning before leaving is left. */
  const refused = ref(false);

  watchDebounced(
    [() => toValue(draft), () => toValue(dirty)],
    () => {
      if (found.value) return;
      if (toValue(dirty)) keep();
      else localStorage.removeItem(key);
    },
    { deep: true, debounce: 400, maxWait: 2000 },
  );

  function keep(): void {
    const kept: KeptText = { at: new Date().toISOString(), from: toValue(saved), document: toValue(draft) };
    try {
      localStorage.setItem(key, JSON.stringify(kept));
      refused.value = false;
    } catch {
      refused.value = true;
    }
  }

  /** Ends the offer: the text is in use again, or not wanted. */
  function letGo(): void {
    found.value = null;
    localStorage.removeItem(key);
  }

  return { found, refused, letGo };
}

function readKept(key: string): KeptText | null {
  try {
    const kept = keptText.safeParse(JSON.parse(localStorage.getItem(key) ?? 'null'));
    return kept.success ? (kept.data as unknown as KeptText) : null;
  } catch {
    return null;
  }
}
