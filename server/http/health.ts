import type { RequestHandler } from 'express';
import type { AppContext } from '../context.ts';

/** 200 once the database answers and no migration is waiting, else 503. */
export function healthRoute({ db, log }: AppContext): RequestHandler {
  return async (_request, response) => {
    response.set('Cache-Control', 'no-store');
    try {
      const [, waiting] = (await db.migrate.list()) as [unknown[], unknown[]];
      const ready = waiting.length === 0;
      response.status(ready ? 200 : 503).json({ ready, waitingMigrations: waiting.length });
    } catch (error) {
      log.warn({ err: error }, 'not ready');
      response.status(503).json({ ready: false });
    }
  };
}
