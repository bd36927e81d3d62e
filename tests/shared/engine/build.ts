import {
  emptyRecipeDocument,
  type RecipeDocument,
  type RecipeLine,
  type RecipeStep,
} from '../../../shared/contracts/recipe-document.ts';
import type { RecipeKind } from '../../../shared/contracts/words.ts';
import type { EngineContext } from '../../../shared/engine/context.ts';
import { LARDER_BY_ID } from '../../../shared/larder/index.ts';

/** A line of the larder that only names what its test is about. */
export function aLine(
  given: Partial<Omit<RecipeLine, 'amount'>> & { id: string; amount?: number | RecipeLine['amount'] },
): RecipeLine {
  const { amount = null, ...rest } = given;
  return {
    unit: 'ml',
    name: given.larderId ?? given.id,
    larderId: null,
    componentId: null,
    prep: '',
    note: '',
    optional: false,
    alternativeTo: null,
    scaling: { rule: 'linear' },
    source: null,
    ...rest,
    amount: typeof amount === 'number' ? { min: amount, max: amount } : amount,
  };
}

/** A line by the larder: `pour(50, 'gin')`. */
export function pour(amount: number, larderId: string, unit: RecipeLine['unit'] = 'ml'): RecipeLine {
  return aLine({ id: larderId, larderId, amount, unit });
}

export function aStep(given: Partial<RecipeStep> & { id: string }): RecipeStep {
  return {
    text: `Step ${given.id}`,
    uses: [],
    operation: null,
    duration: null,
    attention: 'hands-on',
    temperature: null,
    tools: [],
    plateId: null,
    after: null,
    source: null,
    ...given,
  };
}

export function aRecipe(
  lines: readonly RecipeLine[],
  given: Partial<RecipeDocument> & { kind?: RecipeKind } = {},
): RecipeDocument {
  const blank = emptyRecipeDocument(given.title ?? 'Test', given.kind ?? 'liqueur');
  return { ...blank, sections: [{ id: 's1', title: '', lines: [...lines] }], ...given };
}

export function larderContext(components: Record<string, RecipeDocument> = {}): EngineContext {
  return { larder: LARDER_BY_ID, components: new Map(Object.entries(components)) };
}

export const seconds = (min: number, max = min) => ({ min, max });
