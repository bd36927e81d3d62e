import type { Knex } from 'knex';
import { readNotes } from '../../shared/notes/read-notes.ts';
import type { DemoShoot } from '../content/content.ts';

/** The shoots with their notes read; their ids by slug. */
export async function seedShoots(
  db: Knex,
  shoots: readonly DemoShoot[],
  creatorId: string,
): Promise<Map<string, string>> {
  const ids = new Map<string, string>();
  for (const { slug, title, date, videoUrl, notesName, notesText } of shoots) {
    const notes = await readNotes(notesText);
    if (!notes.ok) throw new Error(`The notes ${notesName} of the content cannot be read: ${notes.reason}.`);
    const [row] = await db('shoots')
      .insert({
        title,
        shot_on: date,
        video_url: videoUrl,
        notes_name: notesName,
        notes_text: notesText,
        notes_format: notes.format,
        cues: JSON.stringify(notes.cues) as never,
        warnings: JSON.stringify(notes.warnings) as never,
        created_by: creatorId,
      })
      .returning('id');
    ids.set(slug, row!.id);
  }
  return ids;
}
