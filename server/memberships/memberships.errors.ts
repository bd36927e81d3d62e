import { defineError } from '../errors.ts';

export const membershipNone = defineError('membership.none', 409, 'There is no membership to change.');
