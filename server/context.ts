import type { Knex } from 'knex';
import { pino, type Logger } from 'pino';
import { openDatabase } from './db/connection.ts';
import { openFileStore, type FileStore } from './files/file-store.ts';
import { openMailer, type Mailer } from './mail/mailer.ts';
import { openStripe, type StripeClient } from './payments/stripe-client.ts';
import { keepWrittenPages, type WrittenPages } from './reading/written-pages.ts';
import type { Settings } from './settings.ts';

/** What every feature is handed: the only place where things that live as long as the process are made. */
export interface AppContext {
  settings: Settings;
  db: Knex;
  log: Logger;
  files: FileStore;
  stripe: StripeClient;
  mail: Mailer;
  pages: WrittenPages;
  /** The one clock. */
  now: () => Date;
}

/** A demonstration runs in somebody's terminal, where its address must stay in sight. */
const LOG_LEVELS: Readonly<Record<Settings['mode'], string>> = { production: 'info', demo: 'warn', test: 'silent' };

/** Makes the context; `close` gives everything back. */
export function makeContext(settings: Settings, overrides: Partial<AppContext> = {}): AppContext {
  return {
    settings,
    db: overrides.db ?? openDatabase(settings.database.url),
    log: overrides.log ?? pino({ level: LOG_LEVELS[settings.mode] }, pino.destination(2)),
    files: overrides.files ?? openFileStore(settings.dataDir),
    stripe: overrides.stripe ?? openStripe(settings.stripe),
    mail: overrides.mail ?? openMailer(settings.mail),
    pages: overrides.pages ?? keepWrittenPages(),
    now: overrides.now ?? (() => new Date()),
  };
}
