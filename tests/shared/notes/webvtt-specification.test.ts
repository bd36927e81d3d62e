import { describe, expect, it } from 'vitest';
import { readNotes, type Notes } from '../../../shared/notes/read-notes.ts';

// Examples printed in "WebVTT: The Web Video Text Tracks Format", W3C, https://www.w3.org/TR/webvtt1/; the section is named
// at each. Expected times and words follow from the sections "WebVTT timestamp" and "WebVTT cue text".

async function read(text: string): Promise<Notes> {
  const notes = await readNotes(text);
  if (!notes.ok) throw new Error(notes.reason);
  return notes;
}

const said = ({ cues }: Notes) => cues.map(({ startMs, endMs, text }) => [startMs, endMs, text]);

const INTERVIEW = `WEBVTT

00:11.000 --> 00:13.000
<v Roger Bingham>We are in New York City

00:13.000 --> 00:16.000
<v Roger Bingham>We're actually at the Lucern Hotel, just down the street

00:30.000 --> 00:31.500 align:right size:50%
<v Roger Bingham>When we e-mailed—

00:30.500 --> 00:32.500 align:left size:50%
<v Neil deGrasse Tyson>Didn't we talk about enough in that conversation?

00:32.500 --> 00:33.500 align:left size:50%
<v Neil deGrasse Tyson><i>Laughs</i>
`;

describe('examples of the WebVTT specification', () => {
  it('1.1 a simple caption file: voices and settings go, overlapping cues stay', async () => {
    const notes = await read(INTERVIEW);
    expect(notes.format).toBe('webvtt');
    expect(said(notes)).toEqual([
      [11_000, 13_000, 'We are in New York City'],
      [13_000, 16_000, "We're actually at the Lucern Hotel, just down the street"],
      [30_000, 31_500, 'When we e-mailed—'],
      [30_500, 32_500, "Didn't we talk about enough in that conversation?"],
      [32_500, 33_500, 'Laughs'],
    ]);
  });

  it.each([
    ['CRLF line ends', INTERVIEW.replaceAll('\n', '\r\n')],
    ['CR line ends', INTERVIEW.replaceAll('\n', '\r')],
    ['a byte order mark', `\uFEFF${INTERVIEW}`],
    ['a header after the signature', INTERVIEW.replace('WEBVTT', 'WEBVTT - an interview')],
  ])('is read the same with %s', async (_, text) => {
    expect(said(await read(text))).toEqual(said(await read(INTERVIEW)));
  });

  it('1.2 caption cues with multiple lines', async () => {
    const notes = await read(`WEBVTT

00:01.000 --> 00:04.000
Never drink liquid nitrogen.

00:05.000 --> 00:09.000
— It will perforate your stomach.
— You could die.
`);
    expect(said(notes)).toEqual([
      [1000, 4000, 'Never drink liquid nitrogen.'],
      [5000, 9000, '— It will perforate your stomach. — You could die.'],
    ]);
  });

  it('1.3 styling captions: style blocks and comments are no cues', async () => {
    const notes = await read(`WEBVTT

STYLE
::cue {
  background-image: linear-gradient(to bottom, dimgray, lightgray);
  color: papayawhip;
}
/* Style blocks cannot use blank lines nor "dash dash greater than" */

NOTE comment blocks can be used between style blocks.

STYLE
::cue(b) {
  color: peachpuff;
}

hello
00:00:00.000 --> 00:00:10.000
Hello <b>world</b>.

NOTE style blocks cannot appear after the first cue.
`);
    expect(said(notes)).toEqual([[0, 10_000, 'Hello world.']]);
  });

  it('1.4 other features: identifiers, classes and languages', async () => {
    const identified = await read(`WEBVTT

test
00:00.000 --> 00:02.000
This is a test.

123
00:00.000 --> 00:02.000
That's an, an, that's an L!

crédit de transcription
00:04.000 --> 00:05.000
Transcrit par Célestes™
`);
    expect(identified.cues.map(({ text }) => text)).toEqual([
      'This is a test.',
      "That's an, an, that's an L!",
      'Transcrit par Célestes™',
    ]);
    const classed = await read(`WEBVTT

04:05.001 --> 04:07.800
Sur les <i.foreignphrase><lang en>playground</lang></i>, ici à Montpellier
`);
    expect(said(classed)).toEqual([[245_001, 247_800, 'Sur les playground, ici à Montpellier']]);
  });
});
