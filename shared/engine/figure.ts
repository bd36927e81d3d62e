import type { Figure, Lack, Provenance } from '../contracts/figures.ts';

export type KnownFigure = Extract<Figure, { known: true }>;

/** A figure that is known; `rests` are codes of `rests.ts`. */
export function known(min: number, max: number, how: Provenance, rests: readonly string[] = []): KnownFigure {
  return { known: true, min, max, how, rests: [...new Set(rests)] };
}

/** A figure that is not known, and each thing it lacks once. */
export function unknown(lacks: readonly Lack[]): Figure {
  const each = new Map(lacks.map((lack) => [`${lack.code} ${lack.subject}`, lack]));
  return { known: false, lacks: [...each.values()] };
}

/** The middle of a figure's range, or null where it is not known. */
export function middleOf(figure: Figure): number | null {
  return figure.known ? (figure.min + figure.max) / 2 : null;
}
