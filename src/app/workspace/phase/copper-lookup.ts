import type { CopperShape } from '../../ui/plots/copper-shape';
import type { LivePrediction } from '../live-prediction-data';
import type { EditionInUse } from '../workspace-state';
import { familyCopper } from './family-copper';

/** The copper at each position, worked out once for each cell of the edition; null for a family without shapes. */
export function copperLookup({ cells }: LivePrediction, edition: EditionInUse): ((position: number) => readonly CopperShape[]) | null {
  if (edition.description.shapes.length === 0) return null;
  const kept = new Map<number, readonly CopperShape[]>();
  return (position) => {
    const stock = cells.cellIndex[position];
    const known = kept.get(stock);
    if (known) return known;
    const made = stock >= 0 && edition.cells[stock] ? familyCopper(edition.description, edition.cells[stock].parametersMm) : [];
    kept.set(stock, made);
    return made;
  };
}
