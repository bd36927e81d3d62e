import type { GateViewer } from '../gate/gate.ts';
import { decide, type Decision } from '../gate/gate.ts';
import { isStaff, type Viewer } from '../http/viewer.ts';
import type { GatedRow } from './reading.queries.ts';

/** The reader as the gate sees them. Staff may look as a visitor (0) or as a member of a rank; others may not. */
export function toGateViewer(viewer: Viewer, as: number | undefined): GateViewer {
  const staff = isStaff(viewer);
  if (staff && as !== undefined) return { staff: false, signedIn: as > 0, verified: as > 0, rank: as };
  return {
    staff,
    signedIn: viewer.person !== null,
    verified: viewer.person?.verified ?? false,
    rank: viewer.rank,
  };
}

/** Asks the gate about a row of the database. */
export function decideRow(row: GatedRow, viewer: GateViewer, now: Date): Decision {
  const opens = row.opens.map(({ rank, at }) => ({ rank, at: new Date(at) }));
  return decide({ access: row.access, opens, withdrawn: row.withdrawn }, viewer, now);
}
