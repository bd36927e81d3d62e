import { larderList, type LarderItem } from '@shared/contracts/larder.ts';
import { request } from './request.ts';

/** The whole ingredient catalogue, by name. */
export async function fetchLarder(): Promise<LarderItem[]> {
  return (await request('GET', '/api/larder', larderList)).data.items;
}
