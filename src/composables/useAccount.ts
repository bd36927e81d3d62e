import type { AccountView } from '@shared/contracts/membership.ts';
import { useQuery, useQueryCache } from '@pinia/colada';
import { useIntervalFn, useSessionStorage } from '@vueuse/core';
import { computed, watch } from 'vue';
import { useI18n } from 'vue-i18n';
import { cancelMembership, fetchAccount, resumeMembership, startCardChange } from '@/api/membership.ts';
import { useSessionStore } from '@/stores/session.ts';
import { announce } from './useAnnounce.ts';
import { useFormat } from './useFormat.ts';
import { useSubmit } from './useSubmit.ts';

const PAUSE_MS = 2000;
const LOOKS = 5;

/** The own membership and receipts, and what can be done about them. */
export function useAccount() {
  const { t } = useI18n();
  const cache = useQueryCache();
  const session = useSessionStore();
  const format = useFormat();

  const key = computed(() => ['account', session.user?.id ?? 'visitor']);
  const {
    data: account,
    error,
    refetch,
  } = useQuery({ key, query: fetchAccount, enabled: () => session.user !== null });

  const cancelling = useSubmit(async () => {
    const fresh = await cancelMembership();
    keep(fresh);
    announce(
      t('account.membership.cancelled', { day: fresh.membership ? format.day(fresh.membership.periodEnd) : '' }),
    );
  });
  const resuming = useSubmit(async () => {
    keep(await resumeMembership());
    announce(t('account.membership.resumed'));
  });
  function keep(fresh: AccountView): void {
    cache.setQueryData(key.value, fresh);
  }

  /** How often we look again after a visit to the payment service, whose word comes a moment after the reader. */
  const looks = useSessionStorage('account-looks', 0);
  const changing = useSubmit(async () => {
    const href = await startCardChange();
    looks.value = LOOKS;
    window.location.assign(href);
  });
  const looking = useIntervalFn(
    () => {
      if (looks.value <= 0) return looking.pause();
      looks.value -= 1;
      void refetch();
    },
    PAUSE_MS,
    { immediate: looks.value > 0 },
  );

  // What the head of the page says of the tier follows what is shown here.
  watch(
    () => account.value?.membership,
    (now, before) => {
      if (before !== undefined && now?.opens !== before?.opens) void session.load().then(session.forgetAnswers);
    },
  );

  return { account, error, refetch, cancelling, resuming, changing };
}
