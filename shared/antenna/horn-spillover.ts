import { hornAxis, hornPower, hornSampler } from './horn-field';
import { integrateOverOutline } from './outline-integral';
import { outlineBounds } from './outline';
import type { SiHorn, SiOutline, SiPoint } from './si-design';

export interface CapturedShare {
  /** Share of the horn's power that hits the outline, 0 to 1. */
  readonly fraction: number;
  /** Difference from a coarser rule: an upper estimate of the error of `fraction`. */
  readonly uncertainty: number;
}

/**
 * Share of the horn's power that hits the outline: the integral of U cos(incidence) / R^2 over the outline with U the
 * power pattern normalised to the horn's power (A. Yu et al., Microw. Opt. Technol. Lett. 52(2), 364-372, 2010, from
 * memory). Integrated along the true edge, not summed over cells. It counts keep-outs as part of the panel.
 */
export function hornCapturedShare(horn: SiHorn, outline: SiOutline): CapturedShare {
  const sampleAt = hornSampler(horn);
  const power = hornPower(horn);
  return capturedShare(horn, outline, (xM, yM) => {
    const sample = sampleAt(xM, yM);
    return (sample.field * sample.field * sample.cosIncidence) / power;
  });
}

/** Integral over the outline of a density of the horn's power on the plane of the panel, given as a share of that power. */
export function capturedShare(horn: SiHorn, outline: SiOutline, density: (xM: number, yM: number) => number): CapturedShare {
  const pivot = brightestPoint(horn, outline);
  // The footprint of cos^2q seen from height h falls off over about h / sqrt(q + 1).
  const partM = Math.abs(horn.position.zM) / Math.sqrt(Math.max(horn.exponentE, horn.exponentH) + 1);
  const fine = integrateOverOutline(outline, density, { nodes: 16, partM, pivot });
  const coarse = integrateOverOutline(outline, density, { nodes: 11, partM, pivot });
  return { fraction: Math.min(1, Math.max(0, fine)), uncertainty: Math.abs(fine - coarse) };
}

/** Where the axis meets the panel plane, kept within the outline's bounding rectangle. */
function brightestPoint(horn: SiHorn, outline: SiOutline): SiPoint {
  const [bx, by, bz] = hornAxis(horn);
  const { leftM, rightM, bottomM, topM } = outlineBounds(outline);
  const along = bz === 0 ? 0 : Math.max(0, -horn.position.zM / bz);
  const clamp = (value: number, low: number, high: number): number => Math.min(high, Math.max(low, value));
  return {
    xM: clamp(horn.position.xM + along * bx, leftM, rightM),
    yM: clamp(horn.position.yM + along * by, bottomM, topM),
  };
}
