import type { FarFieldSample } from './far-field';
import { directivityRatioAt, type RadiationPattern } from './radiation-pattern';

/** A local maximum of directivity. */
export interface PatternPeak {
  readonly u: number;
  readonly v: number;
  readonly directivityRatio: number;
  /** Length of the last step in (u, v): how far the place may still be off. */
  readonly lastStep: number;
}

const MOST_STEPS = 60;
const FINISHED_STEP = 1e-10;
/** The chart (u, v) ends at the horizon; a peak there is one of the rim. */
const RIM = 1 - 1e-9;

/**
 * Climbs to the local maximum of directivity from a start, by Newton's method on its logarithm with exact derivatives,
 * by short steps along the gradient where the surface is not yet a hill. A step is taken only when it climbs.
 */
export function refinePeak(pattern: RadiationPattern, startU: number, startV: number): PatternPeak {
  const { grid } = pattern.spectrum;
  const sideM = Math.max(grid.columnCount * grid.stepXM, grid.rowCount * grid.stepYM);
  // A quarter of the beamwidth of a uniform aperture of this size.
  const longestStep = Math.min(0.2, (Math.PI / 2) / (pattern.wavenumber * sideM));
  let [u, v] = ontoDisc(startU, startV);
  let best = directivityRatioAt(pattern, u, v);
  let lastStep = longestStep;
  for (let i = 0; i < MOST_STEPS; i++) {
    const [du, dv] = limited(climbStep(pattern, u, v, longestStep), longestStep);
    let scale = 1;
    let climbed = false;
    while (scale > 1e-4) {
      const [nextU, nextV] = ontoDisc(u + scale * du, v + scale * dv);
      const value = directivityRatioAt(pattern, nextU, nextV);
      if (value > best) {
        lastStep = Math.hypot(nextU - u, nextV - v);
        [u, v, best, climbed] = [nextU, nextV, value, true];
        break;
      }
      scale /= 4;
    }
    if (!climbed) return { u, v, directivityRatio: best, lastStep: Math.min(lastStep, Math.hypot(du, dv)) };
    if (lastStep < FINISHED_STEP) break;
  }
  return { u, v, directivityRatio: best, lastStep };
}

/** Newton's step where the logarithm curves down in every direction, else one along its gradient. */
function climbStep(pattern: RadiationPattern, u: number, v: number, longestStep: number): [number, number] {
  const { gu, gv, huu, huv, hvv } = pattern.blend ? blendedSlope(pattern, u, v, longestStep) : elementSlope(pattern, u, v);
  const determinant = huu * hvv - huv * huv;
  if (huu < 0 && determinant > 1e-12 * huu * huu) {
    return [(huv * gv - hvv * gu) / determinant, (huv * gu - huu * gv) / determinant];
  }
  const steepness = Math.hypot(gu, gv);
  return steepness === 0 ? [0, 0] : [(gu / steepness) * longestStep, (gv / steepness) * longestStep];
}

interface LogSlope {
  readonly gu: number;
  readonly gv: number;
  readonly huu: number;
  readonly huv: number;
  readonly hvv: number;
}

function elementSlope(pattern: RadiationPattern, u: number, v: number): LogSlope {
  const slope = logSlope(pattern.farField.derivativesAt(u, v));
  const wSquared = Math.max(1 - u * u - v * v, 1e-12);
  // ln cos^2b(theta) = b ln(1 - u^2 - v^2)
  const b = pattern.radiateExponent;
  return {
    gu: slope.gu - (2 * b * u) / wSquared,
    gv: slope.gv - (2 * b * v) / wSquared,
    huu: slope.huu - 2 * b * (1 / wSquared + (2 * u * u) / (wSquared * wSquared)),
    hvv: slope.hvv - 2 * b * (1 / wSquared + (2 * v * v) / (wSquared * wSquared)),
    huv: slope.huv - (4 * b * u * v) / (wSquared * wSquared),
  };
}

/** Central differences over a thirtieth of the longest step, itself a quarter of a beamwidth: they steer the climb and do not move its end. */
function blendedSlope(pattern: RadiationPattern, u: number, v: number, longestStep: number): LogSlope {
  const step = longestStep / 30;
  const at = (i: number, j: number): number => Math.log(Math.max(1e-300, directivityRatioAt(pattern, u + i * step, v + j * step)));
  const [middle, right, left, above, below] = [at(0, 0), at(1, 0), at(-1, 0), at(0, 1), at(0, -1)];
  return {
    gu: (right - left) / (2 * step),
    gv: (above - below) / (2 * step),
    huu: (right - 2 * middle + left) / (step * step),
    hvv: (above - 2 * middle + below) / (step * step),
    huv: (at(1, 1) - at(1, -1) - at(-1, 1) + at(-1, -1)) / (4 * step * step),
  };
}

/** Gradient and second derivatives of ln |F|^2: 2 Re(F_u / F) and 2 Re(F_uv / F - F_u F_v / F^2). */
function logSlope(s: FarFieldSample): LogSlope {
  const power = Math.max(s.re * s.re + s.im * s.im, 1e-300);
  const over = (re: number, im: number): [number, number] => [(re * s.re + im * s.im) / power, (im * s.re - re * s.im) / power];
  const [uRe, uIm] = over(s.uRe, s.uIm);
  const [vRe, vIm] = over(s.vRe, s.vIm);
  const [uuRe] = over(s.uuRe, s.uuIm);
  const [uvRe] = over(s.uvRe, s.uvIm);
  const [vvRe] = over(s.vvRe, s.vvIm);
  return {
    gu: 2 * uRe,
    gv: 2 * vRe,
    huu: 2 * (uuRe - (uRe * uRe - uIm * uIm)),
    huv: 2 * (uvRe - (uRe * vRe - uIm * vIm)),
    hvv: 2 * (vvRe - (vRe * vRe - vIm * vIm)),
  };
}

function limited([du, dv]: [number, number], longest: number): [number, number] {
  const length = Math.hypot(du, dv);
  return length > longest ? [(du * longest) / length, (dv * longest) / length] : [du, dv];
}

function ontoDisc(u: number, v: number): [number, number] {
  const radius = Math.hypot(u, v);
  return radius > RIM ? [(u * RIM) / radius, (v * RIM) / radius] : [u, v];
}
