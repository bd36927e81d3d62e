import type { LarderItem } from '@shared/contracts/larder.ts';
import type { PlateView } from '@shared/contracts/plates.ts';
import type { RecipeDocument } from '@shared/contracts/recipe-document.ts';
import type { RecipeRow } from '@shared/contracts/recipes.ts';
import {
  computed,
  inject,
  onScopeDispose,
  provide,
  reactive,
  toValue,
  watchEffect,
  type MaybeRefOrGetter,
  type Ref,
} from 'vue';

/** What lies within reach while a recipe is written. */
export interface EditorDesk {
  draft: Ref<RecipeDocument>;
  larder: Ref<readonly LarderItem[]>;
  /** The other recipes of the house, which may go into this one. */
  recipes: Ref<readonly RecipeRow[]>;
  plates: Ref<readonly PlateView[]>;
  shoot: Ref<{ id: string; title: string } | null>;
  /** Entries that cannot be read as typed, by the id of their control: they hold back saving. */
  unreadable: Map<string, { label: string; message: string }>;
  /** What the server found wrong, by the id of the control. */
  refused: Ref<Readonly<Record<string, string>>>;
}

const KEY = Symbol('editor desk');

export function provideDesk(desk: Omit<EditorDesk, 'unreadable'>): EditorDesk {
  const whole = { ...desk, unreadable: reactive(new Map<string, { label: string; message: string }>()) };
  provide(KEY, whole);
  return whole;
}

export function useDesk(): EditorDesk {
  return inject<EditorDesk>(KEY)!;
}

/** What the server said of the control with this id. */
export function useRefusal(id: MaybeRefOrGetter<string>) {
  const { refused } = useDesk();
  return computed(() => refused.value[toValue(id)]);
}

/** Holds saving back for as long as an entry cannot be read. */
export function useUnreadable(id: string, fault: MaybeRefOrGetter<{ label: string; message: string } | null>): void {
  const { unreadable } = useDesk();
  watchEffect(() => {
    const said = toValue(fault);
    if (said) unreadable.set(id, said);
    else unreadable.delete(id);
  });
  onScopeDispose(() => unreadable.delete(id));
}
