import type { Access } from '../../shared/contracts/access.ts';

export interface BookRow {
  id: string;
  slug: string;
  title: string;
  subtitle: string;
  access: Access;
  cover_plate_id: string | null;
  version: number;
  created_at: Date;
}

export interface ChapterRow {
  id: string;
  book_id: string;
  position: number;
  title: string;
  introduction: string;
  access: Access | null;
  version: number;
  created_at: Date;
}

export interface PlacementRow {
  book_id: string;
  chapter_id: string;
  recipe_id: string;
  position: number;
  access: Access | null;
}

declare module 'knex/types/tables.js' {
  interface Tables {
    books: BookRow;
    chapters: ChapterRow;
    placements: PlacementRow;
  }
}
