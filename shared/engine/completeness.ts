import type { RecipeDocument, RecipeLine } from '../contracts/recipe-document.ts';
import type { MissingCode } from '../contracts/recipes.ts';
import type { RecipeKind } from '../contracts/words.ts';

/** Kinds that are made when they are wanted, so that nothing has to be said of keeping. */
const NOT_KEPT: ReadonlySet<RecipeKind> = new Set(['drink', 'garnish', 'ice', 'technique']);

/** What the document does not say of its lead plate: its words, null where there is no such plate. */
export interface LeadPlate {
  leadPlateAlt: string | null;
}

/**
 * What a recipe still lacks before it may be cleared, by code and in the order of the page: the house's own list. A line needs
 * an amount unless it is optional, another's alternative or to taste. A technique may have no lines and no yield.
 */
export function missingFields(document: RecipeDocument, { leadPlateAlt }: LeadPlate): MissingCode[] {
  const { title, headnote, kind, steps, keeping, leadPlateId, sections } = document;
  const lines = sections.flatMap((section) => section.lines);
  const isTechnique = kind === 'technique';
  const lacks: Record<MissingCode, boolean> = {
    title: isBlank(title),
    headnote: isBlank(headnote),
    lines: lines.length === 0 && !isTechnique,
    amounts: lines.some(lacksAmount),
    steps: steps.length === 0,
    yield: !isTechnique && !saysYield(document),
    keeping: keeping === null && !NOT_KEPT.has(kind),
    'lead-plate': leadPlateId === null,
    'lead-plate-alt': leadPlateId !== null && isBlank(leadPlateAlt ?? ''),
  };
  return (Object.keys(lacks) as MissingCode[]).filter((code) => lacks[code]);
}

function lacksAmount({ amount, optional, alternativeTo, scaling }: RecipeLine): boolean {
  return amount === null && !optional && alternativeTo === null && scaling.rule !== 'to-taste';
}

function saysYield({ yield: { stated, measured, servings } }: RecipeDocument): boolean {
  return stated !== null || measured !== null || servings !== null;
}

function isBlank(text: string): boolean {
  return text.trim() === '';
}
