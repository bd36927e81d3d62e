import { computed, onScopeDispose, shallowRef, toValue, watchEffect, type MaybeRefOrGetter } from 'vue';
import type { RouteLocationRaw } from 'vue-router';

export interface HeadLink {
  label: string;
  to: RouteLocationRaw;
}

export interface RunningHead {
  /** Stands beside the mark: the book's title. */
  title: string;
  to: RouteLocationRaw;
  links: HeadLink[];
}

const head = shallowRef<RunningHead | null>(null);

/** What the page wants in the running head; null leaves the imprint's name there. */
export const runningHead = computed(() => head.value);

/** Puts a book's title and its links into the running head for as long as the page is open. */
export function useRunningHead(wanted: MaybeRefOrGetter<RunningHead | null>): void {
  let mine: RunningHead | null = null;
  watchEffect(() => {
    mine = toValue(wanted);
    head.value = mine;
  });
  onScopeDispose(() => {
    if (head.value === mine) head.value = null;
  });
}
