import type { PredictionHead } from '../../../shared/contracts/predictions';
import type { Figures, Verdict } from '../../../shared/model/figures';

/** Invented figures of an invented panel, for specs. */
export const SAMPLE_FIGURES: Figures = {
  frequencyGHz: 28,
  wavelengthMm: 10.7068735,
  cellCount: 1600,
  maxIncidenceDeg: 45.8,
  evanescentCells: 0,
  gratingLobes: [],
  edgeTaperDb: -9.4,
  directivityDbi: 35.5,
  peakThetaDeg: 19.98,
  peakPhiDeg: 0,
  directivityAtBeamDbi: 35.49,
  gainDbi: 34.76,
  gainAtBeamDbi: 34.75,
  pointingErrorDeg: 0.019,
  halfPowerBeamwidthDeg: { along: 3.29, across: 3.13 },
  sidelobeDb: { along: -19.5, across: -20.86, hemisphere: { levelDb: -19.5, thetaDeg: 14.9, phiDeg: 0 } },
  spilloverDb: -0.41,
  taperDb: -0.52,
  phaseErrorRmsDeg: 4.48,
  phaseLossDb: -0.03,
  cellLossDb: -0.21,
  apertureEfficiency: 0.682,
  referencePhaseDeg: 0,
  maskMargin: { kind: 'no-mask', reason: 'No mask is set' },
  highestLobes: [{ levelDb: -19.5, thetaDeg: 14.9, phiDeg: 0 }],
  beams: [{ thetaDeg: 20, phiDeg: 0, directivityDbi: 35.49, gainDbi: 34.75, foundThetaDeg: 19.98, foundPhiDeg: 0, pointingErrorDeg: 0.019 }],
  uncertainty: { gainDbi: 0.002 },
};

export const SAMPLE_VERDICTS: readonly Verdict[] = [
  { line: 'gain', sense: 'at-least', limit: 34, unit: 'dBi', value: 34.76, margin: 0.76, verdict: 'meets' },
  { line: 'sidelobe', sense: 'at-most', limit: -18, unit: 'dB', value: -19.5, margin: 1.5, verdict: 'meets' },
  { line: 'pointing', sense: 'at-most', limit: 0.3, unit: '°', value: 0.019, margin: 0.281, verdict: 'meets' },
];

export const SAMPLE_HEAD: PredictionHead = {
  engineVersion: '1',
  figures: SAMPLE_FIGURES,
  verdicts: [...SAMPLE_VERDICTS],
  warnings: [],
  cellCount: 1600,
};
