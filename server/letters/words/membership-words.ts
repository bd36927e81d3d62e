import type { Words } from './words.ts';

type MembershipKind = 'receipt' | 'cancelled' | 'payment-failed';

export const membershipWords: Words<MembershipKind> = {
  receipt: ({ name, number, amount, currency, tierName, paidAt, href }, { imprint, money, day }) => ({
    subject: `Receipt ${number} from ${imprint}`,
    greeting: `Hello ${name},`,
    parts: [
      `Thank you. You paid ${money(amount, currency)} for ${tierName} on ${day(paidAt)}. The number of this receipt is ${number}.`,
      ...(href ? [{ link: href, label: 'See the receipt' }] : []),
    ],
  }),
  cancelled: ({ name, tierName, endsAt }, { imprint, day }) => ({
    subject: `Your membership of ${imprint} ends on ${day(endsAt)}`,
    greeting: `Hello ${name},`,
    parts: [
      `Your ${tierName} membership is cancelled. It ends on ${day(endsAt)}; no further payment is taken.`,
      'Your account stays, and with it everything that is open to readers.',
    ],
  }),
  'payment-failed': ({ name, tierName, link }, { imprint }) => ({
    subject: `A payment to ${imprint} did not go through`,
    greeting: `Hello ${name},`,
    parts: [
      `The payment for your ${tierName} membership was refused. We will try again in a few days; if you have a new card, please tell us now.`,
      { link, label: 'Look after the membership' },
    ],
  }),
};
