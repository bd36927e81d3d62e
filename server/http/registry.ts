import type { Request, RequestHandler } from 'express';
import type { Session, SessionData } from 'express-session';
import type { z } from 'zod';
import type { AppContext } from '../context.ts';
import type { FileAnswer } from './file-answer.ts';
import type { Viewer } from './viewer.ts';
import type { WrittenAnswer } from './written-answer.ts';

/**
 * Who may call a route. `anyone`: nothing on it is kept back. `reader`: past the age check, the gate decides on the
 * rest. `account`: signed in. `staff`: creator, editor or admin. `issuer`: creator or admin. `signed`: proves itself
 * by a signature. `local-demo`: the demonstration, from this machine only.
 */
export const ACCESS_RULES = [
  'anyone',
  'reader',
  'account',
  'staff',
  'issuer',
  'admin',
  'signed',
  'local-demo',
] as const;
export type AccessRule = (typeof ACCESS_RULES)[number];

export interface HandlerInput<P, Q, B> {
  ctx: AppContext;
  viewer: Viewer;
  params: P;
  query: Q;
  body: B;
  /** The version that `If-Match` names; only on routes with `versioned: 'required'`. */
  expected: number;
  /** Files of a multipart body, by `upload`. */
  files: Express.Multer.File[];
  request: Request;
  session: Session & Partial<SessionData>;
}

export interface RouteSpec<
  P extends z.ZodType = z.ZodType,
  Q extends z.ZodType = z.ZodType,
  B extends z.ZodType = z.ZodType,
  A extends z.ZodType = z.ZodType,
> {
  /** Permanent name in the API description. */
  id: string;
  method: 'get' | 'post' | 'put' | 'patch' | 'delete';
  path: string;
  access: AccessRule;
  summary: string;
  params?: P;
  query?: Q;
  body?: B;
  /** The contract that the answer is cut to, or `file` for bytes. */
  answer: A | 'file';
  /** Status of a good answer; 200 unless told. */
  status?: number;
  /** `answer`: carries an `ETag`. `required`: also refused without `If-Match`. */
  versioned?: 'answer' | 'required';
  /** Reads a multipart body before the handler. */
  upload?: RequestHandler;
  /** The body as bytes, for signatures. */
  rawBody?: true;
  /** Largest JSON body in bytes; 1 MiB unless told. */
  bodyLimit?: number;
  handler: (
    input: HandlerInput<z.output<P>, z.output<Q>, z.output<B>>,
  ) => Promise<z.input<A> | FileAnswer | WrittenAnswer>;
}

export type Route = RouteSpec;

/** Declares one route as data; the types of its contracts reach the handler. */
export function defineRoute<
  P extends z.ZodType = z.ZodObject<Record<never, never>>,
  Q extends z.ZodType = z.ZodObject<Record<never, never>>,
  B extends z.ZodType = z.ZodUndefined,
  A extends z.ZodType = z.ZodType,
>(spec: RouteSpec<P, Q, B, A>): Route {
  // The erased form is only ever called with what the contracts of this very route let through.
  return spec as unknown as Route;
}
