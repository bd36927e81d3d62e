import type { ClientCode } from '@/api/problem.ts';
import type { ErrorCode } from '@shared/contracts/errors.ts';

type Code = ErrorCode | ClientCode;
type Group<C extends string> = C extends `${infer G}.${string}` ? G : never;
type NameIn<G extends string, C extends string> = C extends `${G}.${infer N}` ? N : never;
type Sentences = { [G in Group<Code>]: { [N in NameIn<G, Code>]: string } };

/** One sentence for every permanent code: what happened, and what can be done about it. */
export const errors = {
  client: {
    offline: 'The server could not be reached. Nothing was changed. Check the connection and try again.',
    unreadable:
      'The server answered something this page does not understand. Reload the page; if it stays, tell the house.',
  },
  request: {
    invalid: 'Something in what was sent is not right.',
    not_found: 'There is nothing at this address.',
    too_large: 'That is larger than the house accepts.',
    unsupported_type: 'That kind of content is not accepted here.',
    foreign_origin: 'This came from another site and was refused. Open the page anew and try again.',
    precondition_required: 'This page did not say which version it changes. Reload it and try again.',
    version_conflict: 'Somebody else saved this in the meantime. Nothing of yours is lost: look at both and decide.',
    limited: 'Too many attempts. Wait a few minutes and try again.',
  },
  server: {
    failed: 'Something broke on our side. Nothing of yours is lost; try again in a moment.',
    unready: 'The house is just opening or closing. Try again in a moment.',
  },
  access: {
    sign_in: 'Sign in to go on.',
    role: 'This is for others in the house.',
  },
  age: {
    unconfirmed: 'Answer the age check first.',
  },
  session: {
    wrong_credentials: 'The address and the password do not belong together.',
  },
  people: {
    email_taken: 'There is already an account with this address. Sign in, or ask for a new password.',
    token_invalid: 'This link has been used or is too old. Ask for a new letter.',
    wrong_password: 'That is not your present password.',
    not_found: 'There is no such person.',
    last_admin: 'The house needs at least one admin. Give somebody else the role first.',
  },
  imprint: {
    currency_in_use: 'The currency cannot change while tiers have prices in it.',
  },
  shoots: {
    not_found: 'There is no such shoot.',
    notes_unreadable: 'These notes cannot be read. Bring WebVTT or SRT captions, or text with a time before each line.',
  },
  recipes: {
    not_found: 'There is no such recipe.',
    cycle: 'A recipe cannot go into itself, not even by way of others.',
    unknown_component: 'A line points at a recipe that does not exist.',
    unknown_larder_item: 'A line points at something that is not in the larder.',
    transition_refused: 'The recipe cannot take this step from where it is.',
    incomplete: 'Something required is still missing.',
    queries_open: 'There are open queries. Answer and close them first.',
    slug_taken: 'Another recipe already has this address.',
  },
  queries: {
    not_found: 'There is no such query.',
    state_refused: 'The query cannot take this step from where it is.',
  },
  plates: {
    not_found: 'There is no such plate.',
    in_use: 'This plate is used in a recipe. Take it out there first.',
    empty: 'The file is empty.',
    not_a_picture: 'The file is not a picture, whatever its name says.',
    unsupported_format: 'This format of picture is not accepted. Bring JPEG, PNG, WebP, AVIF or TIFF.',
    too_many_pixels: 'The picture has more than 100 megapixels.',
    unreadable: 'The picture is damaged and cannot be read.',
    too_large: 'The file is too large.',
  },
  books: {
    not_found: 'There is no such book.',
    slug_taken: 'Another book already has this address.',
  },
  chapters: {
    not_found: 'There is no such chapter.',
    recipe_placed: 'The recipe already stands in this book.',
    order_stale: 'The running order changed in the meantime. It is shown anew; move again what you wanted to move.',
  },
  editions: {
    not_found: 'There is no such edition.',
    nothing_to_press: 'The book holds no recipe yet.',
    not_cleared: 'Not every recipe in the book is cleared.',
    pressing_runs: 'The book is being pressed already.',
    not_pressed: 'The edition is not pressed yet.',
    already_issued: 'The edition is issued already; an issued edition never changes.',
  },
  reading: {
    not_found: 'There is no such page in the book.',
    not_issued: 'The book is not issued yet.',
  },
  tiers: {
    not_found: 'There is no such tier.',
    rank_taken: 'Another tier already has this rank.',
  },
  checkout: {
    not_verified: 'Confirm your e-mail address before you join.',
    already_member: 'You hold a membership already. Let it end on your account page, then join another tier.',
    tier_closed: 'This tier takes no new members.',
    tier_waiting: 'This tier is just being changed. Try again in a moment.',
  },
  payments: {
    unavailable: 'The payment service does not answer. Nothing was charged; try again in a moment.',
    signature: 'The payment service’s message was not signed by it.',
  },
  membership: {
    none: 'There is no membership to change.',
  },
  letters: {
    local_only: 'The letters can be read on this machine only.',
  },
} satisfies Sentences;
