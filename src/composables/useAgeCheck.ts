import { ref } from 'vue';
import { confirmAge } from '@/api/session.ts';
import { useSessionStore } from '@/stores/session.ts';
import { useSubmit } from './useSubmit.ts';

/** The age question: a yes is remembered by the server, a no closes the page and is kept nowhere. */
export function useAgeCheck(onward?: () => Promise<unknown>) {
  const session = useSessionStore();
  const tooYoung = ref(false);
  const { run, busy, error } = useSubmit(async () => {
    await confirmAge();
    await session.load();
    await onward?.();
  });
  return { tooYoung, yes: run, busy, error };
}
