import type { OpenRecipe } from '@shared/contracts/reading.ts';
import type { RecipeLine } from '@shared/contracts/recipe-document.ts';
import { factorForBottles, factorForServings } from '@shared/engine/factors.ts';
import { scaleLine, type ScaledLine } from '@shared/engine/scaling.ts';
import { computed, ref, toValue, watch, type MaybeRefOrGetter } from 'vue';
import { useI18n } from 'vue-i18n';
import { usePreferencesStore } from '@/stores/preferences.ts';

/** Factors that minus and plus walk through. */
const RAIL = [0.25, 0.5, 0.75, 1, 1.5, 2, 3, 4, 5, 6, 8, 10, 12, 16, 20];
const MOST = 1000;

/**
 * A recipe at the batch a reader wants: every line as it is to be measured out. A view: the recipe stays as written,
 * and opening another one starts again from what is written there.
 */
export function useBatch(recipe: MaybeRefOrGetter<OpenRecipe>) {
  const { locale } = useI18n();
  const preferences = usePreferencesStore();
  const factor = ref(1);
  watch(
    () => toValue(recipe).recipeId,
    () => (factor.value = 1),
  );

  const lines = computed<Map<string, ScaledLine>>(() => {
    const wish = { factor: factor.value, system: preferences.units, locale: locale.value };
    const all = toValue(recipe).sections.flatMap((section) => section.lines);
    return new Map(all.map((line) => [line.id, scaleLine(asWritten(line), wish)]));
  });
  const servings = computed(() => {
    const { servings: written } = toValue(recipe).yield;
    return written === null ? null : written * factor.value;
  });
  const atLeast = computed(() => factor.value <= RAIL[0]!);
  const atMost = computed(() => factor.value >= RAIL.at(-1)!);

  function less(): void {
    factor.value = RAIL.findLast((step) => step < factor.value - 1e-9) ?? factor.value;
  }
  function more(): void {
    factor.value = RAIL.find((step) => step > factor.value + 1e-9) ?? factor.value;
  }
  /** Sets the factor; false where it is no number that a batch can have. */
  function setFactor(wanted: number | null): boolean {
    if (wanted === null || !(wanted > 0 && wanted <= MOST)) return false;
    factor.value = wanted;
    return true;
  }
  function setServings(wanted: number | null): boolean {
    if (wanted === null || !(wanted > 0)) return false;
    return setFactor(factorForServings(toValue(recipe), wanted));
  }
  function setBottles(wish: { count: number; bottleMl: number; headspaceMl: number }): boolean {
    if (!(wish.count > 0 && wish.headspaceMl >= 0 && wish.headspaceMl < wish.bottleMl)) return false;
    return setFactor(factorForBottles(toValue(recipe).figures.yieldMl, wish));
  }

  return { factor, lines, servings, atLeast, atMost, less, more, setFactor, setServings, setBottles };
}

/** A read line has no source in the notes; the engine asks for none. */
function asWritten(line: OpenRecipe['sections'][number]['lines'][number]): RecipeLine {
  return { ...line, source: null };
}
