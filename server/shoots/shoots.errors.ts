import { defineError } from '../errors.ts';

export const shootNotFound = defineError('shoots.not_found', 404, 'There is no such shoot.');
export const notesUnreadable = defineError('shoots.notes_unreadable', 422, 'These notes cannot be read.');
