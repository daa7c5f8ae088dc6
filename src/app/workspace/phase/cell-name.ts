import type { DesignDocument } from '../../../../shared/model/design-document';
import { numberText } from '../../ui/plots/plot-text';
import type { EditionInUse } from '../workspace-state';

/** The edition, when it is the one a design stands on. */
export function editionOf(design: DesignDocument, edition: EditionInUse | null): EditionInUse | null {
  return design.cells.kind === 'edition' && edition?.id === design.cells.editionId ? edition : null;
}

/** What a cell is called beside its phase: "2.30 mm", "level 3 of 8", "entry 2", or that there is none. */
export function cellName(design: DesignDocument, edition: EditionInUse | null, cellIndex: number): string {
  const { cells } = design;
  if (cells.kind === 'ideal') return cells.levels === null ? 'continuous phase' : `level ${cellIndex + 1} of ${cells.levels}`;
  if (cells.kind === 'inline') return `entry ${cellIndex + 1}`;
  if (cells.kind === 'modulated') return 'delayed sequence';
  if (cells.kind === 'resonant') return cells.states === null ? 'continuous tuning' : `state ${cellIndex + 1} of ${cells.states}`;
  if (cellIndex < 0) return 'no cell';
  const own = editionOf(design, edition);
  if (!own || !own.cells[cellIndex]) return `cell ${cellIndex + 1}`;
  const { parametersMm, id } = own.cells[cellIndex];
  return parametersMm.length === 0 ? id : `${parametersMm.map((value) => numberText(value, 2)).join(' × ')} mm`;
}
