import type { LarderItem } from '../contracts/larder.ts';
import type { RecipeDocument } from '../contracts/recipe-document.ts';
import { DEFAULT_TRADE_MEASURES, type TradeMeasures } from './trade-measures.ts';

/** What the engine looks things up in: the larder by id, the documents of components by recipe id, and the trade measures. */
export interface EngineContext {
  larder: ReadonlyMap<string, LarderItem>;
  components: ReadonlyMap<string, RecipeDocument>;
  tradeMeasures?: Readonly<TradeMeasures>;
}

export function tradeMeasuresOf(context: EngineContext): Readonly<TradeMeasures> {
  return context.tradeMeasures ?? DEFAULT_TRADE_MEASURES;
}
