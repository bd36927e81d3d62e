import { defineError } from '../errors.ts';

export const lettersLocalOnly = defineError('letters.local_only', 404, 'Letters are caught in the demonstration only.');
