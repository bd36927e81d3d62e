import {
  plateList,
  plateUpload,
  plateView,
  type PlateUpload,
  type PlateView,
  type PlateWords,
} from '@shared/contracts/plates.ts';
import { done } from '@shared/contracts/primitives.ts';
import { entityTag } from './entity-tag.ts';
import { request } from './request.ts';

const PLATES = '/api/plates';

/** The plates of the house, or of one shoot, newest first. */
export async function fetchPlates(shoot?: string): Promise<PlateView[]> {
  return (await request('GET', PLATES, plateList, { query: { shoot } })).data.plates;
}

/** Each file is kept or refused by name; one that is refused does not hold up the others. */
export async function uploadPlates(files: readonly File[], shoot?: string): Promise<PlateUpload> {
  const form = new FormData();
  for (const file of files) form.append('plates', file, file.name);
  return (await request('POST', PLATES, plateUpload, { form, query: { shoot } })).data;
}

export async function savePlateWords(id: string, words: PlateWords, version: number): Promise<PlateView> {
  return (await request('PUT', `${PLATES}/${id}`, plateView, { body: words, ifMatch: entityTag(version) })).data;
}

export async function fetchPlate(id: string): Promise<PlateView> {
  return (await request('GET', `${PLATES}/${id}`, plateView)).data;
}

export async function removePlate(id: string): Promise<void> {
  await request('DELETE', `${PLATES}/${id}`, done);
}
