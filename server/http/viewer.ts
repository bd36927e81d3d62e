import type { Request } from 'express';
import type { Membership } from '../gate/entitlement.ts';
import type { Role } from '../../shared/contracts/words.ts';

/** Whoever asks, with all that decides what they may do; loaded once a request. */
export interface Viewer {
  person: { id: string; email: string; name: string; verified: boolean; roles: readonly Role[] } | null;
  membership: Membership | null;
  /** The highest rank that is open to them now; 0 for none. */
  rank: number;
  ageConfirmed: boolean;
}

declare module 'express-serve-static-core' {
  interface Request {
    viewer?: Viewer;
  }
}

export const VISITOR: Viewer = { person: null, membership: null, rank: 0, ageConfirmed: false };

export function viewerOf(request: Request): Viewer {
  return request.viewer ?? VISITOR;
}

/** Creator, editor and admin read everything. */
export function isStaff(viewer: Viewer): boolean {
  return (viewer.person?.roles.length ?? 0) > 0;
}

export function hasRole(viewer: Viewer, ...roles: Role[]): boolean {
  return viewer.person?.roles.some((held) => roles.includes(held)) ?? false;
}
