import type { RecipeDocument } from '@shared/contracts/recipe-document.ts';
import type { RecipeView } from '@shared/contracts/recipes.ts';
import { computed, ref, shallowRef, type Ref } from 'vue';
import { hasCode } from '@/api/problem.ts';
import { fetchRecipe, saveRecipe } from '@/api/recipes.ts';
import { mergeDocuments, type Merged } from '@/components/editor/merge-documents.ts';

/** Somebody saved first: what they saved, and both texts laid together. */
export interface Conflict extends Merged {
  theirs: RecipeView;
}

/**
 * The text of a recipe while it is being written, over the working copy it was begun from.
 *
 * @param first the working copy as it was read
 * @param onSaved is told whenever the server answered with a working copy
 */
export function useRecipeDraft(first: RecipeView, onSaved: () => void) {
  const saved = shallowRef(first);
  const draft = ref(copy(first.document)) as Ref<RecipeDocument>;
  const dirty = computed(() => !isSame(draft.value, saved.value.document));

  const saving = ref(false);
  const error = shallowRef<unknown>(null);
  const conflict = shallowRef<Conflict | null>(null);

  /** Saves what is written; true when the working copy now says the same. A refusal stands in `error` or `conflict`. */
  async function save(): Promise<boolean> {
    if (saving.value) return false;
    saving.value = true;
    error.value = null;
    const sent = copy(draft.value);
    try {
      accept(await saveRecipe(saved.value, sent), sent);
      conflict.value = null;
      return true;
    } catch (refusal) {
      error.value = hasCode(refusal, 'request.version_conflict') ? await meet(refusal) : refusal;
      return false;
    } finally {
      saving.value = false;
    }
  }

  /** What is written while the answer is on its way stays; otherwise the text is the one the server keeps. */
  function accept(view: RecipeView, sent: RecipeDocument = draft.value): void {
    const writtenOn = !isSame(draft.value, sent);
    saved.value = view;
    if (!writtenOn) draft.value = copy(view.document);
    onSaved();
  }

  /** Begins anew from a working copy, whatever was written. */
  function restart(view: RecipeView): void {
    draft.value = copy(view.document);
    accept(view);
  }

  /**
   * Looks again at what the server says beside the text: its state, what may be done next. A text that others changed
   * meanwhile is left for saving to find.
   */
  async function refresh(): Promise<void> {
    const view = await fetchRecipe(first.id).catch(() => null);
    if (view && isSame(view.document, saved.value.document)) accept(view);
  }

  /** Reads what the other saved and lays both together; what hinders that is the error that is shown. */
  async function meet(refusal: unknown): Promise<unknown> {
    try {
      const theirs = await fetchRecipe(first.id);
      conflict.value = { theirs, ...mergeDocuments(saved.value.document, draft.value, theirs.document) };
      return null;
    } catch {
      return refusal;
    }
  }

  /** Goes on from what the other saved, with this text over it. */
  function resolve(document: RecipeDocument): void {
    if (!conflict.value) return;
    saved.value = conflict.value.theirs;
    onSaved();
    draft.value = copy(document);
    conflict.value = null;
  }

  /** Takes up text that was kept from an earlier working copy; when others saved since, saving finds the conflict. */
  function takeUp(document: RecipeDocument, from: RecipeView): void {
    saved.value = from;
    draft.value = copy(document);
  }

  return { saved, draft, dirty, saving, error, conflict, save, accept, restart, refresh, resolve, takeUp };
}

function copy<T>(value: T): T {
  return JSON.parse(JSON.stringify(value)) as T;
}

function isSame(one: unknown, other: unknown): boolean {
  return JSON.stringify(one) === JSON.stringify(other);
}
