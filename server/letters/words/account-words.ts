import type { Words } from './words.ts';

type AccountKind = 'verify' | 'reset' | 'email-change' | 'email-changed' | 'email-changing';

export const accountWords: Words<AccountKind> = {
  verify: ({ name, link }, { imprint }) => ({
    subject: `Confirm your e-mail address for ${imprint}`,
    greeting: `Hello ${name},`,
    parts: [
      `You made an account with ${imprint}. Please confirm that this address is yours. The link works for three days.`,
      { link, label: 'Confirm this address' },
      'If it was not you, do nothing: nobody can use the address without this link.',
    ],
  }),
  reset: ({ name, link }, { imprint }) => ({
    subject: `A new password for ${imprint}`,
    greeting: `Hello ${name},`,
    parts: [
      'Somebody asked for a new password for your account. The link works once, within two hours.',
      { link, label: 'Choose a new password' },
      'If it was not you, do nothing: your password stays as it is.',
    ],
  }),
  'email-change': ({ name, link, newEmail }, { imprint }) => ({
    subject: `Confirm your new e-mail address for ${imprint}`,
    greeting: `Hello ${name},`,
    parts: [
      `You asked to use ${newEmail} for your account. The link works for one day.`,
      { link, label: 'Use this address' },
      'If it was not you, do nothing: the address of the account stays as it is.',
    ],
  }),
  'email-changing': ({ name, newEmail }, { imprint }) => ({
    subject: `Your e-mail address at ${imprint} is about to change`,
    greeting: `Hello ${name},`,
    parts: [
      `Somebody who knows your password asked to change the address of your account to ${newEmail}.`,
      'If it was you, follow the link in the letter to the new address. If not, change your password now.',
    ],
  }),
  'email-changed': ({ name, oldEmail, newEmail }, { imprint }) => ({
    subject: `Your e-mail address at ${imprint} has changed`,
    greeting: `Hello ${name},`,
    parts: [
      `The address of your account was ${oldEmail} and is now ${newEmail}.`,
      'If this was not you, answer this letter at once.',
    ],
  }),
};
