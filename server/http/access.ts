import type { Request } from 'express';
import type { AppContext } from '../context.ts';
import { ageUnconfirmed, requestNotFound, roleMissing, signInFirst } from './http.errors.ts';
import type { AccessRule } from './registry.ts';
import { hasRole, isStaff, viewerOf } from './viewer.ts';

/** Refuses a request that its route's rule does not admit. What lies behind a route is never told apart. */
export function checkAccess(rule: AccessRule, request: Request, { settings }: AppContext): void {
  const viewer = viewerOf(request);
  switch (rule) {
    case 'anyone':
    case 'signed':
      return;
    case 'reader':
      if (!viewer.ageConfirmed && !isStaff(viewer)) throw ageUnconfirmed();
      return;
    case 'account':
      if (!viewer.person) throw signInFirst();
      return;
    case 'staff':
      return requireRole(request, isStaff(viewer));
    case 'issuer':
      return requireRole(request, hasRole(viewer, 'creator', 'admin'));
    case 'admin':
      return requireRole(request, hasRole(viewer, 'admin'));
    case 'local-demo':
      if (settings.mode !== 'demo' || !isLoopback(request)) throw requestNotFound();
  }
}

function requireRole(request: Request, held: boolean): void {
  if (held) return;
  throw viewerOf(request).person ? roleMissing() : signInFirst();
}

function isLoopback(request: Request): boolean {
  const from = request.socket.remoteAddress ?? '';
  return from === '::1' || /^(::ffff:)?127\./.test(from);
}
