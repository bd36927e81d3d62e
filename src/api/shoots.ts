import {
  shootList,
  shootReading,
  shootView,
  type ShootDraft,
  type ShootReading,
  type ShootRow,
  type ShootView,
} from '@shared/contracts/shoots.ts';
import { entityTag } from './entity-tag.ts';
import { request } from './request.ts';

const SHOOTS = '/api/shoots';

/** A shoot by its id, and the version that a change must name. */
interface AtVersion {
  id: string;
  version: number;
}

/** The shoots, the last filmed first. */
export async function fetchShoots(): Promise<ShootRow[]> {
  return (await request('GET', SHOOTS, shootList)).data.shoots;
}

export async function makeShoot(draft: ShootDraft): Promise<ShootView> {
  return (await request('POST', SHOOTS, shootView, { body: draft })).data;
}

export async function fetchShoot(id: string): Promise<ShootView> {
  return (await request('GET', `${SHOOTS}/${id}`, shootView)).data;
}

/** Refused with `request.version_conflict` when others saved first. */
export async function saveShoot({ id, version }: AtVersion, draft: ShootDraft): Promise<ShootView> {
  const options = { body: draft, ifMatch: entityTag(version) };
  return (await request('PUT', `${SHOOTS}/${id}`, shootView, options)).data;
}

/** Replaces the notes by a file of WebVTT, SubRip or text; a refused one leaves the old notes. */
export async function uploadNotes({ id, version }: AtVersion, file: File): Promise<ShootView> {
  const form = new FormData();
  form.append('notes', file, file.name);
  return (await request('PUT', `${SHOOTS}/${id}/notes`, shootView, { form, ifMatch: entityTag(version) })).data;
}

export async function pasteNotes({ id, version }: AtVersion, text: string): Promise<ShootView> {
  const options = { body: { text }, ifMatch: entityTag(version) };
  return (await request('PUT', `${SHOOTS}/${id}/notes/text`, shootView, options)).data;
}

/** What the reader makes of the notes. */
export async function fetchReadingOf(id: string): Promise<ShootReading> {
  return (await request('GET', `${SHOOTS}/${id}/draft`, shootReading)).data;
}
