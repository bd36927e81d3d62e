import express, { Router, type NextFunction, type Request, type Response } from 'express';
import { API_ROUTES } from './api-routes.ts';
import { Fault, invalid } from './errors.ts';
import { expand } from './expand.ts';
import { injectFaults } from './faults.ts';
import { claimKey, releaseKey, rememberAnswer, type RememberedAnswer } from './idempotency.ts';
import { newId } from './ids.ts';
import { complain } from './log.ts';
import { check, parseForm } from './params.ts';
import type { PathParts, Route } from './route.ts';
import { inTurn, reading, type Service } from './service.ts';
import type { Work } from './work.ts';

function requireKey(req: Request, _res: Response, next: NextFunction): void {
  const key = /^Bearer (.+)$/.exec(req.get('authorization') ?? '')?.[1];
  if (!key) throw new Fault(401, { type: 'invalid_request_error', message: 'You did not provide an API key.' });
  if (!/^(sk|rk)_test_/.test(key)) {
    throw new Fault(401, {
      type: 'invalid_request_error',
      code: 'api_key_expired',
      message: 'The local payment fake takes test keys only (sk_test_…).',
    });
  }
  next();
}

function inputOf(req: Request): unknown {
  const query = parseForm(req.originalUrl.split('?')[1] ?? '');
  const body = typeof req.body === 'string' ? parseForm(req.body) : {};
  return { ...(query as object), ...(body as object) };
}

function answerTo(fault: Fault): RememberedAnswer {
  return { status: fault.status, body: { error: fault.body } };
}

/** Acts a call out; a refusal that keeps its state is an answer, any other undoes everything. */
async function perform(work: Work, route: Route, req: Request, params: { expand?: string[] | undefined }) {
  const path = req.originalUrl.split('?')[0] ?? '';
  try {
    const { expand: paths, ...rest } = params;
    const body = await route.handle(work, rest as never, req.params as PathParts, path);
    return { status: 200, body: await expand(work.db, body, paths) };
  } catch (error) {
    if (error instanceof Fault && error.keepsState) return answerTo(error);
    throw error;
  }
}

async function performOnce(service: Service, route: Route, req: Request, requestId: string) {
  const params = check(route.params, inputOf(req));
  const key = req.method === 'POST' ? (req.get('idempotency-key') ?? null) : null;
  const request = { id: requestId, idempotency_key: key };
  if (route.method === 'get') {
    return { ...(await reading(service, request, (work) => perform(work, route, req, params))), replayed: false };
  }
  if (key === null)
    return { ...(await inTurn(service, request, (work) => perform(work, route, req, params))), replayed: false };

  const before = await claimKey(service.db, key, req.originalUrl, String(req.body));
  if (before) return { ...before, replayed: true };
  try {
    const answer = await inTurn(service, request, async (work) => {
      const done = await perform(work, route, req, params);
      await rememberAnswer(work.db, key, done);
      return done;
    });
    return { ...answer, replayed: false };
  } catch (error) {
    await releaseKey(service.db, key);
    throw error;
  }
}

function refuse(error: unknown, _req: Request, res: Response, _next: NextFunction): void {
  if (error instanceof Fault) {
    res.status(error.status).set(error.headers).json(answerTo(error).body);
    return;
  }
  complain('request', error);
  res.status(500).json({ error: { type: 'api_error', message: 'The payment fake failed; see its log.' } });
}

/** The API below `/v1`: form bodies, test keys, remembered answers, and every refusal as `{ error }`. */
export function apiRouter(service: Service): Router {
  const router = Router();
  router.use((_req, res, next) => {
    res.set('request-id', newId('req', 14));
    next();
  });
  router.use(express.text({ type: () => true, limit: '1mb' }));
  router.use(requireKey);
  router.use(injectFaults(service));

  for (const route of API_ROUTES) {
    router[route.method](route.path, async (req, res) => {
      const { status, body, replayed } = await performOnce(service, route, req, String(res.get('request-id')));
      if (replayed) res.set('idempotent-replayed', 'true');
      res.status(status).json(body);
      if (route.path.endsWith('/advance')) service.tickSoon();
    });
  }
  router.use((req) => {
    throw new Fault(
      404,
      invalid(`Unrecognized request URL (${req.method}: ${req.originalUrl.split('?')[0] ?? ''}).`).body,
    );
  });
  router.use(refuse);
  return router;
}
