import { describe, expect, it } from 'vitest';
import { decodeNotes } from '../../../shared/notes/decode-notes.ts';
import { readNotes } from '../../../shared/notes/read-notes.ts';

const bytes = (...values: number[]) => new Uint8Array(values);
const utf16 = (text: string, little: boolean) =>
  new Uint8Array(
    [...`\uFEFF${text}`].flatMap((sign) => {
      const code = sign.charCodeAt(0);
      return little ? [code & 0xff, code >> 8] : [code >> 8, code & 0xff];
    }),
  );

describe('bytes of a notes file', () => {
  // Byte order marks: The Unicode Standard, section 23.8.
  it.each([
    ['UTF-8', new TextEncoder().encode('40 ml crème')],
    ['UTF-8 with its mark', bytes(0xef, 0xbb, 0xbf, ...new TextEncoder().encode('40 ml crème'))],
    ['UTF-16, little end first', utf16('40 ml crème', true)],
    ['UTF-16, big end first', utf16('40 ml crème', false)],
  ])('are read as %s', (_, given) => {
    expect(decodeNotes(given)).toEqual({ ok: true, text: '40 ml crème' });
  });

  it.each([
    ['nothing', bytes(), 'empty'],
    ['blanks', new TextEncoder().encode(' \r\n\t\n'), 'empty'],
    // The signatures of PNG (W3C PNG, 5.2) and ZIP (APPNOTE 4.3.7).
    ['a picture', bytes(0x89, 0x50, 0x4e, 0x47, 0x0d, 0x0a, 0x1a, 0x0a, 0, 0, 0, 0x0d), 'not-text'],
    ['an archive', bytes(0x50, 0x4b, 0x03, 0x04, 0x14, 0, 0, 0, 8, 0), 'not-text'],
    ['bytes that are no UTF-8', bytes(0x63, 0x72, 0xe8, 0x6d, 0x65), 'not-text'],
  ])('are refused where they hold %s', (_, given, reason) => {
    expect(decodeNotes(given)).toEqual({ ok: false, reason });
  });
});

describe('notes that are not captions', () => {
  it.each([
    ['only blanks', ' \n\n', 'empty'],
    ['the signature and nothing else', 'WEBVTT', 'no-cues'],
    ['the signature over prose', 'WEBVTT\n\nthe shrub wants forty grams of sugar\n', 'no-cues'],
    ['only comments', 'WEBVTT\n\nNOTE nothing was said\n', 'no-cues'],
    ['times without words', '1\n00:00:01,000 --> 00:00:02,000\n\n', 'no-cues'],
  ])('are refused with %s', async (_, text, reason) => {
    expect(await readNotes(text)).toEqual({ ok: false, reason });
  });
});

describe('SubRip', () => {
  // SubRip's blocks of number, times with a comma, and lines: common practice.
  it('is read with its tags off, its lines joined and its times in milliseconds', async () => {
    const text =
      '\uFEFF1\r\n00:00:01,040 --> 00:00:05,220\r\n<i>Evening</i>, all.\r\nShort one.\r\n\r\n2\r\n01:00:06,000 --> 01:00:08,500\r\nSalt.\r\n';
    expect(await readNotes(text)).toMatchObject({
      ok: true,
      format: 'subrip',
      cues: [
        { index: 0, startMs: 1040, endMs: 5220, text: 'Evening, all. Short one.' },
        { index: 1, startMs: 3_606_000, endMs: 3_608_500, text: 'Salt.' },
      ],
    });
  });
});

describe('rolling captions', () => {
  it('give every line once, and keep what was truly said twice', async () => {
    const text = `WEBVTT

00:01.000 --> 00:04.000
take the jar

00:04.000 --> 00:07.000
take the jar
and the sugar

00:07.000 --> 00:09.000
and the sugar
stir

00:12.000 --> 00:14.000
stir
`;
    const notes = await readNotes(text);
    expect(notes).toMatchObject({ ok: true });
    expect(notes.ok && notes.cues.map((cue) => cue.text)).toEqual(['take the jar', 'and the sugar', 'stir', 'stir']);
  });
});

describe('typed notes', () => {
  it('with m:ss and h:mm:ss keep their times; a line without one goes on with the row before', async () => {
    const notes = await readNotes('0:20 gin 40 ml\n1:02:03 stir\nand strain\n[2:00] serve');
    expect(notes).toMatchObject({
      format: 'timed-text',
      cues: [
        { startMs: 20_000, text: 'gin 40 ml' },
        { startMs: 3_723_000, text: 'stir and strain' },
        { startMs: 120_000, text: 'serve' },
      ],
    });
  });

  it('say which line before the first time was left out', async () => {
    const notes = await readNotes('Friday, back bar\n0:20 gin 40 ml\n0:30 stir');
    expect(notes.ok && notes.warnings).toEqual([expect.stringContaining('Friday, back bar')]);
  });

  it('without times keep rows apart and join wrapped lines', async () => {
    const notes = await readNotes(
      'DAMSON SHRUB\n\ndamsons   600 g\nsugar   350 g\n\nSquash the damsons with the sugar in the big bowl and\ncover it. Fridge two days.\n',
    );
    expect(notes).toMatchObject({ format: 'prose' });
    expect(notes.ok && notes.cues.map(({ startMs, text }) => [startMs, text])).toEqual([
      [null, 'DAMSON SHRUB'],
      [null, 'damsons   600 g'],
      [null, 'sugar   350 g'],
      [null, 'Squash the damsons with the sugar in the big bowl and cover it. Fridge two days.'],
    ]);
  });
});
