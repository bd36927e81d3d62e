import { describe, expect, it } from 'vitest';
import { SUBSCRIPTION_STATES } from '@shared/contracts/membership.ts';
import { dayWord, isFailed, isHeld, standingOf } from '@/components/account/standing.ts';
import { account } from '@/locales/en/account.ts';

// What the states mean: docs.stripe.com/billing/subscriptions/overview, "Subscription statuses".
describe('the standing of a membership', () => {
  it.each([
    ['active', { endsThen: false, opens: true }, 'runs', 'renews'],
    ['active', { endsThen: true, opens: true }, 'ends', 'ends'],
    ['trialing', { endsThen: false, opens: true }, 'trial', 'renews'],
    ['trialing', { endsThen: true, opens: true }, 'ends', 'ends'],
    ['past_due', { endsThen: false, opens: true }, 'late', 'renews'],
    ['past_due', { endsThen: false, opens: false }, 'unpaid', 'period'],
    ['past_due', { endsThen: true, opens: true }, 'late', 'ends'],
    ['unpaid', { endsThen: false, opens: false }, 'unpaid', 'period'],
    ['paused', { endsThen: false, opens: false }, 'paused', 'period'],
    ['canceled', { endsThen: true, opens: true }, 'readsOn', 'until'],
    ['canceled', { endsThen: true, opens: false }, 'over', 'ended'],
    ['incomplete', { endsThen: false, opens: false }, 'unfinished', 'ended'],
    ['incomplete_expired', { endsThen: true, opens: false }, 'unfinished', 'ended'],
  ] as const)('%s %o is "%s", its day "%s"', (state, rest, standing, word) => {
    expect(standingOf({ state, ...rest })).toBe(standing);
    expect(dayWord(standing, rest.endsThen)).toBe(word);
  });

  it('is none where there was never one', () => {
    expect(standingOf(null)).toBe('none');
    expect(isHeld('none')).toBe(false);
  });

  it('holds exactly those that the payment service would still charge or open', () => {
    const held = SUBSCRIPTION_STATES.filter((state) => isHeld(standingOf({ state, endsThen: false, opens: false })));
    expect(held).toEqual(['trialing', 'active', 'past_due', 'unpaid', 'paused']);
  });

  it('asks for another card only where a payment failed', () => {
    const failed = SUBSCRIPTION_STATES.filter((state) =>
      isFailed(standingOf({ state, endsThen: false, opens: false })),
    );
    expect(failed).toEqual(['past_due', 'unpaid']);
  });

  it('promises nothing open where the tier is closed', () => {
    for (const state of SUBSCRIPTION_STATES) {
      const sentence = account.standing[standingOf({ state, endsThen: true, opens: false })];
      if (state !== 'active' && state !== 'trialing') expect(sentence).not.toMatch(/is open to you|stays open/);
    }
  });
});
