import type { Comparison, Side } from '../../../../shared/contracts/comparisons';
import type { RevisionHeader } from '../../../../shared/contracts/projects';

export const SAMPLE_ID = (place: number): string => `00000000-0000-4000-8000-${String(place).padStart(12, '0')}`;

export function sampleRevision(number: number): RevisionHeader {
  return {
    id: SAMPLE_ID(100 + number),
    panelId: SAMPLE_ID(2),
    number,
    hash: String(number).repeat(64).slice(0, 64),
    parentId: number > 1 ? SAMPLE_ID(99 + number) : null,
    parentNumber: number > 1 ? number - 1 : null,
    restoredFromNumber: null,
    author: { id: SAMPLE_ID(9), name: 'Designer (demo)' },
    message: `State ${number}`,
    createdAt: '2026-11-24T09:12:00Z',
  };
}

function side(number: number | null): Side {
  return {
    reference: number === null ? `draft:${SAMPLE_ID(2)}` : `revision:${SAMPLE_ID(100 + number)}`,
    panelId: SAMPLE_ID(2),
    panelName: 'Panel A',
    projectName: 'Merrow Point sea-rescue link',
    hash: 'debfe0abb702'.padEnd(64, '0'),
    ...(number === null ? {} : { revision: sampleRevision(number) }),
    editionName: 'ring-patch 5/3',
    requirement: number === 3 ? { met: 2, short: 1, open: 1 } : { met: 4, short: 0, open: 0 },
  };
}

/** An invented comparison of revisions 3 and 4 on four cells; for specs. */
export const SAMPLE_COMPARISON: Comparison = {
  before: side(3),
  after: side(4),
  parameterCount: 41,
  parameters: [
    { pointer: '/requirement/beams/0/thetaDeg', label: 'Beam 1 θ', unit: '°', before: 19.5, after: 20 },
    { pointer: '/requirement/minGainDbi', label: 'Least gain', unit: 'dBi', before: null, after: -34 },
    { pointer: '/cells/rule', label: 'Rule', unit: '', before: 'nearest-phase', after: 'least-error' },
  ],
  cells: {
    kind: 'compared',
    total: 4,
    changed: 3,
    parameter: { label: 'Ring outer side', larger: 2, smaller: 1, meanChangeMm: 0.549 },
    errorOver15Before: 82,
    errorOver15After: 0,
    rmsErrorBeforeDeg: 7.9,
    rmsErrorAfterDeg: 4.48,
    arrays: { xMm: [-2.5, 2.5, -2.5, 2.5], yMm: [-2.5, -2.5, 2.5, 2.5], changed: [1, 0, 1, 1], parameterChangeMm: [0.1, 0, -0.1, 3], phaseChangeDeg: [10, 0, -20, 180], errorChangeDeg: [1, 0, -2, 3] },
  },
  cuts: [
    {
      request: { plane: 'along', angleDeg: [-90, 90, 30] },
      angleDeg: [-90, -60, -30, 0, 30, 60, 90],
      beforeDbi: [-40, -10, 0, 34.74, 1, -5, -40],
      afterDbi: [-40, -12, 2, 34.76, -1, -30, -40],
      differenceDb: [null, -2, 14, 0.02, -2, null, null],
      shiftU: 0.0082,
      floorDbi: -15,
    },
  ],
  uv: { size: 2, shiftU: 0.0082, shiftV: 0, differenceDb: [0, 1, -1, 0] },
  figures: [
    { id: 'gain', label: 'Gain at the peak', unit: 'dBi', before: 34.74, after: 34.76, change: 0.02, limit: '>= 34.0', verdictBefore: 'meets', verdictAfter: 'meets' },
    { id: 'along', label: 'Beamwidth along', unit: '°', before: 3.1274, after: 3.1271, change: -0.0003, limit: null, verdictBefore: null, verdictAfter: null },
    { id: 'mask', label: 'Mask margin', unit: 'dB', before: -0.29, after: 0.61, change: 0.9, limit: '>= 0', verdictBefore: 'falls-short', verdictAfter: 'meets' },
    { id: 'cells', label: 'Cells', unit: '', before: 1600, after: 1600, change: 0, limit: null, verdictBefore: null, verdictAfter: null },
    { id: 'cross', label: 'Cross-polar', unit: 'dB', before: { kind: 'scalar', reason: 'the scalar model has no cross-polar part' }, after: { kind: 'scalar', reason: 'the scalar model has no cross-polar part' }, change: { kind: 'scalar', reason: 'no figure' }, limit: '>= 25.0', verdictBefore: 'not-evaluated', verdictAfter: 'not-evaluated' },
  ],
  deciding: 'mask',
};
