import type { Access } from '@shared/contracts/access.ts';
import type { TierPublic } from '@shared/contracts/tiers.ts';
import { toValue, type MaybeRefOrGetter } from 'vue';
import { useI18n } from 'vue-i18n';

/** A rule of access as staff read it: how many stitches, and the word. */
export interface AccessSign {
  rank: number;
  name: string;
}

/** Names rules of access after the house's tiers, lowest first. */
export function useAccessWords(tiers: MaybeRefOrGetter<readonly TierPublic[]>) {
  const { t } = useI18n();

  function signOf(access: Access): AccessSign {
    if (access.kind !== 'tier') return { rank: 0, name: t(`workroom.bindery.access.${access.kind}`) };
    const ladder = toValue(tiers);
    const place = ladder.findIndex((tier) => tier.rank >= access.rank);
    const tier = ladder[place];
    if (!tier) return { rank: access.rank, name: t('workroom.bindery.access.rank', { rank: access.rank }) };
    return { rank: place + 1, name: t('workroom.bindery.access.tier', { tier: tier.name }) };
  }

  return { signOf };
}
