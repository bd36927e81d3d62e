import type { ShootReading, ShootView } from '../../shared/contracts/shoots.ts';
import { decodeNotes, type NotesRefusal } from '../../shared/notes/decode-notes.ts';
import { draftToDocument } from '../../shared/notes/draft-to-document.ts';
import { extractDraft } from '../../shared/notes/extract-draft.ts';
import { readNotes, type Notes } from '../../shared/notes/read-notes.ts';
import type { AppContext } from '../context.ts';
import { findLarder } from '../larder/larder.queries.ts';
import { notesUnreadable } from './shoots.errors.ts';
import { changeShoot, readShootRow } from './shoots.service.ts';

interface Brought {
  /** The file's name; of pasted notes their own. */
  name: string;
  bytes: Uint8Array;
}

/** Replaces a shoot's notes; notes that cannot be read are refused and the old ones stay. */
export async function keepNotes(
  { db }: AppContext,
  { id, expected, notes: { name, bytes } }: { id: string; expected: number; notes: Brought },
): Promise<ShootView> {
  const { text, notes } = await readBrought({ name, bytes });
  return changeShoot(db, {
    id,
    expected,
    values: {
      notes_name: name.slice(0, 200),
      notes_text: text,
      notes_format: notes.format,
      cues: notes.cues,
      warnings: notes.warnings,
    },
  });
}

async function readBrought({ name, bytes }: Brought): Promise<{ text: string; notes: Notes }> {
  const decoded = decodeNotes(bytes);
  if (!decoded.ok) throw unreadable(decoded.reason);
  const notes = await readNotes(decoded.text);
  if (!notes.ok) throw unreadable(notes.reason);
  // Whoever names a file so brings captions, and would wonder at their lines without times.
  if (notes.format === 'prose' && /\.(vtt|srt)$/i.test(name)) throw unreadable('no-cues');
  return { text: decoded.text, notes };
}

const REASONS: Readonly<Record<NotesRefusal, string>> = {
  empty: 'There is nothing in them.',
  'not-text': 'This is not text. Bring WebVTT or SRT captions, or a text file in UTF-8.',
  'no-cues': 'They look like captions, but no cue with a time could be found in them.',
};

function unreadable(reason: NotesRefusal) {
  const message = REASONS[reason];
  return notesUnreadable({ detail: message, faults: [{ path: 'notes', message }], context: { reason } });
}

/** What the reader makes of a shoot's notes today, with the larder as its vocabulary. */
export async function readDraft({ db }: AppContext, id: string): Promise<ShootReading> {
  const shoot = await readShootRow(db, id);
  const draft = extractDraft(shoot.cues, await findLarder(db));
  const title = draft.title.trim().slice(0, 160) || shoot.title;
  return { draft, document: draftToDocument(draft, { title, kind: draft.kind }) };
}
