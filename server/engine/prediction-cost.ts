import { cellCountUpperBound } from '../../shared/antenna/cell-count';
import type { CutRequest } from '../../shared/antenna/pattern-cut';
import { MAX_CELL_COUNT, type KeepOut, type Outline, type Panel } from '../../shared/model/design-document';
import type { PredictionQuestion } from './prediction-task';

/** What a prediction will take, known before any memory is. */
export interface PredictionCost {
  /** Cells of the bounding rectangle: never fewer than the panel has. */
  readonly cellBound: number;
  /** Directions at which the pattern is asked for. */
  readonly directionCount: number;
  readonly seconds: number;
}

// Measured on one core at 1 000 x 1 000 cells and at a u-v map of 1 024 x 1 024, then doubled: the estimate is to be
// an upper one, and only its order matters.
const SECONDS_PER_CELL = 6e-6;
const SECONDS_PER_DIRECTION = 2e-6;
const SECONDS_PER_ROW_AND_CORNER = 2e-8;

/** A longer prediction is refused: it would keep a thread from everyone else. */
export const MAX_PREDICTION_SECONDS = 60;

export function predictionCost({ design, cuts = [], uvSize = 0 }: Omit<PredictionQuestion, 'edition'>): PredictionCost {
  const cellBound = cellCountUpperBound(design.panel);
  const directionCount = uvSize * uvSize + cuts.reduce((sum, cut) => sum + cutSampleCount(cut), 0);
  const cells = Math.min(cellBound, MAX_CELL_COUNT);
  const seconds = vectorSeconds(design, cells, directionCount) + synthesisSeconds(design, cells) + cells * SECONDS_PER_CELL + directionCount * SECONDS_PER_DIRECTION + outlineTests(design.panel) * SECONDS_PER_ROW_AND_CORNER;
  return { cellBound, directionCount, seconds };
}

// Each candidate's 2x2 response is interpolated at each cell, and every direction is reckoned for two polarisations.
const VECTOR_SECONDS_PER_CELL = 3e-5;
// Forms without a kernel in closed form are integrated over the hemisphere.
const QUADRATURE_SECONDS_PER_CELL = 2e-5;

function vectorSeconds({ prediction, cells: stock }: PredictionQuestion['design'], cells: number, directionCount: number): number {
  if (prediction.model !== 'vector') return 0;
  const isClosed = (prediction.reradiation ?? 'power-wave') === 'power-wave' && (prediction.cellFactor ?? 'none') === 'none';
  const perCell = (stock.kind === 'edition' ? VECTOR_SECONDS_PER_CELL : SECONDS_PER_CELL) + (isClosed ? 0 : QUADRATURE_SECONDS_PER_CELL);
  return cells * perCell + directionCount * SECONDS_PER_DIRECTION;
}

// An iteration transforms up to 16 samples to a cell there and back, measured at 40 x 40 cells and doubled.
const SECONDS_PER_CELL_AND_ITERATION = 2e-5;

// Every candidate at every frequency in every round; measured with 24 cells at three frequencies and doubled.
const BAND_FIT_SECONDS_PER_CELL = 5e-4;

function synthesisSeconds({ synthesis, cells: stock }: PredictionQuestion['design'], cells: number): number {
  const projections = synthesis.kind === 'projections' ? cells * synthesis.iterations * SECONDS_PER_CELL_AND_ITERATION : 0;
  return projections + (stock.kind === 'edition' && stock.rule === 'band-fit' ? cells * BAND_FIT_SECONDS_PER_CELL : 0);
}

export function cutSampleCount(cut: CutRequest): number {
  const [from, to, step] = 'plane' in cut ? cut.angleDeg : cut.thetaDeg;
  return to >= from ? Math.floor((to - from) / step + 1e-6) + 1 : 1;
}

/** Every row of the lattice is held against every corner of the outline and of the keep-outs. */
function outlineTests(panel: Panel): number {
  const spacingMm = panel.lattice.kind === 'rectangular' ? panel.lattice.periodYMm : panel.lattice.rowSpacingMm;
  const corners = cornerCount(panel.outline) + panel.keepOuts.reduce((sum, keepOut) => sum + cornerCount(keepOut), 0);
  return (heightMm(panel.outline) / spacingMm) * corners;
}

const cornerCount = (outline: Outline | KeepOut): number => (outline.kind === 'polygon' ? outline.pointsMm.length : 2);

function heightMm(outline: Outline): number {
  if (outline.kind !== 'polygon') return outline.heightMm;
  const heights = outline.pointsMm.map(([, y]) => y);
  return Math.max(...heights) - Math.min(...heights);
}
