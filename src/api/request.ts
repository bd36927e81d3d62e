import { problem } from '@shared/contracts/errors.ts';
import type { z } from 'zod';
import { ApiProblem } from './problem.ts';

type Method = 'GET' | 'POST' | 'PUT' | 'PATCH' | 'DELETE';
type QueryValue = string | number | boolean | null | undefined;

export interface RequestOptions {
  /** Sent as JSON. */
  body?: unknown;
  /** Sent as multipart form data, for files. */
  form?: FormData;
  query?: Record<string, QueryValue>;
  /** The entity tag that was read; the server refuses the write when another is current. */
  ifMatch?: string | null;
  signal?: AbortSignal;
}

export interface Answer<T> {
  data: T;
  etag: string | null;
}

/**
 * Asks the server and checks its answer against the contract.
 *
 * @example
 * const { data, etag } = await request('GET', `/api/recipes/${id}`, recipeView);
 * await request('PUT', `/api/recipes/${id}`, recipeView, { body: draft, ifMatch: etag });
 *
 * @throws ApiProblem for every refusal, broken connection or answer that breaks its contract.
 */
export async function request<C extends z.ZodType>(
  method: Method,
  path: string,
  contract: C,
  options: RequestOptions = {},
): Promise<Answer<z.output<C>>> {
  const response = await reach(method, path, options);
  const etag = response.headers.get('etag');
  const content = await readJson(response);
  if (!response.ok) throw toProblem(response.status, content, etag);

  const checked = contract.safeParse(content);
  if (!checked.success) {
    console.error(`${method} ${path} broke its contract`, checked.error.issues);
    throw new ApiProblem({ code: 'client.unreadable', status: response.status });
  }
  return { data: checked.data, etag };
}

async function reach(method: Method, path: string, options: RequestOptions): Promise<Response> {
  const headers = new Headers({ accept: 'application/json' });
  if (options.body !== undefined) headers.set('content-type', 'application/json');
  if (options.ifMatch) headers.set('if-match', options.ifMatch);

  const body = options.form ?? (options.body === undefined ? null : JSON.stringify(options.body));
  try {
    return await fetch(path + toQueryString(options.query), {
      method,
      headers,
      body,
      signal: options.signal ?? null,
      credentials: 'same-origin',
    });
  } catch (error) {
    if (error instanceof DOMException && error.name === 'AbortError') throw error;
    throw new ApiProblem({ code: 'client.offline', status: 0 });
  }
}

function toQueryString(query: Record<string, QueryValue> = {}): string {
  const given = Object.entries(query).filter(([, value]) => value !== undefined && value !== null && value !== '');
  if (given.length === 0) return '';
  return `?${new URLSearchParams(given.map(([name, value]) => [name, String(value)]))}`;
}

async function readJson(response: Response): Promise<unknown> {
  if (response.status === 204) return undefined;
  try {
    return await response.json();
  } catch {
    // Something before the server answered in its own words; what matters is that it was no answer of ours.
    return undefined;
  }
}

function toProblem(status: number, content: unknown, etag: string | null): ApiProblem {
  const said = problem.safeParse(content);
  if (said.success) return new ApiProblem({ ...said.data, etag });
  return new ApiProblem({ code: status >= 500 ? 'server.failed' : 'client.unreadable', status, etag });
}
