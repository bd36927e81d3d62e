import { randomBytes } from 'node:crypto';
import { mkdir, readdir, readFile, rename, rm, writeFile } from 'node:fs/promises';
import { readLetter, type Letter } from './letter.ts';

const ID = /^\d{13}-[0-9a-f]{12}$/;

/** Keeps caught letters in a folder: `<id>.json` beside the message as it came, `<id>.eml`. */
export interface LetterStore {
  keep: (source: Buffer, to: string[]) => Promise<Letter>;
  /** Newest first. */
  list: () => Promise<Letter[]>;
  find: (id: string) => Promise<Letter | undefined>;
  clear: () => Promise<void>;
}

export async function openLetterStore(folder: string): Promise<LetterStore> {
  await mkdir(folder, { recursive: true });
  let latest = 0;

  async function idsNewestFirst(): Promise<string[]> {
    const names = await readdir(folder);
    const ids = names.filter((name) => name.endsWith('.json')).map((name) => name.slice(0, -'.json'.length));
    return ids.filter((id) => ID.test(id)).sort((a, b) => (a < b ? 1 : -1));
  }

  async function find(id: string): Promise<Letter | undefined> {
    if (!ID.test(id)) return undefined;
    try {
      return JSON.parse(await readFile(`${folder}/${id}.json`, 'utf8')) as Letter;
    } catch (error) {
      if ((error as NodeJS.ErrnoException).code === 'ENOENT') return undefined;
      throw error;
    }
  }

  return {
    async keep(source, to) {
      // Two letters of one millisecond keep their order.
      latest = Math.max(latest + 1, Date.now());
      const id = `${latest}-${randomBytes(6).toString('hex')}`;
      const letter = await readLetter(source, { id, at: new Date(latest).toISOString(), to });
      await writeFile(`${folder}/${id}.eml`, source);
      // A letter is listed only once it is whole.
      await writeFile(`${folder}/${id}.part`, JSON.stringify(letter, null, 2));
      await rename(`${folder}/${id}.part`, `${folder}/${id}.json`);
      return letter;
    },
    async list() {
      const letters = await Promise.all((await idsNewestFirst()).map(find));
      return letters.filter((letter) => letter !== undefined);
    },
    find,
    async clear() {
      const ids = await idsNewestFirst();
      await Promise.all(
        ids.flatMap((id) => ['json', 'eml'].map((kind) => rm(`${folder}/${id}.${kind}`, { force: true }))),
      );
    },
  };
}
