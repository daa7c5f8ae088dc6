import { exampleDesign } from '../../../../shared/antenna/example-design';
import { EXAMPLE_EDITION_ID, EXAMPLE_GRID, exampleEdition } from '../../../../shared/antenna/example-edition';
import { prepareEdition } from '../../../../shared/antenna/prepare-edition';
import { computedPrediction } from '../computed-prediction';
import type { EditionInUse } from '../workspace-state';

const CELLS = exampleEdition(EXAMPLE_GRID, {
  shapes: [
    { kind: 'ring', outerMm: { parameter: 'a', factor: 1 }, stripMm: 0.15 },
    { kind: 'rectangle', widthMm: { parameter: 'a', factor: 0.62 }, heightMm: { parameter: 'a', factor: 0.62 } },
  ],
});

/** An edition of invented cells as the workspace holds it, and a design on it predicted by the engine; for specs. */
export const SAMPLE_PREPARED = prepareEdition(CELLS);
export const SAMPLE_EDITION: EditionInUse = {
  ...CELLS,
  cells: [...CELLS.cells],
  id: EXAMPLE_EDITION_ID,
  familyId: '00000000-0000-4000-8000-000000000002',
  familyName: 'invented-15',
  number: 3,
  state: 'published',
  hash: '0'.repeat(64),
  cellCount: CELLS.cells.length,
  fileCount: 0,
  fromGHz: 9,
  toGHz: 11,
  thetasDeg: [...EXAMPLE_GRID.thetasDeg],
  phisDeg: [...EXAMPLE_GRID.phisDeg],
  verdict: 'pass',
  note: 'Invented',
  acceptedBy: { id: '00000000-0000-4000-8000-000000000003', name: 'Lab' },
  acceptedAt: '2026-01-01T00:00:00Z',
  publishedBy: null,
  publishedAt: null,
  quality: { verdict: 'pass', family: [], cells: [] },
  mapping: {},
  messages: [],
};

export const SAMPLE_DESIGN = exampleDesign({ cells: { kind: 'edition', editionId: EXAMPLE_EDITION_ID, rule: 'nearest-phase', excludedCells: [] } });
export const SAMPLE_PHASE = computedPrediction(SAMPLE_DESIGN, { edition: SAMPLE_PREPARED });
