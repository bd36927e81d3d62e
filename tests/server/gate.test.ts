import { describe, expect, it } from 'vitest';
import type { Access } from '../../shared/contracts/access.ts';
import { entitledRank, type Membership } from '../../server/gate/entitlement.ts';
import { decide, resolveAccess, type GateViewer } from '../../server/gate/gate.ts';

const now = new Date('2026-11-20T12:00:00Z');
const day = 86_400_000;
const later = (days: number) => new Date(now.getTime() + days * day);

const open: Access = { kind: 'open' };
const account: Access = { kind: 'account' };
const tier = (rank: number): Access => ({ kind: 'tier', rank });

const visitor: GateViewer = { staff: false, signedIn: false, verified: false, rank: 0 };
const unverified: GateViewer = { ...visitor, signedIn: true };
const verified: GateViewer = { ...unverified, verified: true };
const member = (rank: number): GateViewer => ({ ...verified, rank });
const staff: GateViewer = { ...verified, staff: true };

describe('the rule of an entry', () => {
  it.each([
    { who: 'a visitor', viewer: visitor, access: open, answer: { open: true } },
    { who: 'a visitor', viewer: visitor, access: account, answer: { open: false, why: 'account' } },
    { who: 'a visitor', viewer: visitor, access: tier(1), answer: { open: false, why: 'tier', rank: 1 } },
    { who: 'an unverified account', viewer: unverified, access: account, answer: { open: false, why: 'verify' } },
    { who: 'a verified account', viewer: verified, access: account, answer: { open: true } },
    { who: 'a verified account', viewer: verified, access: tier(1), answer: { open: false, why: 'tier', rank: 1 } },
    { who: 'a member of tier 1', viewer: member(1), access: account, answer: { open: true } },
    { who: 'a member of tier 1', viewer: member(1), access: tier(1), answer: { open: true } },
    { who: 'a member of tier 1', viewer: member(1), access: tier(2), answer: { open: false, why: 'tier', rank: 2 } },
    { who: 'a member of tier 3', viewer: member(3), access: tier(2), answer: { open: true } },
    { who: 'staff', viewer: staff, access: tier(3), answer: { open: true } },
  ] as const)('answers $who asking for $access.kind', ({ viewer, access, answer }) => {
    expect(decide({ access, opens: [], withdrawn: false }, viewer, now)).toEqual(answer);
  });

  it('hides what is withdrawn from every reader, and from no staff', () => {
    for (const viewer of [visitor, verified, member(3)])
      expect(decide({ access: open, opens: [], withdrawn: true }, viewer, now)).toEqual({
        open: false,
        why: 'withdrawn',
      });
    expect(decide({ access: open, opens: [], withdrawn: true }, staff, now)).toEqual({ open: true });
  });

  it('is the recipe’s own, else the chapter’s, else the book’s', () => {
    expect(resolveAccess(open, tier(2), tier(1))).toEqual(open);
    expect(resolveAccess(null, tier(2), tier(1))).toEqual(tier(2));
    expect(resolveAccess(null, null, tier(1))).toEqual(tier(1));
  });
});

describe('the moment from which a rank may read', () => {
  const opens = [
    { rank: 1, at: later(14) },
    { rank: 3, at: later(-1) },
  ];
  const ask = (viewer: GateViewer, access: Access = tier(1)) =>
    decide({ access, opens, withdrawn: false }, viewer, now);

  it('holds for the ranks up to the next named one, and a higher rank’s earlier moment is theirs', () => {
    expect(ask(member(1))).toEqual({ open: false, why: 'date', at: later(14) });
    expect(ask(member(2))).toEqual({ open: false, why: 'date', at: later(14) });
    expect(ask(member(3))).toEqual({ open: true });
  });

  it('leaves a rank below every named one as the rule says', () => {
    expect(ask(visitor, open)).toEqual({ open: true });
  });
});

describe('what a membership opens', () => {
  const base: Membership = {
    rank: 2,
    tierName: 'Sewn',
    state: 'active',
    paidUntil: later(10),
    endsAt: null,
    pastDueSince: null,
  };
  it.each<{ rule: string; membership: Partial<Membership>; rank: number }>([
    { rule: 'active', membership: {}, rank: 2 },
    { rule: 'trialing', membership: { state: 'trialing', paidUntil: null }, rank: 2 },
    { rule: 'active and cancelled for the end of the period', membership: { endsAt: later(10) }, rank: 2 },
    { rule: 'past due within the grace days', membership: { state: 'past_due', pastDueSince: later(-6) }, rank: 2 },
    { rule: 'past due beyond the grace days', membership: { state: 'past_due', pastDueSince: later(-8) }, rank: 0 },
    { rule: 'cancelled within the paid period', membership: { state: 'canceled', endsAt: later(-1) }, rank: 2 },
    {
      rule: 'cancelled, paid period over',
      membership: { state: 'canceled', endsAt: later(-9), paidUntil: later(-1) },
      rank: 0,
    },
    // The payment service's clock may be ahead of ours: what ran to its end has ended.
    { rule: 'run to the end of its paid period', membership: { state: 'canceled', endsAt: later(10) }, rank: 0 },
    {
      rule: 'cancelled without ever paying',
      membership: { state: 'canceled', endsAt: later(-1), paidUntil: null },
      rank: 0,
    },
    { rule: 'unpaid', membership: { state: 'unpaid' }, rank: 0 },
    { rule: 'incomplete', membership: { state: 'incomplete' }, rank: 0 },
    { rule: 'paused', membership: { state: 'paused' }, rank: 0 },
  ])('$rule: rank $rank', ({ membership, rank }) => {
    expect(entitledRank({ ...base, ...membership }, 7, now)).toBe(rank);
  });

  it('is nothing without one', () => expect(entitledRank(null, 7, now)).toBe(0));
});
