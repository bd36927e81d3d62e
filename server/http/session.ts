import connectPgSimple from 'connect-pg-simple';
import type { RequestHandler } from 'express';
import session from 'express-session';
import pg from 'pg';
import type { AppContext } from '../context.ts';

const PgStore = connectPgSimple(session);
const THIRTY_DAYS = 30 * 24 * 60 * 60;

declare module 'express-session' {
  interface SessionData {
    /** Said by a visitor who has no account to remember it. */
    ageConfirmed?: boolean;
  }
}

/** Sessions in PostgreSQL. Their end is fixed at sign-in, so that reading writes nothing. */
export function openSessions({ settings, log }: AppContext): {
  middleware: RequestHandler;
  close: () => Promise<void>;
} {
  const pool = new pg.Pool({ connectionString: settings.database.url, max: 5, connectionTimeoutMillis: 5000 });
  pool.on('error', (error) => log.warn({ err: error }, 'a session connection was lost'));
  const store = new PgStore({
    pool,
    tableName: 'sessions',
    ttl: THIRTY_DAYS,
    disableTouch: true,
    pruneSessionInterval: 60 * 60,
    errorLog: (...details: unknown[]) => log.warn({ details }, 'sessions'),
  });
  const middleware = session({
    store,
    name: 'steep',
    secret: settings.session.secret,
    resave: false,
    saveUninitialized: false,
    proxy: settings.secureCookies,
    cookie: { httpOnly: true, sameSite: 'lax', secure: settings.secureCookies, maxAge: THIRTY_DAYS * 1000, path: '/' },
  });
  return {
    middleware,
    close: async () => {
      store.close();
      await pool.end();
    },
  };
}
