import type { z } from 'zod';
import type { Picture } from '../../shared/contracts/plates.ts';
import type { BoundPlate } from '../../shared/contracts/editions.ts';
import type { ClosedBecause, readingView, recipeTeaser } from '../../shared/contracts/reading.ts';
import type { BoundTeaser } from '../editions/editions.rows.ts';
import type { Decision } from '../gate/gate.ts';
import { toPicture } from '../plates/rendition-address.ts';
import type { BoundText } from './reading.queries.ts';

/** Where the pictures of a page are asked for. */
export type PlateBase = string;
type ReadingAnswer = z.input<typeof readingView>;

/** The teaser with its small lead plate, or with every size where the recipe is open. */
export function toTeaserView(
  teaser: BoundTeaser,
  base: PlateBase,
  sizes: 'all' | 'small',
): z.input<typeof recipeTeaser> {
  const { leadPlate, headnoteText: _words, ...told } = teaser;
  return { ...told, plate: leadPlate && toPicture(leadPlate, base, sizes) };
}

/** A recipe as an open one is read. */
export function toOpenView(
  text: BoundText,
  { book, edition }: Pick<Extract<ReadingAnswer, { view: 'open' }>, 'book' | 'edition'>,
  base: PlateBase,
): ReadingAnswer {
  const { document, figures, html, components } = text.recipe;
  const plates = new Map(text.plates.map((plate) => [plate.id, plate]));
  return {
    view: 'open',
    ...toTeaserView(text.teaser, base, 'all'),
    totalTime: figures.times.total,
    book,
    edition,
    method: document.method,
    glass: document.glass,
    ice: document.ice,
    garnish: document.garnish,
    yield: document.yield,
    sections: document.sections,
    steps: document.steps.map((step, index) => ({
      ...step,
      html: html.steps[index] ?? '',
      plate: pictureOf(step.plateId, plates, base),
    })),
    tipsHtml: html.tips,
    variationsHtml: html.variations,
    keeping: document.keeping,
    figures,
    components,
  };
}

/** A recipe as a closed one is read: its teaser, and what would open it. */
export function toClosedView(
  teaser: BoundTeaser,
  book: { slug: string; title: string },
  base: PlateBase,
  closed: ClosedBecause,
): ReadingAnswer {
  return { view: 'teaser', ...toTeaserView(teaser, base, 'small'), book, closed };
}

/** Words the gate's answer; a tier that nobody can join any more is named by its rank alone. */
export function toClosedBecause(
  decision: Exclude<Decision, { open: true } | { why: 'withdrawn' }>,
  tier: { rank: number; name: string } | undefined,
): ClosedBecause {
  switch (decision.why) {
    case 'tier':
      return { why: 'tier', rank: tier?.rank ?? decision.rank, tierName: tier?.name ?? '' };
    case 'date':
      return { why: 'date', opensAt: decision.at.toISOString() };
    default:
      return { why: decision.why };
  }
}

function pictureOf(id: string | null, plates: ReadonlyMap<string, BoundPlate>, base: PlateBase): Picture | null {
  const plate = id === null ? undefined : plates.get(id);
  return plate ? toPicture(plate, base, 'all') : null;
}
