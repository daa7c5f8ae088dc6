import { highestNear } from '../synthesis/line-search';

/** Share of the guided power that has leaked after a length: 1 - exp(-2 alpha L). */
export function leakedShare(leakageNpPerM: number, lengthM: number): number {
  return -Math.expm1(-2 * leakageNpPerM * lengthM);
}

/** Taper efficiency of a plane guided wave that leaks evenly: (2 / alpha L) tanh(alpha L / 2). */
export function planeTaperEfficiency(leakageLengthNp: number): number {
  return leakageLengthNp === 0 ? 1 : (2 / leakageLengthNp) * Math.tanh(leakageLengthNp / 2);
}

/** Taper times leaked share of a plane guided wave, 2 (1 - exp(-alpha L))^2 / (alpha L). */
export function planeProduct(leakageLengthNp: number): number {
  return planeTaperEfficiency(leakageLengthNp) * leakedShare(leakageLengthNp, 1);
}

/** The leakage over the whole length, alpha L, with the largest product of taper and leaked share: 1.2564, 0.8145. */
export function bestLeakage(): { readonly leakageLengthNp: number; readonly product: number } {
  const leakageLengthNp = highestNear(planeProduct, 0.2, 6);
  return { leakageLengthNp, product: planeProduct(leakageLengthNp) };
}
