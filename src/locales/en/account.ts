import type { Standing } from '@/components/account/standing.ts';

export const account = {
  lede: 'Signed in as {email}.',
  signOut: 'Sign out',

  /** A membership in plain words. */
  standing: {
    none: 'You hold no membership. A tier opens the recipes of the book to you for as long as it runs.',
    runs: '{tier} is open to you. It renews by itself on {day}.',
    trial: '{tier} is open to you on trial. The first payment is due on {day}.',
    ends: 'You ended your membership. You read on until {day}; after that nothing more is charged.',
    late: 'The last payment did not go through. Change the card, so that {tier} stays open to you.',
    unpaid: 'The payment did not go through, and {tier} is closed. Change the card to open it again.',
    paused: 'Your membership is paused. Nothing is charged, and {tier} is closed until it goes on.',
    readsOn: 'Your membership is ended. What you paid for stays open until {day}.',
    over: 'Your membership ended on {day}. Nothing more is charged.',
    unfinished: 'The first payment for {tier} did not go through, so the membership never began.',
  } satisfies Record<Standing, string>,

  membership: {
    title: 'Membership',
    tier: 'Tier',
    state: 'State',
    price: 'Price',
    month: 'a month',
    year: 'a year',
    renews: 'Renews on',
    ends: 'Ends on',
    ended: 'Ended on',
    until: 'Open until',
    period: 'Period ends on',
    opens: 'open to you',
    closed: 'not open to you',
    staff: 'You work here, so every recipe is open to you without a membership.',
    endsAnyway: 'You ended the membership; it is over on {day} in any case.',
    compare: 'Compare the tiers',
    again: 'Join again',
    cancel: 'End the membership',
    cancelTitle: 'End your {tier} membership?',
    cancelText: 'You read on until {day}. After that its recipes close, and nothing more is charged.',
    cancelClosed: 'It is over on {day}, and no new period is charged.',
    cancelYes: 'End it on {day}',
    cancelNo: 'Keep it',
    cancelled: 'Your membership ends on {day}.',
    resume: 'Keep the membership after all',
    resumed: 'Your membership goes on.',
    card: 'Change the card',
    fine: 'The card is changed on the payment service’s own page. To hold another tier, or to pay by another interval, let this membership end and join anew.',
  },

  receipts: {
    title: 'Receipts',
    about: 'Each opens on the payment service’s own page.',
    none: 'Nothing has been paid yet.',
    number: 'Receipt',
    paidAt: 'Paid on',
    for: 'for {tier}',
    amount: 'Amount',
    openOf: 'Open receipt {number}',
  },

  name: {
    title: 'Name',
    about: 'How the house may address you.',
    label: 'Name',
    submit: 'Save the name',
    done: 'The name is saved.',
  },

  verify: {
    verified: 'confirmed',
    unverified: 'not confirmed yet',
    text: 'Open the link in the letter that we sent to this address. You need it before you join.',
    resend: 'Send the letter again',
    resent: 'A new letter is on its way to {email}.',
    check: 'I have confirmed it',
    notYet: 'Not confirmed yet. Open the link in the newest letter first.',
  },

  email: {
    title: 'E-mail address',
    about:
      'Both addresses are told of a change. The new one counts once you open the link in its letter; until then the old one stays.',
    next: 'New e-mail address',
    password: 'Your password',
    submit: 'Change the address',
    taken: 'There is an account with this address already.',
    done: 'We wrote to {next} with a link to confirm it, and told {now} about it.',
  },

  password: {
    title: 'Password',
    about: 'A new one signs you out on every other device.',
    current: 'Present password',
    next: 'New password',
    hint: 'At least 10 characters. A short sentence is easy to keep.',
    submit: 'Change the password',
    done: 'The password is changed. Every other device is signed out.',
  },
};
