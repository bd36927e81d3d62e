import { readFile } from 'node:fs/promises';
import { LARDER } from '../../shared/larder/index.ts';
import { decodeNotes, type NotesRefusal } from '../../shared/notes/decode-notes.ts';
import { toDraftJson } from '../../shared/notes/draft-json.ts';
import { extractDraft } from '../../shared/notes/extract-draft.ts';
import { readNotes } from '../../shared/notes/read-notes.ts';

const REFUSALS: Readonly<Record<NotesRefusal, string>> = {
  empty: 'there is nothing in it.',
  'not-text': 'it is not text in UTF-8 or UTF-16.',
  'no-cues': 'it looks like captions, but no cue with a time and words could be found.',
};

/** Prints the draft of a notes file as JSON: `npm run --silent extract -- FILE`. */
async function main(): Promise<void> {
  const [file] = process.argv.slice(2);
  if (!file) throw new Error('Name the notes file: npm run --silent extract -- FILE');
  const decoded = decodeNotes(await readFile(file));
  if (!decoded.ok) throw new Error(`${file} cannot be read: ${REFUSALS[decoded.reason]}`);
  const notes = await readNotes(decoded.text);
  if (!notes.ok) throw new Error(`${file} cannot be read: ${REFUSALS[notes.reason]}`);
  process.stdout.write(`${JSON.stringify(toDraftJson(extractDraft(notes.cues, LARDER)), null, 2)}\n`);
}

main().catch((error: unknown) => {
  process.stderr.write(`${error instanceof Error ? error.message : String(error)}\n`);
  process.exit(1);
});
