import type { DesignDocument } from '../../model/design-document';
import type { ToleranceParameters } from '../../model/tolerance-run';
import { spectrumSize } from '../aperture-spectrum';
import { cellCountUpperBound } from '../cell-count';
import { latticeGrid } from '../panel-lattice';
import { siPanel } from '../si-design';
import type { ToleranceChunk } from './tolerance-part';

/** Trials of each contributor alone: enough to rank them, few enough that all of them cost little more than a usual run itself. */
export const MOST_RANKING_TRIALS = 60;
/** Trials whose cuts are kept for the envelope. */
export const MOST_ENVELOPE_TRIALS = 1000;

export const rankingTrials = ({ trials }: ToleranceParameters): number => Math.min(trials, MOST_RANKING_TRIALS);
export const envelopeTrials = ({ trials }: ToleranceParameters): number => Math.min(trials, MOST_ENVELOPE_TRIALS);

const TARGET_SECONDS = 1;
// Measured on one core at 40 x 40 and 60 x 60 cells, then doubled: an upper estimate.
const SECONDS_PER_CELL = 4e-7;
const SECONDS_PER_SAMPLE = 8e-8;
const SECONDS_PER_READING = 4e-3;

/** What one trial takes, from above. */
export function trialSeconds({ panel }: DesignDocument): number {
  const grid = latticeGrid(siPanel(panel));
  const samples = spectrumSize(grid.columnCount) * spectrumSize(grid.rowCount) * (grid.stagger === 'none' ? 1 : 2);
  return cellCountUpperBound(panel) * SECONDS_PER_CELL + samples * SECONDS_PER_SAMPLE + SECONDS_PER_READING;
}

/** Chunks of about a second: everything together first, then every contributor alone. */
export function planTolerance(design: DesignDocument, parameters: ToleranceParameters): { chunk: ToleranceChunk; seconds: number }[] {
  const perTrial = trialSeconds(design);
  const perChunk = Math.max(1, Math.floor(TARGET_SECONDS / perTrial));
  const chunksOf = (study: ToleranceChunk['study'], count: number, cutsTo: number): { chunk: ToleranceChunk; seconds: number }[] => {
    const chunkCount = Math.ceil(count / perChunk);
    return Array.from({ length: chunkCount }, (_, i) => {
      const from = Math.floor((i * count) / chunkCount);
      const to = Math.floor(((i + 1) * count) / chunkCount);
      return { chunk: { study, from, to, cutsTo }, seconds: (to - from) * perTrial };
    });
  };
  const alone = parameters.contributors.filter(({ spread }) => spread > 0).flatMap(({ id }) => chunksOf(id, rankingTrials(parameters), 0));
  return [...chunksOf('all', parameters.trials, envelopeTrials(parameters)), ...alone];
}
