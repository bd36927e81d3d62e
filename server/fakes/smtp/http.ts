import express, { type Express, type NextFunction, type Request, type Response } from 'express';
import type { LetterStore } from './letter-store.ts';

const LOOPBACK = new Set(['127.0.0.1', 'localhost', '[::1]']);

/** Hands out caught letters as JSON, to this machine only. */
export function letterApp(store: LetterStore): Express {
  const app = express();
  app.disable('x-powered-by');
  // A page of the web that resolves its own name to this machine reads nobody's letters.
  app.use((req, res, next) => {
    if (LOOPBACK.has((req.get('host') ?? '').replace(/:\d+$/, ''))) return next();
    res.status(421).json({ error: 'The mail catcher answers this machine only.' });
  });
  app.get('/healthz', (_req, res) => void res.json({ ok: true }));
  app.get('/letters', async (_req, res) => void res.json(await store.list()));
  app.get('/letters/:id', async (req, res) => {
    const letter = await store.find(req.params.id);
    if (letter) res.json(letter);
    else res.status(404).json({ error: 'There is no such letter.' });
  });
  app.delete('/letters', async (_req, res) => {
    await store.clear();
    res.status(204).end();
  });
  app.use((_req, res) => void res.status(404).json({ error: 'The mail catcher has no such address.' }));
  app.use((error: unknown, _req: Request, res: Response, _next: NextFunction) => {
    process.stderr.write(`mail catcher: ${error instanceof Error ? (error.stack ?? error.message) : String(error)}\n`);
    res.status(500).json({ error: 'The mail catcher failed; see its log.' });
  });
  return app;
}
