import { editionList, editionRow, type EditionRow } from '@shared/contracts/editions.ts';
import { request } from './request.ts';

const ofBook = (bookId: string) => `/api/bindery/books/${bookId}/editions`;

/** Editions and leaves of a book, newest first. */
export async function fetchEditions(bookId: string): Promise<EditionRow[]> {
  return (await request('GET', ofBook(bookId), editionList)).data.editions;
}

/** Begins to press; the edition is followed by fetching the list again. */
export async function pressEdition(bookId: string): Promise<EditionRow> {
  return (await request('POST', ofBook(bookId), editionRow)).data;
}

/** `opens` names ranks and the UTC instants from which they may read. */
export async function issueEdition(id: string, opens: readonly { rank: number; at: string }[]): Promise<EditionRow> {
  return (await request('POST', `/api/bindery/editions/${id}/issue`, editionRow, { body: { opens } })).data;
}

export async function releaseLeaf(recipeId: string, bookId: string): Promise<EditionRow> {
  return (await request('POST', `/api/recipes/${recipeId}/leaf`, editionRow, { body: { bookId } })).data;
}
