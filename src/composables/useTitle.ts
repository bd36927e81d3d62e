import { computed, onScopeDispose, shallowRef, toValue, watchEffect, type MaybeRefOrGetter } from 'vue';
import { useSessionStore } from '@/stores/session.ts';

const ofRoute = shallowRef('');
const ofPage = shallowRef('');

/** The title of the page that is open, without the imprint's name. */
export const pageTitle = computed(() => ofPage.value || ofRoute.value);

/** Sets the title from the route, which holds until the page knows a better one. */
export function setRouteTitle(title: string): void {
  ofRoute.value = title;
}

/**
 * Names the page after what it shows. An empty title leaves the route's own in place.
 *
 * @example useTitle(() => recipe.value?.title)
 */
export function useTitle(title: MaybeRefOrGetter<string | null | undefined>): void {
  let mine = '';
  watchEffect(() => {
    mine = toValue(title) ?? '';
    ofPage.value = mine;
  });
  onScopeDispose(() => {
    // The next page may have named itself before this one is gone.
    if (ofPage.value === mine) ofPage.value = '';
  });
}

/** Writes the title into the tab. Called once, by the root component. */
export function useDocumentTitle(): void {
  const session = useSessionStore();
  watchEffect(() => {
    document.title = [pageTitle.value, session.imprint?.name ?? 'Steep & Bind'].filter(Boolean).join(' · ');
  });
}
