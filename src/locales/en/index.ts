import { account } from './account.ts';
import { common } from './common.ts';
import { drafts } from './drafts.ts';
import { errors } from './errors.ts';
import { front } from './front.ts';
import { reading } from './reading.ts';
import { words } from './words.ts';

/** What every page may need. The staff areas bring their own catalogues with them. */
export const en = { account, common, drafts, errors, front, reading, words };

/** Catalogues that are fetched on entering their area, so that a reader does not carry them. */
export const areas = {
  workroom: async () => (await import('./workroom-area.ts')).workroomArea,
  office: async () => (await import('./office.ts')).office,
};
export type Area = keyof typeof areas;
