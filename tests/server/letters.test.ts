import { mkdtemp, rm } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { pino } from 'pino';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { startCatcher, type RunningCatcher } from '../../server/fakes/smtp/catcher.ts';
import { composeLetter } from '../../server/letters/compose.ts';
import type { LetterFields, LetterKind } from '../../server/letters/letter-kinds.ts';
import { queueLetter } from '../../server/letters/letters.ts';
import { sendLetter } from '../../server/letters/send-letter.job.ts';
import { formatsOf } from '../../server/letters/words/formats.ts';
import { openMailer } from '../../server/mail/mailer.ts';
import type { CaughtLetter } from '../../shared/contracts/letters.ts';
import { useApi } from '../support/api.ts';
import { runJobs } from '../support/jobs.ts';

let catcher: RunningCatcher;
let folder: string;
const env: Record<string, string> = { MODE: 'demo', LETTERS_FROM: 'press@house.example' };
beforeAll(async () => {
  folder = await mkdtemp(join(tmpdir(), 'steep-letters-'));
  catcher = await startCatcher({ smtpPort: 0, httpPort: 0, folder });
  env['SMTP_URL'] = `smtp://127.0.0.1:${catcher.smtpPort}`;
  env['LETTERS_URL'] = `http://127.0.0.1:${catcher.httpPort}`;
});
const house = useApi(env, { log: pino({ level: 'silent' }) });
afterAll(async () => {
  await catcher.close();
  await rm(folder, { recursive: true, force: true });
});

interface Caught extends CaughtLetter {
  from: string;
  html: string;
}

async function caught(to: string): Promise<Caught[]> {
  const letters = (await (await fetch(`${env['LETTERS_URL']}/letters`)).json()) as Caught[];
  return letters.filter((letter) => letter.to.includes(to));
}

const receipt: LetterFields['receipt'] = {
  name: 'Ada',
  number: 'SB-0001',
  amount: 1250,
  currency: 'GBP',
  tierName: 'Paperbound',
  paidAt: '2026-06-30T23:30:00.000Z',
  href: 'https://pay.example/receipt?a=1&b=2',
};

describe('a letter', () => {
  it('goes out after its transaction, from the imprint, with money and days as the imprint writes them', async () => {
    await house.db('imprint').update({ name: 'Ebbfold “Press”', zone: 'Europe/London' });
    const to = 'ada@house.example';
    await house.db.transaction((trx) => queueLetter(trx, { kind: 'receipt', to, personId: null, fields: receipt }));
    await runJobs(house);

    const [letter] = await caught(to);
    expect(letter!.from).toContain('Ebbfold “Press”');
    expect(letter!.from).toContain('press@house.example');
    expect(letter!.subject).toBe('Receipt SB-0001 from Ebbfold “Press”');
    // Half past eleven in the evening by UTC is the next day in London's summer.
    expect(letter!.text).toContain('You paid £12.50 for Paperbound on 1 July 2026.');
    expect(letter!.links).toEqual([receipt.href]);
    expect((await house.db('letters').where({ recipient: to }).first())!.sent_at).not.toBeNull();
  });

  it('is not sent when its transaction is undone', async () => {
    const to = 'nobody@house.example';
    const undone = house.db.transaction(async (trx) => {
      await queueLetter(trx, { kind: 'receipt', to, personId: null, fields: receipt });
      throw new Error('undone');
    });
    await expect(undone).rejects.toThrow('undone');
    await runJobs(house);
    expect(await caught(to)).toEqual([]);
  });

  it('is sent once by a job that runs again, and by two that run at once', async () => {
    const to = 'once@house.example';
    await queueLetter(house.db, { kind: 'receipt', to, personId: null, fields: receipt });
    const { id } = (await house.db('letters').where({ recipient: to }).first())!;
    await Promise.all([sendLetter(house.ctx, { letterId: id }), sendLetter(house.ctx, { letterId: id })]);
    await runJobs(house);
    expect(await caught(to)).toHaveLength(1);
  });

  it('with the key of one that was written already is not written', async () => {
    const to = 'key@house.example';
    for (let times = 0; times < 2; times += 1)
      await queueLetter(house.db, { kind: 'receipt', to, personId: null, fields: receipt, dedupeKey: 'receipt:in_1' });
    await runJobs(house);
    expect(await caught(to)).toHaveLength(1);
  });

  it('waits for a mail server that is away', async () => {
    const to = 'later@house.example';
    await queueLetter(house.db, { kind: 'receipt', to, personId: null, fields: receipt });
    const mail = openMailer({ ...house.ctx.settings.mail, url: 'smtp://127.0.0.1:9' });
    await runJobs({ ctx: { ...house.ctx, mail }, url: house.url });
    expect((await house.db('letters').where({ recipient: to }).first())!.sent_at).toBeNull();

    await house.db.raw('update graphile_worker._private_jobs set run_at = now()');
    await runJobs(house);
    expect(await caught(to)).toHaveLength(1);
  });

  it('takes what people typed as words, never as markup, headers or other receivers', async () => {
    const to = 'quoted@house.example';
    const fields = { name: '<b>Ada</b>\r\nBcc: spy@house.example', link: 'https://house.example/verify?token=a&b="c"' };
    await queueLetter(house.db, { kind: 'verify', to, personId: null, fields });
    await runJobs(house);
    const [letter] = await caught(to);
    expect(letter!.to).toEqual([to]);
    expect(letter!.html).toContain('&lt;b&gt;Ada&lt;/b&gt;');
    expect(letter!.html).toContain('href="https://house.example/verify?token=a&amp;b=&quot;c&quot;"');
    expect(await caught('spy@house.example')).toEqual([]);
  });
});

describe('the words', () => {
  const formats = formatsOf({ name: 'Ebbfold Press', zone: 'Europe/London' });
  const name = 'Ada';
  const link = 'https://house.example/somewhere';
  const endsAt = '2026-12-01T12:00:00.000Z';
  const all: { [K in LetterKind]: { fields: LetterFields[K]; says: string[] } } = {
    verify: { fields: { name, link }, says: [link] },
    reset: { fields: { name, link }, says: [link] },
    'email-change': { fields: { name, link, newEmail: 'new@house.example' }, says: [link, 'new@house.example'] },
    'email-changing': { fields: { name, newEmail: 'new@house.example' }, says: ['new@house.example'] },
    'email-changed': {
      fields: { name, oldEmail: 'old@house.example', newEmail: 'new@house.example' },
      says: ['old@house.example', 'new@house.example'],
    },
    receipt: { fields: { ...receipt, href: null }, says: ['£12.50', 'Paperbound', 'SB-0001', '1 July 2026'] },
    cancelled: { fields: { name, tierName: 'Sewn', endsAt }, says: ['Sewn', '1 December 2026'] },
    'payment-failed': { fields: { name, tierName: 'Sewn', link }, says: ['Sewn', link] },
  };

  it.each(Object.entries(all))('of %s say what the kind is about in both forms', (kind, { fields, says }) => {
    const letter = composeLetter(kind as LetterKind, fields, formats);
    expect(letter.subject).toContain('Ebbfold Press');
    expect(letter.text).toContain('Hello Ada,');
    for (const words of says) {
      expect(letter.text).toContain(words);
      expect(letter.html).toContain(words);
    }
  });

  it.each([
    // ISO 4217: two minor digits for the pound, none for the yen.
    { amount: 400, currency: 'GBP', written: '£4.00' },
    { amount: 123456, currency: 'EUR', written: '€1,234.56' },
    { amount: 400, currency: 'JPY', written: 'JP¥400' },
  ])('write $amount minor units of $currency as $written', ({ amount, currency, written }) => {
    expect(formats.money(amount, currency)).toBe(written);
  });
});

describe('the page of caught letters', () => {
  it('shows them to this machine in the demonstration', async () => {
    const to = 'page@house.example';
    await queueLetter(house.db, { kind: 'receipt', to, personId: null, fields: receipt });
    await runJobs(house);
    const { body } = await house.visitor().get('/api/demo/letters').expect(200);
    expect(body.letters[0]).toEqual({
      ...{ id: expect.any(String), at: expect.any(String), to: [to] },
      ...{ subject: expect.stringContaining('Receipt'), text: expect.any(String), links: [receipt.href] },
    });
  });
});
