import express, { Router, type Request, type RequestHandler, type Response } from 'express';
import { z } from 'zod';
import type { AppContext } from '../context.ts';
import { checkAccess } from './access.ts';
import { FileAnswer } from './file-answer.ts';
import { preconditionRequired, requestInvalid, unsupportedType } from './http.errors.ts';
import { parse } from './parse.ts';
import { ACCESS_RULES, type Route } from './registry.ts';
import { sendFile } from './send-file.ts';
import { viewerOf } from './viewer.ts';
import { WrittenAnswer } from './written-answer.ts';

const nothing = z.object({});

/** Mounts every route; one without a known rule, or a second one at the same place, stops the start. */
export function mountRoutes(routes: readonly Route[], ctx: AppContext): Router {
  const router = Router();
  const seen = new Set<string>();
  for (const route of routes) {
    const place = `${route.method} ${route.path.replace(/:\w+/g, ':')}`;
    if (!ACCESS_RULES.includes(route.access)) throw new Error(`Route ${route.id} states no access rule.`);
    if (seen.has(route.id)) throw new Error(`Two routes are named ${route.id}.`);
    if (seen.has(place)) throw new Error(`Route ${route.id} stands where another one stands: ${place}.`);
    seen.add(place).add(route.id);
    router[route.method](route.path, ...chainOf(route, ctx));
  }
  return router;
}

function chainOf(route: Route, ctx: AppContext): RequestHandler[] {
  // Access comes before any body is read: a stranger's upload is refused unread.
  const guard: RequestHandler = (request, _response, next) => {
    checkAccess(route.access, request, ctx);
    next();
  };
  return [guard, ...bodyReaders(route), handle(route, ctx)];
}

function bodyReaders(route: Route): RequestHandler[] {
  if (route.rawBody) return [express.raw({ type: () => true, limit: '1mb' })];
  if (route.upload) return [route.upload];
  if (route.body) return [express.json({ limit: route.bodyLimit ?? 1_048_576 })];
  return [];
}

function handle(route: Route, ctx: AppContext): RequestHandler {
  return async (request, response) => {
    const answer = await route.handler({
      ctx,
      viewer: viewerOf(request),
      params: parse(route.params ?? nothing, request.params),
      query: parse(route.query ?? nothing, request.query),
      body: readBody(route, request),
      expected: route.versioned === 'required' ? expectedVersion(request) : 0,
      files: Array.isArray(request.files) ? request.files : [],
      request,
      session: request.session,
    });
    if (answer instanceof FileAnswer) await sendFile(answer, request, response);
    else send(route, answer, response);
  };
}

function readBody(route: Route, request: Request): unknown {
  if (!route.body || route.upload || route.rawBody) return request.body;
  if (request.body === undefined) {
    if (request.get('content-type')) throw unsupportedType();
    throw requestInvalid({ faults: [{ path: '', message: 'The request has no body.' }] });
  }
  return parse(route.body, request.body);
}

/** Cuts the answer to its contract, so that a new column cannot leak. */
function send(route: Route, value: unknown, response: Response): void {
  if (route.answer === 'file') throw new Error(`Route ${route.id} answers bytes.`);
  response.status(route.status ?? 200).set('Cache-Control', 'private, no-store');
  if (value instanceof WrittenAnswer) {
    response.type('json').send(value.bytes);
    return;
  }
  const body = route.answer.parse(value);
  if (route.versioned && hasVersion(body)) response.set('ETag', `"${body.version}"`);
  response.json(body);
}

function hasVersion(body: unknown): body is { version: number } {
  return typeof body === 'object' && body !== null && 'version' in body && typeof body.version === 'number';
}

function expectedVersion(request: Request): number {
  const match = /^(?:W\/)?"(\d+)"$/.exec(request.get('if-match') ?? '');
  if (!match) throw preconditionRequired();
  return Number(match[1]);
}
