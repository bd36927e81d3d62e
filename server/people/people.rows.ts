import type { Role } from '../../shared/contracts/words.ts';

export interface PersonRow {
  id: string;
  email: string;
  name: string;
  password_hash: string;
  verified_at: Date | null;
  roles: Role[];
  age_confirmed_at: Date | null;
  version: number;
  created_at: Date;
}

export interface PersonTokenRow {
  token_hash: string;
  person_id: string;
  purpose: 'verify' | 'reset' | 'change-email';
  new_email: string | null;
  expires_at: Date;
  created_at: Date;
}

declare module 'knex/types/tables.js' {
  interface Tables {
    people: PersonRow;
    people_tokens: PersonTokenRow;
  }
}
