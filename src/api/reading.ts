import {
  bookContents,
  readingView,
  shelf,
  type BookContents,
  type ReadingView,
  type Shelf,
} from '@shared/contracts/reading.ts';
import { request } from './request.ts';

export async function fetchShelf(): Promise<Shelf> {
  return (await request('GET', '/api/shelf', shelf)).data;
}

/** `as` lets staff look as a visitor (0) or as a member of that rank. */
export async function fetchContents(book: string, as?: number): Promise<BookContents> {
  return (await request('GET', `/api/reading/${book}`, bookContents, { query: { as } })).data;
}

export async function fetchReading(book: string, recipe: string, as?: number): Promise<ReadingView> {
  return (await request('GET', `/api/reading/${book}/${recipe}`, readingView, { query: { as } })).data;
}

export async function fetchGalley(bookId: string, as?: number): Promise<BookContents> {
  return (await request('GET', `/api/bindery/books/${bookId}/galley`, bookContents, { query: { as } })).data;
}

export async function fetchGalleyRecipe(bookId: string, recipe: string, as?: number): Promise<ReadingView> {
  return (await request('GET', `/api/bindery/books/${bookId}/galley/${recipe}`, readingView, { query: { as } })).data;
}

/** Where the whole book is downloaded. */
export function epubAddress(book: string): string {
  return `/api/reading/${book}/files/epub`;
}
