import type { AppContext } from '../context.ts';
import type { JobAttempt } from '../jobs/tasks.ts';
import { findPlate, updatePlate } from './plates.queries.ts';
import { makeRenditions } from './renditions.ts';

/** Makes the sizes of a plate. Done twice it makes the same bytes. */
export async function preparePlate(
  { db, files }: AppContext,
  { plateId }: { plateId: string },
  attempt: JobAttempt,
): Promise<void> {
  const plate = await findPlate(db, plateId);
  if (plate?.state !== 'preparing') return;
  try {
    const renditions = await makeRenditions(await files.read(plate.original_hash), files);
    await updatePlate(db, plateId, { renditions: JSON.stringify(renditions) as never, state: 'ready' });
  } catch (error) {
    if (attempt.last) await updatePlate(db, plateId, { state: 'failed' });
    throw error;
  }
}
