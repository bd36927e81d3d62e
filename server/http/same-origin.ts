import type { RequestHandler } from 'express';
import { foreignOrigin } from './http.errors.ts';

const SAFE = new Set(['GET', 'HEAD', 'OPTIONS']);

/**
 * Refuses a change that does not come from our own pages. A browser names the page's origin on every change; a
 * request that names neither `Origin` nor `Sec-Fetch-Site` comes from no page, and is refused where it carries a cookie.
 * Paths that prove themselves by a signature are left out.
 */
export function sameOrigin(publicUrl: string, signedPaths: readonly string[]): RequestHandler {
  return (request, _response, next) => {
    if (SAFE.has(request.method) || signedPaths.includes(request.path)) return next();
    const origin = request.get('origin');
    if (origin !== undefined) {
      if (origin !== publicUrl && origin !== `${request.protocol}://${request.get('host')}`) throw foreignOrigin();
      return next();
    }
    const site = request.get('sec-fetch-site');
    if (site !== undefined ? site !== 'same-origin' : request.get('cookie') !== undefined) throw foreignOrigin();
    next();
  };
}
