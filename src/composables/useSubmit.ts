import { ref, shallowRef, type Ref, type ShallowRef } from 'vue';

interface Submit<A extends unknown[]> {
  run: (...input: A) => Promise<boolean>;
  busy: Ref<boolean>;
  error: ShallowRef<unknown>;
}

/**
 * One action of a form: busy while it runs, its error kept for the notice, never run twice at once.
 * `run` resolves to whether it succeeded.
 */
export function useSubmit<A extends unknown[]>(action: (...input: A) => Promise<void>): Submit<A> {
  const busy = ref(false);
  const error = shallowRef<unknown>(null);

  async function run(...input: A): Promise<boolean> {
    if (busy.value) return false;
    busy.value = true;
    error.value = null;
    try {
      await action(...input);
      return true;
    } catch (caught) {
      error.value = caught;
      return false;
    } finally {
      busy.value = false;
    }
  }

  return { run, busy, error };
}
