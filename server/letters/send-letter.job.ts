import type { AppContext } from '../context.ts';
import { readImprint } from '../imprint/imprint.queries.ts';
import { composeLetter } from './compose.ts';
import { formatsOf } from './words/formats.ts';

/** Sends a letter that waits. Holding its row makes a second run wait, and then find it sent. */
export async function sendLetter({ db, mail, now }: AppContext, { letterId }: { letterId: string }): Promise<void> {
  await db.transaction(async (trx) => {
    const letter = await trx('letters').where({ id: letterId, sent_at: null }).forUpdate().first();
    if (!letter) return;
    const imprint = await readImprint(trx);
    const { subject, text, html } = composeLetter(letter.kind, letter.fields, formatsOf(imprint));
    await mail.send({ id: letter.id, senderName: imprint.name, to: letter.recipient, subject, text, html });
    await trx('letters').where({ id: letter.id }).update({ sent_at: now() });
  });
}
