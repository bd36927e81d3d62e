/**
 * What the measures without a legal definition stand for. All in millilitres, all common practice: published tables give
 * 0.8–1.6 for a dash, 2.5–5 for a barspoon, 0.9–3.7 for a splash. An imprint may set its own; a reader is shown them.
 */
export interface TradeMeasures {
  dash: number;
  drop: number;
  barspoon: number;
  pinch: number;
  splash: number;
  bottle: number;
}

/** Common practice; a bottle is the usual one of spirits in Europe. */
export const DEFAULT_TRADE_MEASURES: Readonly<TradeMeasures> = {
  dash: 0.9,
  drop: 0.05,
  barspoon: 5,
  pinch: 0.3,
  splash: 3,
  bottle: 700,
};

/** True for a unit whose size is a setting of the imprint and not a definition. */
export function isTradeMeasure(unit: string): unit is keyof TradeMeasures {
  return Object.hasOwn(DEFAULT_TRADE_MEASURES, unit);
}
