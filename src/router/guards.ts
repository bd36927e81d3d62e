import type { RouteLocationNormalized, RouteLocationRaw } from 'vue-router';
import { useSessionStore } from '@/stores/session.ts';

/**
 * Sends those who may not enter to where they can change that, with the way back in `next`. A courtesy only: the
 * server refuses on its own. Where it cannot be asked, the page is entered and shows the failure itself.
 */
export async function guardAccess(to: RouteLocationNormalized): Promise<true | RouteLocationRaw> {
  const { access, age } = to.meta;
  if (!access && !age) return true;

  const session = useSessionStore();
  try {
    await session.ready();
  } catch {
    return true;
  }
  if (access && !session.user) return { name: 'sign-in', query: { next: to.fullPath } };
  if (access === 'staff' && !session.isStaff) return lost(to);
  if (access && typeof access !== 'string' && !session.hasRole(...access)) return lost(to);
  if (age && !session.ageConfirmed) return { name: 'age', query: { next: to.fullPath } };
  return true;
}

function lost(to: RouteLocationNormalized): RouteLocationRaw {
  return { name: 'not-found', params: { path: to.path.slice(1).split('/') } };
}

/** Where to go after signing in: a path of this site, else the front door. */
export function returnPathOf(to: RouteLocationNormalized): string {
  const next = to.query.next;
  return typeof next === 'string' && /^\/(?![/\\])[^\s\\]*$/.test(next) ? next : '/';
}
