import { median } from '../math/statistics';
import type { QualityFinding } from '../model/cell-family';
import { degFromRad, wrapRad } from '../units/angles';
import { SPEED_OF_LIGHT_M_PER_S } from '../units/constants';
import { amplitudeRatioToDb } from '../units/decibels';
import { degreesText } from './angle-text';
import { groundedSlabReflection } from './grid-model';
import { curvePlaces, inGHz, pointIndex, termAt } from './cell-quality-subject';
import type { CurvePlace, JudgedTerm, PointedFinding, QualitySubject } from './cell-quality-subject';

/** Noise of -40 dB moves a phase by about 0.6 degrees, of -26 dB by 3. */
export const NOISE_WARN_DB = -40;
export const NOISE_FAIL_DB = -26;
/** What a phase may differ from the bare slab's before the reference plane is in doubt. */
export const REFERENCE_PLANE_WARN_DEG = 5;
/** A patch this small against the lattice leaves the slab nearly bare: about a degree for 2.2 and a tenth of a wave. */
const SMALL_PATCH = 0.25;

/** Sixth differences: a smooth resonance of 30 degrees a step leaves -65 dB of them, noise stays. */
const DIFFERENCE = [1, -6, 15, -20, 15, -6, 1];
/** Sum of the squares of the weights. */
const DIFFERENCE_POWER = 924;

/** The noise of each cell against full reflection, from what is left of the response after its smooth part is taken away. */
export function checkNoise(subject: QualitySubject): QualityFinding[] {
  return subject.edition.cells.map((cell, index): QualityFinding => {
    const residuals = curvePlaces(subject.edition, index).flatMap((place) => subject.terms.flatMap((term) => roughness(subject, place, term)));
    if (residuals.length === 0) return { check: 'noise', verdict: 'not-evaluated', detail: 'Too few neighbouring points to tell noise from response', cellId: cell.id };
    // |residual|^2 of complex Gaussian noise is exponential, its median ln 2 of its mean; the median does not mind a jump.
    const sigma = median(residuals) / Math.sqrt(DIFFERENCE_POWER * Math.LN2);
    const db = amplitudeRatioToDb(Math.max(sigma, Number.MIN_VALUE));
    const verdict = db > NOISE_FAIL_DB ? 'fail' : db > NOISE_WARN_DB ? 'warn' : 'pass';
    return { check: 'noise', verdict, detail: `Noise about ${db.toFixed(0)} dB against full reflection`, cellId: cell.id, value: db, limit: NOISE_WARN_DB };
  });
}

/** Magnitudes of the sixth differences along one curve, where seven neighbours are given. */
function roughness({ edition, judged }: QualitySubject, place: CurvePlace, term: JudgedTerm): number[] {
  const residuals: number[] = [];
  for (let start = 0; start + DIFFERENCE.length <= edition.responses.frequenciesHz.length; start++) {
    let [re, im] = [0, 0];
    const isWhole = DIFFERENCE.every((weight, i) => {
      const point = pointIndex(edition, place, start + i);
      const value = termAt(edition, point, term.index);
      re += weight * value[0];
      im += weight * value[1];
      return judged[point] === 1;
    });
    if (isWhole) residuals.push(Math.hypot(re, im));
  }
  return residuals;
}

/**
 * Whether phases are given at the top of the slab: the smallest patch must reflect nearly as the bare slab does. A constant
 * lag is a plane in front of it, 2 k0 times the distance.
 */
export function checkReferencePlane(subject: QualitySubject): PointedFinding[] {
  const { edition, judged, designIndex, terms } = subject;
  const unjudged = (detail: string): QualityFinding[] => [{ check: 'reference-plane', verdict: 'not-evaluated', detail }];
  const normal = edition.responses.thetasRad.findIndex((thetaRad) => thetaRad === 0);
  const cell = smallPatch(subject);
  if (cell === null) return unjudged('No patch is small enough against the lattice to compare with the bare slab');
  if (normal < 0 || designIndex === null) return unjudged('No response at normal incidence and the design frequency');
  const point = pointIndex(edition, { cell, theta: normal, phi: 0 }, designIndex);
  if (judged[point] === 0) return unjudged('The smallest patch is not given at the design frequency');
  const { thicknessMm, relativePermittivity, lossTangent } = edition.description.substrate;
  const frequencyHz = edition.responses.frequenciesHz[designIndex];
  const bare = groundedSlabReflection({ thicknessM: thicknessMm / 1e3, relativePermittivity, lossTangent }, { frequencyHz, thetaRad: 0, polarisation: 'te' });
  const [re, im] = termAt(edition, point, terms[0].index);
  const lagRad = wrapRad(Math.atan2(bare.im, bare.re) - Math.atan2(im, re));
  const offsetMm = ((lagRad * SPEED_OF_LIGHT_M_PER_S) / (4 * Math.PI * frequencyHz)) * 1e3;
  const deg = degFromRad(lagRad);
  const isOff = Math.abs(deg) > REFERENCE_PLANE_WARN_DEG;
  const side = offsetMm > 0 ? 'above' : 'below';
  const detail = `The smallest patch (${edition.cells[cell].id}) lags the bare slab by ${degreesText(deg)} at ${inGHz(frequencyHz)}`;
  const meaning = isOff ? `: the reference plane seems to lie ${Math.abs(offsetMm).toFixed(2)} mm ${side} the patches` : '';
  return [{ check: 'reference-plane', verdict: isOff ? 'warn' : 'pass', detail: `${detail}${meaning}`, value: deg, limit: REFERENCE_PLANE_WARN_DEG, point }];
}

/** The smallest cell of a family of plain patches, when it is small enough; null otherwise. */
function smallPatch({ edition }: QualitySubject): number | null {
  const { shapes, operation, periodXMm, parameters } = edition.description;
  const [shape] = shapes;
  const isPlain = operation === 'reflect' && parameters.length === 1 && shapes.length === 1 && shape.kind === 'rectangle' && shape.hole !== true;
  if (!isPlain || edition.cells.length === 0) return null;
  const sides = edition.cells.map(({ parametersMm }) => parametersMm[0]);
  const smallest = sides.indexOf(Math.min(...sides));
  return sides[smallest] <= SMALL_PATCH * periodXMm ? smallest : null;
}
