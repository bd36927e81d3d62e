import { onScopeDispose, ref } from 'vue';
import { finishCheckout } from '@/api/membership.ts';
import { useSubmit } from './useSubmit.ts';

const PAUSE_MS = 1500;
const TRIES = 12;

/**
 * Asks what became of the payment page until the membership opens. `slow` after about a quarter of a minute without
 * word of the payment service; `open` where the page was left unpaid.
 */
export function useCheckoutReturn(sessionId: string, arrived: (returnTo: string) => Promise<unknown>) {
  const state = ref<'waiting' | 'slow' | 'open'>('waiting');
  let left = false;
  onScopeDispose(() => (left = true));

  const { run, error } = useSubmit(async () => {
    state.value = 'waiting';
    for (let attempt = 0; attempt < TRIES && !left; attempt += 1) {
      if (attempt > 0) await new Promise((resolve) => setTimeout(resolve, PAUSE_MS));
      const { outcome, returnTo } = await finishCheckout(sessionId);
      if (left) return;
      if (outcome === 'paid') return void (await arrived(returnTo));
      if (outcome === 'open') return void (state.value = 'open');
    }
    state.value = 'slow';
  });
  return { state, look: run, error };
}
