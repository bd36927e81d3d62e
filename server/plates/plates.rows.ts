import type { PlateView, Rendition } from '../../shared/contracts/plates.ts';

export interface PlateRow {
  id: string;
  original_hash: string;
  original_name: string;
  alt: string;
  caption: string;
  credit: string;
  width: number;
  height: number;
  state: PlateView['state'];
  renditions: Rendition[];
  shoot_id: string | null;
  version: number;
  created_by: string;
  created_at: Date;
}

declare module 'knex/types/tables.js' {
  interface Tables {
    plates: PlateRow;
  }
}
