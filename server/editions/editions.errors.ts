import { defineError } from '../errors.ts';

export const editionNotFound = defineError('editions.not_found', 404, 'There is no such edition.');
export const nothingToPress = defineError('editions.nothing_to_press', 422, 'The book holds no recipe yet.');
export const notCleared = defineError('editions.not_cleared', 422, 'Some recipes of the book are not cleared.');
export const pressingRuns = defineError('editions.pressing_runs', 409, 'This book is being pressed already.');
export const notPressed = defineError('editions.not_pressed', 409, 'Only a pressed edition can be issued.');
export const alreadyIssued = defineError('editions.already_issued', 409, 'This edition is out already.');
