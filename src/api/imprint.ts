import {
  imprintPublic,
  imprintSettings,
  type ImprintDraft,
  type ImprintPublic,
  type ImprintSettings,
} from '@shared/contracts/imprint.ts';
import { request } from './request.ts';

export async function fetchImprint(): Promise<ImprintPublic> {
  return (await request('GET', '/api/imprint', imprintPublic)).data;
}

export async function fetchImprintSettings(): Promise<ImprintSettings> {
  return (await request('GET', '/api/office/imprint', imprintSettings)).data;
}

/** Saves the settings over the version that was read. @throws ApiProblem `request.version_conflict` */
export async function saveImprintSettings(draft: ImprintDraft, version: number): Promise<ImprintSettings> {
  return (await request('PUT', '/api/office/imprint', imprintSettings, { body: draft, ifMatch: `"${version}"` })).data;
}
