import { existsSync } from 'node:fs';
import { resolve } from 'node:path';
import express, { Router } from 'express';
import { requestNotFound } from './http.errors.ts';

const YEAR = 365 * 24 * 60 * 60;

/** Serves the built client; every address that is no file is one of its pages. */
export function serveClient(folder = resolve('dist/client')): Router {
  const router = Router();
  router.use('/assets', express.static(resolve(folder, 'assets'), { immutable: true, maxAge: YEAR * 1000 }));
  router.use(express.static(folder, { index: false, maxAge: 0 }));
  router.get('/{*page}', (request, response) => {
    const page = resolve(folder, 'index.html');
    if (/\.[a-z0-9]+$/i.test(request.path) || !existsSync(page)) throw requestNotFound();
    response.set('Cache-Control', 'no-cache').sendFile(page);
  });
  return router;
}
