import type { Access } from '../../shared/contracts/access.ts';

/** What the gate knows of an entry: its rule, and the moment from which each rank may open it. */
export interface GatedEntry {
  access: Access;
  /** Moments by rank; 0 stands for visitors and accounts. A rank below every named one opens at once. */
  opens: readonly { rank: number; at: Date }[];
  withdrawn: boolean;
}

/** What the gate knows of the reader. */
export interface GateViewer {
  staff: boolean;
  signedIn: boolean;
  verified: boolean;
  rank: number;
}

export type Decision =
  | { open: true }
  | { open: false; why: 'withdrawn' }
  | { open: false; why: 'account' | 'verify' }
  | { open: false; why: 'tier'; rank: number }
  | { open: false; why: 'date'; at: Date };

/**
 * Who reads what, decided in one place. Staff read everything; a withdrawn entry is hidden from every reader; then
 * the entry's rule, then the moment from which the reader's own rank may open it (a higher rank's earlier moment is
 * theirs too).
 */
export function decide(entry: GatedEntry, viewer: GateViewer, now: Date): Decision {
  if (viewer.staff) return { open: true };
  if (entry.withdrawn) return { open: false, why: 'withdrawn' };
  return decideByRule(entry.access, viewer) ?? decideByDate(entry, viewer.rank, now);
}

function decideByRule(access: Access, viewer: GateViewer): Decision | null {
  if (access.kind === 'open') return null;
  if (access.kind === 'tier')
    return viewer.rank >= access.rank ? null : { open: false, why: 'tier', rank: access.rank };
  if (viewer.rank > 0) return null;
  if (!viewer.signedIn) return { open: false, why: 'account' };
  return viewer.verified ? null : { open: false, why: 'verify' };
}

function decideByDate({ opens }: GatedEntry, rank: number, now: Date): Decision {
  const moments = opens.filter((moment) => moment.rank <= rank);
  if (moments.length === 0) return { open: true };
  const at = new Date(Math.min(...moments.map((moment) => moment.at.getTime())));
  return at <= now ? { open: true } : { open: false, why: 'date', at };
}

/** The rule that holds for a recipe: its own, else its chapter's, else the book's. */
export function resolveAccess(own: Access | null, chapter: Access | null, book: Access): Access {
  return own ?? chapter ?? book;
}
