import type TestAgent from 'supertest/lib/agent.js';
import { beforeAll, describe, expect, it } from 'vitest';
import type { ShootView } from '../../shared/contracts/shoots.ts';
import { useApi } from '../support/api.ts';

const api = useApi();
let creator: TestAgent;
let editor: TestAgent;

beforeAll(async () => {
  creator = await api.as({ roles: ['creator'] });
  editor = await api.as({ roles: ['editor'] });
});

const DAY = { title: 'Gorse by the gate', shotOn: '2026-05-02', videoUrl: 'https://video.example/gorse' };

/** WebVTT (W3C): a voice, a class, a timestamp tag and a character reference, a note to pass over. */
const WEBVTT = `WEBVTT - a test

NOTE this is for the editor only

00:01.000 --> 00:04.000 align:start
<v Bryn>Two hundred <c.loud>grams</c> of caster sugar

00:00:05.500 --> 00:00:09.000
and <00:00:06.000>250 ml water &amp; a bay leaf
`;

/** SubRip as players write it: a comma before the milliseconds, carriage returns, a byte order mark. */
const SUBRIP =
  '\uFEFF1\r\n00:01:02,500 --> 00:01:04,000\r\n50 ml gin\r\n\r\n2\r\n00:01:05,000 --> 00:01:09,000\r\nstir for 30 seconds\r\n';

async function makeShoot(): Promise<ShootView> {
  const { body } = await creator.post('/api/shoots').send(DAY).expect(201);
  return body as ShootView;
}

const upload = (agent: TestAgent, { id, version }: ShootView, name: string, content: string | Uint8Array) =>
  agent
    .put(`/api/shoots/${id}/notes`)
    .set('If-Match', `"${version}"`)
    .attach('notes', Buffer.from(content as Uint8Array), name);

const paste = (agent: TestAgent, { id, version }: ShootView, text: string) =>
  agent.put(`/api/shoots/${id}/notes/text`).set('If-Match', `"${version}"`).send({ text });

describe('a shoot', () => {
  it('is made, listed and changed, and keeps its day in every zone', async () => {
    const shoot = await makeShoot();
    expect(shoot).toMatchObject({ ...DAY, version: 1, notes: null, recipes: [] });

    const changed = await editor
      .put(`/api/shoots/${shoot.id}`)
      .set('If-Match', '"1"')
      .send({ ...DAY, shotOn: '2026-01-01', videoUrl: null })
      .expect(200);

    expect(changed.headers.etag).toBe('"2"');
    expect(changed.body).toMatchObject({ shotOn: '2026-01-01', videoUrl: null, version: 2 });
    const { body } = await editor.get('/api/shoots').expect(200);
    expect(body.shoots).toContainEqual(
      expect.objectContaining({ id: shoot.id, shotOn: '2026-01-01', cueCount: 0, recipeCount: 0 }),
    );
  });

  it('is not changed over the head of somebody else', async () => {
    const shoot = await makeShoot();
    const save = () => editor.put(`/api/shoots/${shoot.id}`).set('If-Match', '"1"').send(DAY);

    const answers = await Promise.all(Array.from({ length: 8 }, save));

    expect(answers.filter(({ status }) => status === 200)).toHaveLength(1);
    const refused = answers.filter(({ status }) => status === 412);
    expect(refused).toHaveLength(7);
    expect(refused[0]!.body).toMatchObject({ code: 'request.version_conflict', context: { version: 2 } });
  });

  it.each([
    [{ ...DAY, shotOn: '2026-02-30' }, 'shotOn'],
    [{ ...DAY, shotOn: '0000-01-01' }, 'shotOn'],
    [{ ...DAY, title: '  ' }, 'title'],
    [{ ...DAY, videoUrl: 'javascript:alert(1)' }, 'videoUrl'],
    [{ ...DAY, place: 'the yard' }, 'place'],
  ])('is refused at the field that is wrong: %j', async (draft, path) => {
    const { body } = await creator.post('/api/shoots').send(draft).expect(400);
    expect(body.faults).toMatchObject([{ path }]);
  });

  it('is closed to members and to visitors', async () => {
    const shoot = await makeShoot();
    const member = await api.as({});
    for (const path of ['', `/${shoot.id}`, `/${shoot.id}/draft`]) {
      await member.get(`/api/shoots${path}`).expect(403);
      await api.visitor().get(`/api/shoots${path}`).expect(401);
    }
    await upload(member, shoot, 'notes.vtt', WEBVTT).expect(403);
  });
});

describe('notes', () => {
  it('are read from WebVTT', async () => {
    const { body } = await upload(editor, await makeShoot(), 'gorse – take 2.vtt', WEBVTT).expect(200);

    expect(body.version).toBe(2);
    expect(body.notes).toMatchObject({ name: 'gorse – take 2.vtt', format: 'webvtt' });
    expect(body.notes.cues).toEqual([
      { index: 0, startMs: 1000, endMs: 4000, text: 'Two hundred grams of caster sugar' },
      { index: 1, startMs: 5500, endMs: 9000, text: 'and 250 ml water & a bay leaf' },
    ]);
  });

  it('are read from SubRip', async () => {
    const { body } = await upload(editor, await makeShoot(), 'gorse.srt', SUBRIP).expect(200);

    expect(body.notes).toMatchObject({ format: 'subrip' });
    expect(body.notes.cues).toMatchObject([
      { startMs: 62_500, endMs: 64_000, text: '50 ml gin' },
      { startMs: 65_000, text: 'stir for 30 seconds' },
    ]);
  });

  it('are read from pasted lines with times, and from prose', async () => {
    const shoot = await makeShoot();
    const timed = await paste(creator, shoot, '0:04 80 g gorse\n1:10 steep it overnight').expect(200);
    expect(timed.body.notes).toMatchObject({ format: 'timed-text', cues: [{ startMs: 4000 }, { startMs: 70_000 }] });

    const prose = await paste(creator, timed.body as ShootView, 'Steep the flowers.\n\nStrain.').expect(200);
    expect(prose.body.notes).toMatchObject({
      format: 'prose',
      cues: [
        { index: 0, startMs: null, text: 'Steep the flowers.' },
        { index: 1, startMs: null, text: 'Strain.' },
      ],
    });
  });

  it.each([
    ['a file of 0 bytes', 'empty.vtt', new Uint8Array(), 'empty'],
    ['blank space', 'blank.txt', Buffer.from(' \n\t\n'), 'empty'],
    ['a picture named as captions', 'still.vtt', Buffer.from('89504e470d0a1a0a0000000d49484452', 'hex'), 'not-text'],
    ['text in no encoding', 'notes.txt', Buffer.from([0x63, 0x61, 0x66, 0xe9, 0x20, 0xff]), 'not-text'],
    ['WebVTT without cues', 'notes.vtt', Buffer.from('WEBVTT\n\nNOTE nothing was said\n'), 'no-cues'],
    ['prose named as captions', 'notes.srt', Buffer.from('Dear Bryn, the notes are in the other file.'), 'no-cues'],
  ])('are refused where they are %s, and the old ones stay', async (_what, name, content, reason) => {
    const { body: shoot } = await upload(creator, await makeShoot(), 'gorse.vtt', WEBVTT).expect(200);

    const answer = await upload(creator, shoot as ShootView, name, content);

    expect(answer.status).toBe(422);
    expect(answer.body).toMatchObject({ code: 'shoots.notes_unreadable', context: { reason } });
    expect(answer.body.detail).toBeTruthy();
    expect(answer.body.faults).toEqual([{ path: 'notes', message: answer.body.detail }]);
    const { body: after } = await creator.get(`/api/shoots/${shoot.id as string}`).expect(200);
    expect(after).toEqual(shoot);
  });

  it('are refused above 10 MB, without a file, and with a character that is no text', async () => {
    const shoot = await makeShoot();
    const large = await upload(creator, shoot, 'long.txt', Buffer.alloc(10 * 1024 * 1024 + 1, 'a'));
    expect(large.status).toBe(413);
    expect(large.body.code).toBe('request.too_large');

    const none = await creator.put(`/api/shoots/${shoot.id}/notes`).set('If-Match', '"1"').field('other', 'x');
    expect(none.status).toBe(400);
    expect(none.body.faults).toMatchObject([{ path: 'notes' }]);

    const nul = await paste(creator, shoot, '0:01 gin\u0000');
    expect(nul.body).toMatchObject({ code: 'shoots.notes_unreadable', context: { reason: 'not-text' } });
  });

  it('are not replaced over the head of somebody else', async () => {
    const shoot = await makeShoot();
    await paste(creator, shoot, '0:04 80 g gorse').expect(200);
    await paste(editor, shoot, '0:04 90 g gorse').expect(412);
    const { body } = await editor.get(`/api/shoots/${shoot.id}`).expect(200);
    expect(body.notes.cues[0].text).toBe('80 g gorse');
  });
});

describe('the draft', () => {
  it('points every line and step at its cue, and begins a recipe of the shoot', async () => {
    const notes = '0:00 Bay syrup today\n0:10 200 g caster sugar\n0:20 250 ml water\n0:30 simmer it for 10 minutes';
    const { body: shoot } = await paste(creator, await makeShoot(), notes).expect(200);

    const { body } = await editor.get(`/api/shoots/${shoot.id as string}/draft`).expect(200);

    expect(body.draft.ingredients).toMatchObject([
      { larderId: 'caster-sugar', amount: { min: 200, max: 200 }, unit: 'g', cue: 1, at: 10_000 },
      { larderId: 'water', amount: { min: 250, max: 250 }, unit: 'ml', cue: 2, at: 20_000 },
    ]);
    expect(body.draft.gaps).toContainEqual(expect.objectContaining({ kind: 'yield' }));
    expect(body.document.sections[0].lines).toMatchObject([
      { larderId: 'caster-sugar', unit: 'g', source: { cue: 1, startMs: 10_000 } },
      { larderId: 'water', unit: 'ml', source: { cue: 2, startMs: 20_000 } },
    ]);
    const begun = await creator
      .post('/api/recipes')
      .send({ from: 'shoot', shootId: shoot.id, document: body.document })
      .expect(201);
    expect(begun.body).toMatchObject({ state: 'draft', shoot: { id: shoot.id, title: DAY.title } });
    const { body: after } = await creator.get(`/api/shoots/${shoot.id as string}`).expect(200);
    expect(after.recipes).toEqual([{ id: begun.body.id, title: begun.body.document.title, state: 'draft' }]);
  });

  it.each([
    ['an impossible temperature', '0:01 heat it to 5000 degrees'],
    ['a division by nothing', '0:01 add 1/0 cup of water'],
    ['a heading in brackets', '0:01 (LOW TIDE)'],
    ['a name without end', `0:01 5 g ${'verylong'.repeat(2000)}`],
    [
      'more steps than a recipe holds',
      Array.from({ length: 400 }, (_, at) => `${at}:00 stir for ${at + 1} minutes`).join('\n'),
    ],
  ])('still stands where the notes hold %s', async (_what, notes) => {
    const { body: shoot } = await paste(creator, await makeShoot(), notes).expect(200);

    const { body } = await editor.get(`/api/shoots/${shoot.id as string}/draft`).expect(200);

    await creator.post('/api/recipes').send({ from: 'shoot', shootId: shoot.id, document: body.document }).expect(201);
  });

  it('of a shoot without notes is a blank recipe named as the shoot', async () => {
    const shoot = await makeShoot();
    const { body } = await creator.get(`/api/shoots/${shoot.id}/draft`).expect(200);
    expect(body.draft.ingredients).toEqual([]);
    expect(body.document).toMatchObject({ title: DAY.title, steps: [] });
  });
});
