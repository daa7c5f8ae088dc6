import type { DesignDocument } from './design-document';

/** What a new panel starts from: an offset-fed reflecting square at 28 GHz with ideal cells. */
export const STARTING_DESIGN: DesignDocument = {
  schemaVersion: 1,
  requirement: {
    designFrequencyGHz: 28,
    beams: [{ thetaDeg: 20, phiDeg: 0 }],
    polarisation: 'x',
    minGainDbi: 34,
    pointingToleranceDeg: 0.3,
    maxSidelobeDb: -18,
  },
  panel: {
    operation: 'reflect',
    outline: { kind: 'rectangle', widthMm: 200, heightMm: 200 },
    lattice: { kind: 'rectangular', periodXMm: 5, periodYMm: 5 },
    keepOuts: [],
  },
  illumination: { kind: 'horn', positionMm: [-60, 0, 180], aimMm: [0, 0, 0], exponentE: 6.5, exponentH: 6.5, polarisation: 'x' },
  synthesis: { kind: 'direct' },
  cells: { kind: 'ideal', levels: null },
  referencePhaseDeg: 0,
  prediction: { receiveExponent: 0.5, radiateExponent: 0.5 },
};
