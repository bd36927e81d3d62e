import { mkdtemp, readdir, rm } from 'node:fs/promises';
import { request } from 'node:http';
import { tmpdir } from 'node:os';
import { createTransport, type SendMailOptions } from 'nodemailer';
import { afterEach, beforeEach, describe, expect, it } from 'vitest';
import { startCatcher, type RunningCatcher } from '../../../server/fakes/smtp/catcher.ts';
import type { Letter } from '../../../server/fakes/smtp/letter.ts';

let folder: string;
let catcher: RunningCatcher;

beforeEach(async () => {
  folder = await mkdtemp(`${tmpdir()}/letters-`);
  catcher = await startCatcher({ smtpPort: 0, httpPort: 0, folder });
});

afterEach(async () => {
  await catcher.close();
  await rm(folder, { recursive: true });
});

function api(path: string): string {
  return `http://127.0.0.1:${catcher.httpPort}${path}`;
}

async function letters(): Promise<Letter[]> {
  return (await (await fetch(api('/letters'))).json()) as Letter[];
}

async function post(fields: SendMailOptions): Promise<void> {
  const transport = createTransport({ host: '127.0.0.1', port: catcher.smtpPort });
  await transport.sendMail({ from: 'Press <press@demo.example>', to: 'reader@demo.example', ...fields });
  transport.close();
}

async function statusFor(host: string): Promise<number | undefined> {
  return new Promise((resolve, reject) => {
    const asked = request(api('/letters'), { headers: { host } }, (answer) => {
      answer.resume();
      resolve(answer.statusCode);
    });
    asked.on('error', reject);
    asked.end();
  });
}

describe('the mail catcher', () => {
  it('keeps what nodemailer sends and lists it newest first', async () => {
    await post({ subject: 'First', text: 'One.' });
    await post({ subject: 'Élan – second', text: 'Two.', html: '<p>Two.</p>', bcc: 'hidden@demo.example' });

    const [newest, oldest] = await letters();
    expect(newest).toMatchObject({
      from: '"Press" <press@demo.example>',
      to: ['reader@demo.example', 'hidden@demo.example'],
      subject: 'Élan – second',
      html: '<p>Two.</p>',
    });
    expect(newest?.text.trim()).toBe('Two.');
    expect(oldest?.subject).toBe('First');
    expect(new Date(newest?.at ?? '').toISOString()).toBe(newest?.at);
  });

  it('lists the links of both bodies once, without the full stop behind them', async () => {
    await post({
      subject: 'Links',
      text: 'Confirm at http://127.0.0.1:3000/verify?token=a&to=b. Or write.',
      html: '<a href="http://127.0.0.1:3000/verify?token=a&amp;to=b">Confirm</a> <a href="https://demo.example/x">x</a>',
    });

    expect((await letters())[0]?.links).toEqual([
      'http://127.0.0.1:3000/verify?token=a&to=b',
      'https://demo.example/x',
    ]);
  });

  it('finds one letter by its id and answers 404 for none', async () => {
    await post({ subject: 'Only', text: 'x' });
    const [letter] = await letters();

    expect(await (await fetch(api(`/letters/${letter?.id ?? ''}`))).json()).toEqual(letter);
    expect((await fetch(api('/letters/..%2f..%2fetc%2fpasswd'))).status).toBe(404);
    expect((await fetch(api('/letters/1234567890123-abcdefabcdef'))).status).toBe(404);
  });

  it('keeps letters over a restart and forgets them when asked', async () => {
    await post({ subject: 'Stays', text: 'x' });
    await catcher.close();
    catcher = await startCatcher({ smtpPort: 0, httpPort: 0, folder });
    expect(await letters()).toHaveLength(1);

    expect((await fetch(api('/letters'), { method: 'DELETE' })).status).toBe(204);
    expect(await letters()).toEqual([]);
    expect(await readdir(folder)).toEqual([]);
  });

  it('answers this machine only', async () => {
    expect(await statusFor(`127.0.0.1:${catcher.httpPort}`)).toBe(200);
    expect(await statusFor('localhost')).toBe(200);
    expect(await statusFor('letters.demo.example')).toBe(421);
  });
});
