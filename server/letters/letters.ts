import type { Knex } from 'knex';
import { addJob } from '../jobs/queue.ts';
import type { LetterFields, LetterKind } from './letter-kinds.ts';

interface LetterDraft<K extends LetterKind> {
  kind: K;
  to: string;
  personId: string | null;
  fields: LetterFields[K];
  /** A second letter with the same key is not written. */
  dedupeKey?: string;
}

declare module 'knex/types/tables.js' {
  interface Tables {
    letters: LetterRow;
  }
}

export interface LetterRow {
  id: string;
  kind: LetterKind;
  dedupe_key: string | null;
  person_id: string | null;
  recipient: string;
  fields: LetterFields[LetterKind];
  created_at: Date;
  sent_at: Date | null;
}

/** Writes a letter in the caller's transaction; it is sent after the transaction commits, and not otherwise. */
export async function queueLetter<K extends LetterKind>(db: Knex, draft: LetterDraft<K>): Promise<void> {
  const [row] = await db('letters')
    .insert({
      kind: draft.kind,
      recipient: draft.to,
      person_id: draft.personId,
      fields: draft.fields,
      dedupe_key: draft.dedupeKey ?? null,
    })
    .onConflict('dedupe_key')
    .ignore()
    .returning('id');
  if (row) await addJob(db, 'send-letter', { letterId: row.id }, { maxAttempts: 12 });
}
