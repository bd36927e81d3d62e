import { defineError } from '../errors.ts';

export const tierNotFound = defineError('tiers.not_found', 404, 'There is no such tier.');
export const rankTaken = defineError('tiers.rank_taken', 409, 'Another tier already has this rank.');
