import type { NotesFormat, ShootCue } from '../../shared/contracts/shoots.ts';

export interface ShootRow {
  id: string;
  title: string;
  /** ISO 8601; read as text, since the driver would make it an instant of this machine's zone. */
  shot_on: string;
  video_url: string | null;
  notes_name: string | null;
  /** What was brought, as it was. */
  notes_text: string | null;
  notes_format: NotesFormat | null;
  cues: ShootCue[];
  warnings: string[];
  version: number;
  created_by: string;
  created_at: Date;
}

declare module 'knex/types/tables.js' {
  interface Tables {
    shoots: ShootRow;
  }
}
