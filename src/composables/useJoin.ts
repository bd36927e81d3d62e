import type { PaymentInterval } from '@shared/contracts/membership.ts';
import { useEventListener } from '@vueuse/core';
import { computed, ref } from 'vue';
import { useRoute, useRouter, type RouteLocationRaw } from 'vue-router';
import { startCheckout } from '@/api/membership.ts';
import { resendVerification } from '@/api/people.ts';
import type { Standing } from '@/components/front/JoinStanding.vue';
import { returnPathOf } from '@/router/guards.ts';
import { useSessionStore } from '@/stores/session.ts';
import { useSubmit } from './useSubmit.ts';

/** Joining a tier: the choice stands in the address, so that it survives signing in and confirming the e-mail. */
export function useJoin() {
  const route = useRoute();
  const router = useRouter();
  const session = useSessionStore();

  const interval = computed<PaymentInterval>({
    get: () => (route.query.interval === 'year' ? 'year' : 'month'),
    set: (value) => void router.replace({ query: { ...route.query, interval: value } }),
  });
  const standing = computed<Standing | null>(() => {
    if (!session.view) return null;
    if (!session.user) return 'visitor';
    if (session.tier) return 'member';
    if (session.isStaff) return 'staff';
    return session.user.verified ? 'ready' : 'unverified';
  });

  const joining = ref('');
  const join = useSubmit(async (tierId: string) => {
    joining.value = tierId;
    const href = await startCheckout({ tierId, interval: interval.value, returnTo: returnPathOf(route) });
    window.location.assign(href);
  });

  const said = ref<'resent' | 'notYet' | null>(null);
  const resend = useSubmit(async () => {
    await resendVerification();
    said.value = 'resent';
  });
  const check = useSubmit(async () => {
    await session.load();
    said.value = 'notYet';
  });
  // The letter is read in another tab; coming back is as good as pressing the button.
  useEventListener(document, 'visibilitychange', () => {
    if (!document.hidden && standing.value === 'unverified') void session.load().catch(() => undefined);
  });

  /** Signing in or registering, with the way back to this choice. */
  function entrance(name: 'register' | 'sign-in', tier?: string): RouteLocationRaw {
    const query = { ...route.query, ...(tier ? { tier } : {}) };
    return { name, query: { next: router.resolve({ name: 'join', query }).fullPath } };
  }

  return { interval, standing, joining, join, said, resend, check, entrance };
}
