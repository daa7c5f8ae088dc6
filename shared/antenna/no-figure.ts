import type { Figure, NoFigure } from '../model/figures';

/** The reason why a figure does not exist for this case. */
export function noFigure(kind: string, reason: string): NoFigure {
  return { kind, reason };
}

/** No cell receives anything, so nothing is radiated. */
export function nothingLit(): NoFigure {
  return noFigure('nothing-lit', 'no cell is lit, so nothing is radiated');
}

export function isNumber(figure: Figure): figure is number {
  return typeof figure === 'number';
}

/** The sum of figures, or the reason why the first missing one is missing. */
export function sumFigures(...terms: readonly Figure[]): Figure {
  const missing = terms.find((term) => !isNumber(term));
  return missing ?? terms.filter(isNumber).reduce((sum, term) => sum + term, 0);
}
