import { unwrapPhasesRad } from '../math/unwrap-phase';
import type { FamilyCurve, ResponseTerm } from './family-inspection';

/** One term of a curve as it is looked at before an import is accepted. All of it can be carried by JSON. */
export interface PreviewTerm {
  readonly term: ResponseTerm;
  /** null where the term is exactly zero: it has no level. */
  readonly magnitudeDb: readonly (number | null)[];
  /** Unwrapped along frequency, degrees. */
  readonly phaseDeg: readonly number[];
}

export interface CurvePreview {
  readonly file: string;
  readonly cellId: string;
  readonly thetaDeg: number;
  readonly phiDeg: number;
  readonly frequenciesGHz: readonly number[];
  readonly terms: readonly PreviewTerm[];
  /** Points of the file; more than are previewed when the curve was thinned. */
  readonly pointCount: number;
}

/** More points than a plot has pixels tell nothing more. */
const MOST_POINTS = 501;
const TERMS: readonly ResponseTerm[] = ['S11', 'S12', 'S21', 'S22'];

/**
 * Magnitude and unwrapped phase of a curve as read, before any conjugation. The phase is unwrapped on every point and thinned
 * afterwards, so a thinned curve shows no false wraps. Terms that are zero throughout are left out.
 */
export function previewCurve(curve: FamilyCurve): CurvePreview {
  const { portCount, frequenciesHz, values } = curve;
  const pointCount = frequenciesHz.length;
  const step = Math.max(1, Math.ceil((pointCount - 1) / (MOST_POINTS - 1)));
  const kept = Array.from({ length: pointCount }, (_, i) => i).filter((i) => i % step === 0 || i === pointCount - 1);
  const terms = (portCount === 1 ? TERMS.slice(0, 1) : TERMS).flatMap((term, place): PreviewTerm[] => {
    const parts = Array.from({ length: pointCount }, (_, i) => {
      const at = 2 * (i * portCount ** 2 + place);
      return [values[at], values[at + 1]] as const;
    });
    const magnitudes = parts.map(([re, im]) => Math.hypot(re, im));
    if (magnitudes.every((magnitude) => magnitude === 0)) return [];
    // Adding 0 makes -0 a plain 0, which JSON can carry.
    const phases = unwrapPhasesRad(parts.map(([re, im]) => Math.atan2(im, re) + 0)).map((phase) => phase + 0);
    return [{ term, magnitudeDb: kept.map((i) => (magnitudes[i] === 0 ? null : 20 * Math.log10(magnitudes[i]))), phaseDeg: kept.map((i) => (phases[i] * 180) / Math.PI) }];
  });
  return { file: curve.file, cellId: curve.cellId, thetaDeg: curve.thetaDeg, phiDeg: curve.phiDeg, frequenciesGHz: kept.map((i) => frequenciesHz[i] / 1e9), terms, pointCount };
}
