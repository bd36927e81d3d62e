import { execFile } from 'node:child_process';
import { mkdtemp, readFile, rm, writeFile } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { promisify } from 'node:util';
import { inflateRawSync } from 'node:zlib';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { makeEpub } from '../../server/epub/make-epub.ts';
import { takeSnapshot } from '../../server/editions/snapshot.ts';
import { useApi } from '../support/api.ts';
import { makeLine, makeStep } from '../support/factories.ts';
import { makeBook, makePicture } from '../support/issued-book.ts';

const api = useApi();
const modified = new Date('2026-11-20T12:00:00Z');
const hash = 'a'.repeat(64);
let folder: string;
let book: Uint8Array;
let again: Uint8Array;

beforeAll(async () => {
  folder = await mkdtemp(join(tmpdir(), 'steep-epub-'));
  const plate = await makePicture(api.ctx, {
    alt: 'Salt & "smoke" <on> glass',
    caption: 'Æ, ß and 波',
    credit: 'Nobody & Sons',
  });
  const made = await makeBook(api.db, {
    title: 'Salt & Smoke <for> "Two"',
    introduction: '# Tide\n\nLow *water* & high, 1 < 2. Æøå 波 ½.\n\n- one\n- two\n\n---\n\n> still\n',
    coverPlateId: plate.id,
    recipes: [
      {
        slug: 'first',
        title: 'Kelp & Lime <sour>',
        headnote: 'A line\\\nwith a break & a [link](https://tide.example/?a=1&b=2).',
        leadPlateId: plate.id,
        tips: '**Cold** glass.',
        lines: [
          makeLine({
            name: 'egg white',
            larderId: 'egg-white',
            amount: { min: 0.5, max: 1 },
            unit: 'piece',
            source: { cue: 41, startMs: 98_765 },
          }),
          makeLine({
            name: 'salt & "pepper"',
            amount: null,
            unit: null,
            scaling: { rule: 'to-taste' },
            note: '<a pinch>',
          }),
        ],
        steps: [makeStep({ text: 'Shake & strain, 3 < 5.', plateId: plate.id, temperature: { min: 60, max: 65 } })],
        keeping: {
          place: 'refrigerator',
          days: { min: 7, max: 14 },
          temperature: { min: 4, max: 4 },
          basis: 'guidance',
          note: '',
        },
      },
    ],
  });
  const row = (await api.db('books').where({ id: made.book.id }).first())!;
  const snapshot = await takeSnapshot(api.db, { book: row, kind: 'edition', number: 1 });
  book = await makeEpub(snapshot, api.ctx.files, { hash, modified });
  again = await makeEpub(structuredClone(snapshot), api.ctx.files, { hash, modified });
  await writeFile(join(folder, 'book.epub'), book);
});
afterAll(() => rm(folder, { recursive: true, force: true }));

/** One file of the container, found by the central directory (APPNOTE 4.3.12), inflated. */
function unzip(name: string): string {
  const zip = Buffer.from(book);
  for (let at = zip.indexOf('PK\x01\x02'); at >= 0; at = zip.indexOf('PK\x01\x02', at + 4)) {
    const nameLength = zip.readUInt16LE(at + 28);
    if (zip.toString('utf8', at + 46, at + 46 + nameLength) !== name) continue;
    const local = zip.readUInt32LE(at + 42);
    const from = local + 30 + zip.readUInt16LE(local + 26) + zip.readUInt16LE(local + 28);
    const bytes = zip.subarray(from, from + zip.readUInt32LE(at + 20));
    return (zip.readUInt16LE(at + 10) === 8 ? inflateRawSync(bytes) : bytes).toString('utf8');
  }
  throw new Error(`There is no ${name} in the book.`);
}

describe('the EPUB of a book full of awkward signs', () => {
  it('passes epubcheck without an error or a warning (W3C EPUBCheck of Debian 12)', async () => {
    const report = join(folder, 'report.json');
    await promisify(execFile)('java', [
      '-jar',
      '/usr/share/java/epubcheck.jar',
      join(folder, 'book.epub'),
      '--json',
      report,
    ]);
    const { checker, messages } = JSON.parse(await readFile(report, 'utf8'));
    expect(messages).toEqual([]);
    expect(checker).toMatchObject({ nFatal: 0, nError: 0, nWarning: 0 });
  });

  it('begins with its type, stored as it is, so that a system knows it by its first bytes (EPUB OCF 3.3, 4.2.6.4)', () => {
    const head = Buffer.from(book).subarray(0, 58).toString('latin1');
    expect(head.slice(30, 38)).toBe('mimetype');
    expect(head.slice(38)).toBe('application/epub+zip');
  });

  it('is the same bytes for the same snapshot', () => {
    expect(Buffer.compare(Buffer.from(book), Buffer.from(again))).toBe(0);
  });

  it('says allergens and cautions, and nothing of where the notes said it', () => {
    const page = unzip('OEBPS/first.xhtml');
    expect(page).toContain('Contains Egg.');
    expect(page).toContain('Raw egg');
    expect(page).toContain('7\u00a0days to 2\u00a0weeks');
    expect(page).toContain('Kelp &amp; Lime &lt;sour&gt;');
    expect(page).not.toContain('98765');
    expect(unzip('OEBPS/colophon.xhtml')).toContain(
      'Follow local codes, the maker’s instructions and licensed practice',
    );
  });
});
