import { computed, ref, type Ref } from 'vue';

/**
 * What is being written over something that is saved. It keeps the version it was begun from, so that what others
 * save meanwhile is never overwritten unseen.
 *
 * @example const { draft, dirty, version, begin } = useDraft(() => ({ fields: { title: chapter.title }, version: chapter.version }));
 */
export function useDraft<T extends object>(saved: () => { fields: T; version: number }) {
  const draft = ref(copy(saved().fields)) as Ref<T>;
  const begunFrom = ref(copy(saved().fields)) as Ref<T>;
  const version = ref(saved().version);

  const dirty = computed(() => !isSame(draft.value, begunFrom.value));
  /** The fields in which the saved state is no longer the one this was begun from. */
  const changedByOthers = computed(() => {
    const { fields } = saved();
    return (Object.keys(fields) as (keyof T & string)[]).filter((key) => !isSame(fields[key], begunFrom.value[key]));
  });

  /** Begins anew from what is saved now, or takes what others saved. */
  function begin(): void {
    draft.value = copy(saved().fields);
    keepOver();
  }

  /** Keeps what is written and lays it over what is saved now; fields that nobody here has touched are what others saved. */
  function keepOver(): void {
    const { fields } = saved();
    for (const key of Object.keys(fields) as (keyof T)[])
      if (isSame(draft.value[key], begunFrom.value[key])) draft.value[key] = copy(fields)[key];
    begunFrom.value = copy(fields);
    version.value = saved().version;
  }

  return { draft, dirty, version, changedByOthers, begin, keepOver };
}

function copy<T>(value: T): T {
  return JSON.parse(JSON.stringify(value)) as T;
}

function isSame(one: unknown, other: unknown): boolean {
  return JSON.stringify(one) === JSON.stringify(other);
}
