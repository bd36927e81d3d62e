import {
  bookList,
  bookView,
  chapterView,
  type BookDraft,
  type BookRow,
  type BookView,
  type ChapterDraft,
  type ChapterView,
  type RunningOrder,
} from '@shared/contracts/books.ts';
import type { Access } from '@shared/contracts/access.ts';
import { request } from './request.ts';
import { entityTag } from './entity-tag.ts';

const BOOKS = '/api/bindery/books';
const CHAPTERS = '/api/bindery/chapters';

export async function fetchBooks(): Promise<BookRow[]> {
  return (await request('GET', BOOKS, bookList)).data.books;
}

export async function fetchBook(id: string): Promise<BookView> {
  return (await request('GET', `${BOOKS}/${id}`, bookView)).data;
}

export async function makeBook(draft: BookDraft): Promise<BookView> {
  return (await request('POST', BOOKS, bookView, { body: draft })).data;
}

/** `version` is the one that was read; refused with `request.version_conflict` when another is current. */
export async function saveBook(id: string, draft: BookDraft, version: number): Promise<BookView> {
  return (await request('PUT', `${BOOKS}/${id}`, bookView, { body: draft, ifMatch: entityTag(version) })).data;
}

/** `version` is the book's. */
export async function saveOrder(id: string, order: RunningOrder, version: number): Promise<BookView> {
  return (await request('PUT', `${BOOKS}/${id}/order`, bookView, { body: order, ifMatch: entityTag(version) })).data;
}

export async function addChapter(bookId: string, draft: ChapterDraft): Promise<BookView> {
  return (await request('POST', `${BOOKS}/${bookId}/chapters`, bookView, { body: draft })).data;
}

/** `version` is the chapter's own. */
export async function saveChapter(id: string, draft: ChapterDraft, version: number): Promise<ChapterView> {
  return (await request('PUT', `${CHAPTERS}/${id}`, chapterView, { body: draft, ifMatch: entityTag(version) })).data;
}

export async function removeChapter(id: string): Promise<BookView> {
  return (await request('DELETE', `${CHAPTERS}/${id}`, bookView)).data;
}

export async function placeRecipe(chapterId: string, recipeId: string): Promise<BookView> {
  return (await request('POST', `${CHAPTERS}/${chapterId}/recipes`, bookView, { body: { recipeId } })).data;
}

/** Null lets the chapter's rule hold. */
export async function setRecipeAccess(bookId: string, recipeId: string, access: Access | null): Promise<BookView> {
  const path = `${BOOKS}/${bookId}/recipes/${recipeId}/access`;
  return (await request('PUT', path, bookView, { body: { access } })).data;
}

export async function takeRecipeOut(bookId: string, recipeId: string): Promise<BookView> {
  return (await request('DELETE', `${BOOKS}/${bookId}/recipes/${recipeId}`, bookView)).data;
}
