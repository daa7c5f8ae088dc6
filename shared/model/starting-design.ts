import type { DesignDocument } from './design-document';

/** An offset-fed reflecting square at 28 GHz with ideal cells, by the model that the document takes where none is named. */
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

/** What a new panel of the workspace starts from: the same by the vector model. */
export const NEW_PANEL_DESIGN: DesignDocument = { ...STARTING_DESIGN, prediction: { ...STARTING_DESIGN.prediction, model: 'vector' } };
