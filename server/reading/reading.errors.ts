import { defineError } from '../errors.ts';

export const notThere = defineError('reading.not_found', 404, 'There is nothing to read at this address.');
export const notIssued = defineError('reading.not_issued', 404, 'This book is not out yet.');
