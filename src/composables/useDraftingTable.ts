import { useQuery } from '@pinia/colada';
import type { DraftIngredient } from '@shared/contracts/notes.ts';
import type { RecipeDocument } from '@shared/contracts/recipe-document.ts';
import type { ShootView } from '@shared/contracts/shoots.ts';
import type { RecipeKind } from '@shared/contracts/words.ts';
import { computed, ref, toValue, watch, type MaybeRefOrGetter } from 'vue';
import { fetchReadingOf } from '@/api/shoots.ts';
import { without } from '@/components/shoots/without.ts';

interface Table {
  id: () => string;
  shoot: MaybeRefOrGetter<ShootView | undefined>;
  /** The number of the chosen cue. */
  chosen: MaybeRefOrGetter<number | null>;
}

/** What the reader made of a shoot's notes, how it hangs together with the cues, and what of it is to become a recipe. */
export function useDraftingTable({ id, shoot, chosen }: Table) {
  const {
    data: reading,
    error,
    refetch,
  } = useQuery({
    key: () => ['draft', id(), toValue(shoot)?.version ?? 0],
    query: () => fetchReadingOf(id()),
    enabled: () => Boolean(toValue(shoot)?.notes),
  });

  const title = ref('');
  const kind = ref<RecipeKind>('drink');
  /** Ids of the lines and steps that do not go in. */
  const leftOut = ref<ReadonlySet<string>>(new Set());
  // Only another draft begins anew: the same one fetched once more leaves what was chosen and typed.
  watch(
    () => JSON.stringify(reading.value?.document ?? null),
    () => {
      if (!reading.value) return;
      title.value = reading.value.document.title;
      kind.value = reading.value.document.kind;
      leftOut.value = new Set();
    },
    { immediate: true },
  );

  const lines = computed(() => reading.value?.document.sections.flatMap((section) => section.lines) ?? []);
  const steps = computed(() => reading.value?.document.steps ?? []);
  const isEmpty = computed(() => reading.value !== undefined && lines.value.length + steps.value.length === 0);

  /** The cues a line rests on: where it was named, and where its amount was said. */
  function cuesOf({ cue, amountAt }: DraftIngredient): number[] {
    const said = toValue(shoot)?.notes?.cues.find(({ startMs }) => startMs !== null && startMs === amountAt);
    return said ? [cue, said.index] : [cue];
  }
  const used = computed(() => {
    const { ingredients = [], steps: made = [], yields = [], storage = [] } = reading.value?.draft ?? {};
    return new Set([...ingredients.flatMap(cuesOf), ...[...made, ...yields, ...storage].map(({ cue }) => cue)]);
  });
  /** Ids of the lines and steps that came of the chosen cue, lines first. */
  const linked = computed<string[]>(() => {
    const cue = toValue(chosen);
    const draft = reading.value?.draft;
    if (cue === null || !draft) return [];
    const said = (index: number) => draft.ingredients[index] && cuesOf(draft.ingredients[index]).includes(cue);
    return [
      ...lines.value.filter((_line, index) => said(index)),
      ...steps.value.filter((_step, index) => draft.steps[index]?.cue === cue),
    ].map((part) => part.id);
  });

  /** The recipe that the draft becomes as it is chosen now. */
  function chosenDocument(document: RecipeDocument): RecipeDocument {
    return { ...without(document, leftOut.value), title: title.value.trim() || document.title, kind: kind.value };
  }

  return { reading, error, refetch, title, kind, leftOut, isEmpty, used, linked, chosenDocument };
}
