import type { DesignDocument } from '../../shared/model/design-document';

export interface TestDesign {
  readonly frequencyGHz: number;
  readonly periodMm: number;
  readonly columns: number;
  readonly rows: number;
  readonly beams?: DesignDocument['requirement']['beams'];
  readonly illumination?: DesignDocument['illumination'];
  readonly cells?: DesignDocument['cells'];
  readonly referencePhaseDeg?: DesignDocument['referencePhaseDeg'];
  readonly synthesis?: DesignDocument['synthesis'];
  readonly receiveExponent?: number;
  readonly radiateExponent?: number;
}

/** A design document of a rectangular panel for a check; what is not given is plain. */
export function testDesign(given: TestDesign): DesignDocument {
  return {
    schemaVersion: 1,
    requirement: { designFrequencyGHz: given.frequencyGHz, beams: given.beams ?? [{ thetaDeg: 0, phiDeg: 0 }], polarisation: 'x' },
    panel: {
      operation: 'reflect',
      outline: { kind: 'rectangle', widthMm: given.columns * given.periodMm, heightMm: given.rows * given.periodMm },
      lattice: { kind: 'rectangular', periodXMm: given.periodMm, periodYMm: given.periodMm },
      keepOuts: [],
    },
    illumination: given.illumination ?? { kind: 'plane-wave', thetaDeg: 0, phiDeg: 0, polarisation: 'x' },
    synthesis: given.synthesis ?? { kind: 'direct' },
    cells: given.cells ?? { kind: 'ideal', levels: null },
    referencePhaseDeg: given.referencePhaseDeg ?? 0,
    prediction: { receiveExponent: given.receiveExponent ?? 0.5, radiateExponent: given.radiateExponent ?? 0.5 },
  };
}

export function hornAt(positionMm: readonly number[], exponent: number): Extract<DesignDocument['illumination'], { kind: 'horn' }> {
  const [x, y, z] = positionMm;
  return { kind: 'horn', positionMm: [x, y, z], aimMm: [0, 0, 0], exponentE: exponent, exponentH: exponent, polarisation: 'x' };
}

/** The frequency at which a wavelength is 100 mm, so that 1 mm is a hundredth of a wavelength. */
export const FREQUENCY_OF_100_MM_GHZ = 2.99792458;
