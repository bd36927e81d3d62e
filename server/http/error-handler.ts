import type { ErrorRequestHandler, Request } from 'express';
import multer from 'multer';
import type { Logger } from 'pino';
import type { Problem } from '../../shared/contracts/errors.ts';
import { Refusal } from '../errors.ts';
import { requestInvalid, requestTooLarge, serverFailed, serverUnready } from './http.errors.ts';

/** Answers every failure as problem details (RFC 9457); an unknown one is logged whole and told nothing of. */
export function errorHandler(log: Logger): ErrorRequestHandler {
  return (error: unknown, request, response, next) => {
    const refusal = toRefusal(error);
    if (refusal.status >= 500) log.error({ err: error, method: request.method, path: request.path }, 'request failed');
    if (response.headersSent) {
      next(error);
      return;
    }
    response
      .status(refusal.status)
      .set({ 'Content-Type': 'application/problem+json', 'Cache-Control': 'no-store', ...refusal.details.headers })
      .send(JSON.stringify(toProblem(refusal, request)));
  };
}

function toProblem({ code, status, message, details }: Refusal, request: Request): Problem {
  return {
    type: `urn:steep-and-bind:problem:${code}`,
    title: message,
    status,
    code,
    instance: request.path,
    ...(details.detail === undefined ? {} : { detail: details.detail }),
    ...(details.faults === undefined ? {} : { faults: details.faults }),
    ...(details.context === undefined ? {} : { context: details.context }),
  };
}

function toRefusal(error: unknown): Refusal {
  if (error instanceof Refusal) return error;
  if (error instanceof multer.MulterError) {
    if (error.code === 'LIMIT_FILE_SIZE') return requestTooLarge({ detail: 'The file is too large.' }, error);
    return requestInvalid({ detail: error.message }, error);
  }
  if (isHttpError(error)) {
    if (error.status === 413) return requestTooLarge({}, error);
    if (error.status < 500) return requestInvalid({ detail: 'The body could not be read.' }, error);
  }
  if (isUnstorable(error)) return requestInvalid({ detail: 'A text holds a character that cannot be kept.' }, error);
  if (isDatabaseAway(error)) return serverUnready({ headers: { 'Retry-After': '5' } }, error);
  return serverFailed({}, error);
}

function isHttpError(error: unknown): error is Error & { status: number } {
  return error instanceof Error && 'status' in error && typeof error.status === 'number';
}

/** PostgreSQL keeps every character of Unicode but U+0000 and lone halves of a pair, as text and as JSON. */
function isUnstorable(error: unknown): boolean {
  if (!(error instanceof Error) || !('code' in error)) return false;
  return error.code === '22021' || error.code === '22P05' || (error.code === '22P02' && / json$/.test(error.message));
}

/** Connection refused or lost, a server that is starting or stopping, or no free connection in time. */
function isDatabaseAway(error: unknown): boolean {
  if (!(error instanceof Error)) return false;
  if ('errors' in error && Array.isArray(error.errors)) return error.errors.some(isDatabaseAway);
  const code = 'code' in error ? String(error.code) : '';
  if (/^(ECONNREFUSED|ECONNRESET|EPIPE|57P0[123]|53300|08\d{3})$/.test(code)) return true;
  return /Connection terminated|Timeout acquiring a connection|Connection ended/i.test(error.message);
}
