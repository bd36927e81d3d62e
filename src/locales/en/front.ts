export const front = {
  title: {
    door: 'Welcome',
    join: 'Tiers',
    age: 'Your age',
    signIn: 'Sign in',
    register: 'Create an account',
    verify: 'Confirm your e-mail address',
    forgot: 'Forgotten password',
    reset: 'New password',
    confirmEmail: 'New e-mail address',
    terms: 'Terms',
    privacy: 'Privacy',
    demoLetters: 'Letters of this demonstration',
    notFound: 'Nothing here',
  },

  field: {
    name: 'Name',
    nameHint: 'As the house may address you.',
    email: 'E-mail address',
    password: 'Password',
    passwordHint: 'At least 10 characters. A short sentence is easy to keep.',
    newPassword: 'New password',
  },

  signIn: {
    heading: 'Sign in',
    lede: 'To the book you left open.',
    submit: 'Sign in',
    forgot: 'I have forgotten my password',
    none: 'No account yet?',
    register: 'Create one',
    demoHeading: 'Accounts of this demonstration',
    demoText: 'One press signs you in. The password of all of them is {password}.',
  },

  demo: {
    admin: { name: 'Admin', text: 'Tiers, people and the imprint' },
    editor: { name: 'Editor', text: 'Clears recipes, binds chapters' },
    creator: { name: 'Creator', text: 'From the shoot to the issued book' },
    member: { name: 'Member, lowest tier', text: 'Reads what the first tier opens' },
    clothbound: { name: 'Member, highest tier', text: 'Reads everything' },
    reader: { name: 'Reader', text: 'A free account without a tier' },
  },

  register: {
    heading: 'Create an account',
    lede: 'Free, and needed before you join. We send one letter to confirm the address.',
    submit: 'Create the account',
    agree: 'By creating an account you accept the {terms} and the {privacy}.',
    terms: 'terms',
    privacy: 'privacy notes',
    have: 'Already have one?',
    signIn: 'Sign in',
    doneHeading: 'A letter is on its way',
    doneText:
      'We wrote to {email}. Open the link in it to confirm the address; then everything kept for accounts is open to you.',
    onward: 'Read on',
  },

  verify: {
    heading: 'Confirm your e-mail address',
    busy: 'One moment: the address is being confirmed.',
    done: 'Your address is confirmed.',
    onward: 'To the book',
    missing: 'This page opens from the link in our letter. You can have it sent again.',
    resend: 'Send the letter again',
    resent: 'A new letter is on its way to {email}.',
    signIn: 'Sign in to have it sent again',
  },

  forgot: {
    heading: 'Forgotten password',
    lede: 'Say the address of your account; we send a link that lets you choose another password.',
    submit: 'Send the link',
    done: 'If there is an account with the address {email}, a letter with the link is on its way. It holds for a short time only.',
    back: 'Back to signing in',
  },

  reset: {
    heading: 'Choose a new password',
    submit: 'Keep this password',
    done: 'Your password is changed. Sign in with the new one.',
    missing: 'This page opens from the link in our letter.',
    again: 'Ask for a new letter',
    signIn: 'Sign in',
  },

  confirmEmail: {
    heading: 'Your new e-mail address',
    busy: 'One moment: the new address is being confirmed.',
    done: 'Your account now has the new address.',
    missing: 'This page opens from the link in our letter to the new address.',
    onward: 'To your account',
  },

  legal: {
    empty: 'The house has not written this page yet.',
  },

  notFound: {
    heading: 'No such page',
    text: 'This address leads nowhere, or not for you. Books are taken off the shelf and addresses change.',
    back: 'To the front door',
    signIn: 'Sign in with another account',
  },
};
