import { defineError } from '../errors.ts';

export const wrongCredentials = defineError(
  'session.wrong_credentials',
  401,
  'E-mail and password do not go together.',
);
export const emailTaken = defineError('people.email_taken', 409, 'There is an account with this e-mail address.');
export const tokenInvalid = defineError('people.token_invalid', 410, 'This link has been used or has run out.');
export const wrongPassword = defineError('people.wrong_password', 403, 'That is not your present password.');
export const personNotFound = defineError('people.not_found', 404, 'There is no such person.');
export const lastAdmin = defineError('people.last_admin', 409, 'The house needs at least one admin.');
