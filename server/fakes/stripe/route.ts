import type { z } from 'zod';
import { shape } from './params.ts';
import type { WireObject } from './wire.ts';
import type { Work } from './work.ts';

/** The named parts of a route's path. */
export type PathParts = Record<string, string>;

export interface Route {
  method: 'get' | 'post' | 'delete';
  /** Below `/v1`, with `:id` for what varies. */
  path: string;
  params: z.ZodType<{ expand?: string[] | undefined }>;
  handle: (work: Work, params: never, path: PathParts, url: string) => Promise<WireObject>;
}

/** Declares one call of the API; its handler gets the parameters as its schema reads them. */
export function route<S extends z.ZodType<{ expand?: string[] | undefined }>>(
  method: Route['method'],
  path: string,
  params: S,
  handle: (work: Work, params: z.output<S>, path: { id: string } & PathParts, url: string) => Promise<WireObject>,
): Route {
  return { method, path, params, handle: handle as unknown as Route['handle'] };
}

/** A call that takes nothing but `expand`. */
export const onlyExpand = shape<object>()({});
