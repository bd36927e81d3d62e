import { GUIDANCE, SENSIBLY } from '@shared/wording/en.ts';

export const common = {
  product: 'Steep & Bind',
  skip: 'Skip to the text',
  loading: 'Loading',
  tryAgain: 'Try again',
  close: 'Close',
  cancel: 'Cancel',
  save: 'Save',
  optional: 'optional',
  notANumber: 'Write a number, like 12 or 12.5.',
  tooLittle: 'At least {min}.',
  tooMuch: 'At most {max}.',
  dismiss: 'Dismiss this message',

  theme: {
    toCellar: 'Switch to the cellar theme',
    toPaper: 'Switch to the paper theme',
  },

  head: {
    nav: 'Book',
    menu: 'Menu',
    closeMenu: 'Close the menu',
    join: 'Tiers',
    signIn: 'Sign in',
    signOut: 'Sign out',
    workroom: 'Workroom',
    readingAs: '{tier}, {name}',
    verify: 'Your e-mail address is not confirmed yet.',
    verifyLink: 'Send the letter again',
  },

  spine: {
    nav: 'Workroom',
    home: 'To the front door',
    shoots: 'Shoots',
    recipes: 'Recipes',
    plates: 'Plates',
    bindery: 'Bindery',
    larder: 'Larder',
    office: 'Office',
    people: 'People',
    tiers: 'Tiers',
    imprint: 'Imprint',
  },

  colophon: {
    sewn: 'Set in Lora and Source Sans, sewn with Steep & Bind.',
    guidance: GUIDANCE,
    sensibly: SENSIBLY,
    terms: 'Terms',
    privacy: 'Privacy',
    letters: 'Letters of this demonstration',
    nav: 'Legal notes',
  },

  duration: {
    second: '{n} s',
    minute: '{n} min',
    hour: '{n} h',
    day: '{n} day | {n} days',
    week: '{n} week | {n} weeks',
  },

  saveState: {
    saved: 'Saved',
    savedAt: 'Saved {time}',
    saving: 'Saving',
    unsaved: 'Not saved yet',
    offline: 'Not saved yet, no connection. Kept on this page.',
    conflict: 'Somebody else saved in the meantime',
    failed: 'Not saved',
  },

  unsaved: {
    title: 'Leave without saving?',
    text: 'This page holds text that is not saved. It is lost when you leave.',
    leave: 'Leave, lose the text',
    stay: 'Stay here',
  },

  path: {
    label: 'Where this recipe is',
  },

  tier: {
    open: 'Open',
  },

  thread: {
    handsOn: 'hands-on',
    waiting: 'waiting',
  },

  plate: {
    credit: 'Photograph: {credit}',
  },

  error: {
    faults: 'Please look at:',
    signIn: 'Sign in',
  },
};
