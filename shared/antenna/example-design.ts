import type { DesignDocument } from '../model/design-document';

/** A small complete design, 20 x 20 cells at 10 GHz under an offset horn; the starting point of many checks. Invented. */
export const EXAMPLE_DESIGN: DesignDocument = {
  schemaVersion: 1,
  requirement: { designFrequencyGHz: 10, beams: [{ thetaDeg: 20, phiDeg: 0 }], polarisation: 'x' },
  panel: {
    operation: 'reflect',
    outline: { kind: 'rectangle', widthMm: 300, heightMm: 300 },
    lattice: { kind: 'rectangular', periodXMm: 15, periodYMm: 15 },
    keepOuts: [],
  },
  illumination: {
    kind: 'horn',
    positionMm: [-82.084, 0, 225.526],
    aimMm: [0, 0, 0],
    exponentE: 6.5,
    exponentH: 6.5,
    polarisation: 'x',
  },
  synthesis: { kind: 'direct' },
  cells: { kind: 'ideal', levels: null },
  referencePhaseDeg: 0,
  prediction: { receiveExponent: 0.5, radiateExponent: 0.5 },
};

/** The example with some of its parts replaced. */
export function exampleDesign(changes: Partial<DesignDocument> = {}): DesignDocument {
  return { ...EXAMPLE_DESIGN, ...changes };
}

/** An example lit from straight above by a plane wave, so that amplitudes are equal. */
export function planeWaveDesign(changes: Partial<DesignDocument> = {}): DesignDocument {
  return exampleDesign({ illumination: { kind: 'plane-wave', thetaDeg: 0, phiDeg: 0, polarisation: 'x' }, ...changes });
}
