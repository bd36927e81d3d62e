import { defineError } from '../errors.ts';

export const bookNotFound = defineError('books.not_found', 404, 'There is no such book.');
export const bookSlugTaken = defineError('books.slug_taken', 409, 'Another book has that address.');
export const chapterNotFound = defineError('chapters.not_found', 404, 'This book has no such chapter.');
export const recipePlaced = defineError('chapters.recipe_placed', 409, 'The recipe already stands in this book.');
export const orderStale = defineError(
  'chapters.order_stale',
  409,
  'The running order names other chapters or recipes than the book holds. Load it again.',
);
