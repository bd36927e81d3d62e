import { imprintPublic, type ImprintPublic } from '@shared/contracts/imprint.ts';
import { request } from './request.ts';

export async function fetchImprint(): Promise<ImprintPublic> {
  return (await request('GET', '/api/imprint', imprintPublic)).data;
}
