import type { BoundPlate } from '../../shared/contracts/editions.ts';
import type { AppContext } from '../context.ts';
import type { GateViewer } from '../gate/gate.ts';
import type { FileAnswer } from '../http/file-answer.ts';
import { toFileAnswer } from '../plates/plates.service.ts';
import { findRendition, type RenditionName } from '../plates/rendition-address.ts';
import { decideRow } from './gate-viewer.ts';
import { notThere } from './reading.errors.ts';
import { findReadable, readBoundTeaser, readBoundText } from './reading.queries.ts';
import { readIssuedBook } from './reading.service.ts';

interface PlateAsked {
  book: string;
  recipe: string;
  plate: string;
  rendition: RenditionName;
}

/**
 * A plate of a recipe: every size where the recipe is open, the small lead plate where it is not. Anything else is
 * answered as if it were not there, whether it is or not.
 */
export async function readPlate(ctx: AppContext, asked: PlateAsked, viewer: GateViewer): Promise<FileAnswer> {
  const row = await findReadable(ctx.db, asked.book, asked.recipe);
  if (!row) throw notThere();
  const decision = decideRow(row, viewer, ctx.now());
  if (decision.open) {
    const { plates } = await readBoundText(ctx.db, row);
    return answerRendition(
      ctx,
      plates.find((plate) => plate.id === asked.plate),
      asked.rendition,
    );
  }
  const { leadPlate: lead } = await readBoundTeaser(ctx.db, row);
  const told = decision.why !== 'withdrawn' && asked.rendition.size === 'small' && lead?.id === asked.plate;
  return answerRendition(ctx, told ? lead : undefined, asked.rendition);
}

/** The cover of an issued book; it stands on the front door, before the age check. */
export async function readCover(ctx: AppContext, asked: Omit<PlateAsked, 'recipe'>): Promise<FileAnswer> {
  const { cover } = await readIssuedBook(ctx.db, asked.book);
  return answerRendition(ctx, cover?.id === asked.plate ? cover : undefined, asked.rendition);
}

function answerRendition({ files }: AppContext, plate: BoundPlate | undefined, name: RenditionName): FileAnswer {
  const rendition = plate && findRendition(plate.renditions, name);
  if (!rendition) throw notThere();
  return toFileAnswer(files, rendition);
}
