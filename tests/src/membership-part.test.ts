import type { MembershipView } from '@shared/contracts/membership.ts';
import { flushPromises } from '@vue/test-utils';
import { describe, expect, it } from 'vitest';
import MembershipPart from '@/components/account/MembershipPart.vue';
import { openQuestion } from '@/composables/useConfirm.ts';
import { globalParts, mount } from './mount-part.ts';

const SEWN: MembershipView = {
  tier: { id: '3d1f6f0e-6f57-4bd0-a1d4-6f3f5a3f0b10', rank: 2, name: 'Sewn' },
  state: 'active',
  interval: 'year',
  price: 7000,
  currency: 'GBP',
  periodEnd: '2027-12-01T09:00:00.000Z',
  endsThen: false,
  opens: true,
};

const mountPart = (change: Partial<MembershipView>) =>
  mount(MembershipPart, {
    props: { membership: { ...SEWN, ...change }, busy: null, error: null },
    global: globalParts(),
  });
const actionsOf = (part: ReturnType<typeof mountPart>) => part.findAll('button').map((button) => button.text());

describe('a membership on the account page', () => {
  it('says what is open, until when and for how much', () => {
    const part = mountPart({});
    expect(part.text()).toContain('Sewn is open to you. It renews by itself on 1 December 2027.');
    expect(part.get('dl').text()).toMatch(/£70\s*a year/);
    expect(actionsOf(part)).toEqual(['Change the card', 'End the membership']);
  });

  it('is ended only after the question is answered with yes', async () => {
    const part = mountPart({});
    const end = part.findAll('button').find((button) => button.text() === 'End the membership')!;

    await end.trigger('click');
    expect(openQuestion.value?.text).toContain('You read on until 1 December 2027.');
    openQuestion.value?.answer(false);
    await flushPromises();
    expect(part.emitted('cancel')).toBeUndefined();

    await end.trigger('click');
    openQuestion.value?.answer(true);
    await flushPromises();
    expect(part.emitted('cancel')).toHaveLength(1);
  });

  it('can be kept after all once it is ended', async () => {
    const part = mountPart({ endsThen: true });
    expect(part.get('dl').text()).toContain('Ends on');
    expect(actionsOf(part)).toEqual(['Keep the membership after all', 'Change the card']);

    await part.get('button').trigger('click');
    expect(part.emitted('resume')).toHaveLength(1);
  });

  it('asks for another card where a payment failed, and promises no reading that is closed', async () => {
    const part = mountPart({ state: 'unpaid', opens: false });
    expect(part.text()).toContain('The payment did not go through, and Sewn is closed.');
    expect(part.get('button').classes()).toContain('is-filled');

    await part.findAll('button')[1]!.trigger('click');
    expect(openQuestion.value?.text).not.toContain('You read on');
    openQuestion.value?.answer(false);
  });
});
