import { computed, toValue, type ComputedRef, type MaybeRefOrGetter } from 'vue';
import { ApiProblem } from '@/api/problem.ts';

/**
 * The server's faults by the path of the field they belong to (`email`, `steps.2.text`), first one wins.
 *
 * @example const fault = useFaults(error); // <AppField :error="fault.email" />
 */
export function useFaults(error: MaybeRefOrGetter<unknown>): ComputedRef<Record<string, string | undefined>> {
  return computed(() => {
    const problem = toValue(error);
    if (!(problem instanceof ApiProblem)) return {};
    return Object.fromEntries([...problem.faults].reverse().map(({ path, message }) => [path, message]));
  });
}
