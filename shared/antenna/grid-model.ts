import { SPEED_OF_LIGHT_M_PER_S } from '../units/constants';

/** A square grid of square patches on a grounded slab. */
export interface PatchGrid {
  readonly periodM: number;
  /** Distance between the edges of neighbouring patches. */
  readonly gapM: number;
  readonly thicknessM: number;
  readonly relativePermittivity: number;
  /** 0 for a lossless slab. */
  readonly lossTangent: number;
}

export interface GridIncidence {
  readonly frequencyHz: number;
  readonly thetaRad: number;
  readonly polarisation: 'te' | 'tm';
}

/** A complex number, exp(+j omega t). */
interface Complex {
  readonly re: number;
  readonly im: number;
}

/**
 * Reflection of a plane wave by a patch grid over a grounded slab, as the ratio of tangential E at the patches:
 * the averaged sheet impedance of the grid in parallel with the shorted slab,
 * Z_g = -j eta_eff / (2 alpha) with alpha = (k_eff D / pi) ln(1 / sin(pi g / 2D)), for TE over 1 - sin^2(theta) / (eps_r + 1);
 * Z_s = j omega mu_0 tan(beta h) / beta, for TM times 1 - sin^2(theta) / eps_r; Gamma = (Z - Z_0) / (Z + Z_0).
 * Source: O. Luukkonen et al., IEEE Trans. Antennas Propag. 56(6), 2008, with its correction of 2010; from memory, equation numbers not checked.
 * Valid for small cells and thick slabs only: see `gridModelWarnings`. Conductor loss is left out; the grid sees the real permittivity.
 * Throws on lengths, permittivities or angles that cannot be.
 */
export function gridReflection(grid: PatchGrid, incidence: GridIncidence): Complex {
  checkGrid(grid, incidence);
  const admittance = normalisedAdmittance(grid, incidence);
  const cosine = Math.cos(incidence.thetaRad);
  // Wave admittance over that of free space: cos(theta) for TE, its inverse for TM.
  const wave = incidence.polarisation === 'te' ? cosine : 1 / cosine;
  return divide({ re: wave - admittance.re, im: -admittance.im }, { re: wave + admittance.re, im: admittance.im });
}

/** eta_0 (1/Z_g + 1/Z_s). */
function normalisedAdmittance(grid: PatchGrid, { frequencyHz, thetaRad, polarisation }: GridIncidence): Complex {
  const { periodM, gapM, thicknessM, relativePermittivity, lossTangent } = grid;
  const k0 = (2 * Math.PI * frequencyHz) / SPEED_OF_LIGHT_M_PER_S; // rad/m
  const sine2 = Math.sin(thetaRad) ** 2;
  const effective = Math.sqrt((relativePermittivity + 1) / 2);
  const alpha = ((k0 * effective * periodM) / Math.PI) * Math.log(1 / Math.sin((Math.PI * gapM) / (2 * periodM)));
  const teFactor = polarisation === 'te' ? 1 - sine2 / (relativePermittivity + 1) : 1;
  const gridSusceptance = 2 * alpha * effective * teFactor;
  const permittivity = { re: relativePermittivity, im: -relativePermittivity * lossTangent };
  const slowness = squareRoot({ re: permittivity.re - sine2, im: permittivity.im }); // beta / k0
  const phase = { re: slowness.re * k0 * thicknessM, im: slowness.im * k0 * thicknessM };
  const impedance = divide(tangent(phase), slowness); // Z_s / (j eta_0), TE
  const inverse = divide({ re: sine2, im: 0 }, permittivity);
  const tm = { re: 1 - inverse.re, im: -inverse.im };
  const slab = polarisation === 'te' ? impedance : { re: impedance.re * tm.re - impedance.im * tm.im, im: impedance.re * tm.im + impedance.im * tm.re };
  const slabAdmittance = divide({ re: 0, im: -1 }, slab);
  return { re: slabAdmittance.re, im: slabAdmittance.im + gridSusceptance };
}

/** The frequency at which the phase of the reflection passes 0, searched upward from 0; or why there is none. */
export type ZeroPhase = { readonly kind: 'found'; readonly frequencyHz: number } | { readonly kind: 'not-reached'; readonly upToHz: number };

const BISECTIONS = 60;

/**
 * Zero-phase frequency below the quarter-wave resonance of the slab, where the susceptance of the grid cancels that of the slab.
 * It grows steadily with frequency from minus infinity, so the one crossing is found by bisection.
 */
export function zeroPhaseFrequency(grid: PatchGrid, thetaRad: number, polarisation: 'te' | 'tm'): ZeroPhase {
  const slowness = Math.sqrt(grid.relativePermittivity - Math.sin(thetaRad) ** 2);
  const upToHz = SPEED_OF_LIGHT_M_PER_S / (4 * grid.thicknessM * slowness);
  const susceptance = (frequencyHz: number) => normalisedAdmittance(grid, { frequencyHz, thetaRad, polarisation }).im;
  checkGrid(grid, { frequencyHz: upToHz, thetaRad, polarisation });
  let [low, high] = [upToHz * 1e-6, upToHz];
  if (susceptance(low) > 0 || susceptance(high) < 0) return { kind: 'not-reached', upToHz };
  for (let i = 0; i < BISECTIONS; i++) {
    const middle = (low + high) / 2;
    if (susceptance(middle) > 0) high = middle;
    else low = middle;
  }
  return { kind: 'found', frequencyHz: (low + high) / 2 };
}

/**
 * Why the model should not be trusted for a grid at a frequency; empty within its range. Outside it half-wave cells came out
 * 20 to 27 % high in frequency against a full-wave computation.
 */
export function gridModelWarnings(grid: PatchGrid, frequencyHz: number): string[] {
  const { periodM, gapM, thicknessM, relativePermittivity } = grid;
  const quarterM = SPEED_OF_LIGHT_M_PER_S / frequencyHz / 4;
  const electricalM = periodM * Math.sqrt((relativePermittivity + 1) / 2);
  const inMm = (lengthM: number) => `${Number((lengthM * 1e3).toPrecision(4))} mm`;
  const warnings: string[] = [];
  if (electricalM > quarterM) warnings.push(`The cell is too large for the grid model: period times root of effective permittivity ${inMm(electricalM)}, at most a quarter wave ${inMm(quarterM)}`);
  if (thicknessM < periodM / 3) warnings.push(`The slab is too thin for the grid model: ${inMm(thicknessM)}, at least a third of the period ${inMm(periodM / 3)}`);
  if (gapM > periodM / 2) warnings.push(`The gaps are too wide for the grid model: ${inMm(gapM)}, at most half the period ${inMm(periodM / 2)}`);
  return warnings;
}

function checkGrid(grid: PatchGrid, { frequencyHz, thetaRad }: GridIncidence): void {
  const { periodM, gapM, thicknessM, relativePermittivity, lossTangent } = grid;
  for (const [name, lengthM] of [['period', periodM], ['gap', gapM], ['thickness', thicknessM]] as const)
    if (!(lengthM > 0 && Number.isFinite(lengthM))) throw new RangeError(`The ${name} must be greater than 0 m; got ${lengthM} m`);
  if (!(gapM < periodM)) throw new RangeError(`The gap must be smaller than the period ${periodM} m; got ${gapM} m`);
  if (!(relativePermittivity >= 1 && Number.isFinite(relativePermittivity))) throw new RangeError(`The relative permittivity must be at least 1; got ${relativePermittivity}`);
  if (!(lossTangent >= 0 && Number.isFinite(lossTangent))) throw new RangeError(`The loss tangent must be at least 0; got ${lossTangent}`);
  if (!(frequencyHz > 0 && Number.isFinite(frequencyHz))) throw new RangeError(`The frequency must be greater than 0 Hz; got ${frequencyHz} Hz`);
  if (!(Math.abs(thetaRad) < Math.PI / 2)) throw new RangeError(`The angle of incidence must be below 90 degrees; got ${thetaRad} rad`);
}

function divide(a: Complex, b: Complex): Complex {
  const size = b.re * b.re + b.im * b.im;
  return { re: (a.re * b.re + a.im * b.im) / size, im: (a.im * b.re - a.re * b.im) / size };
}

/** The root in the right half plane. */
function squareRoot({ re, im }: Complex): Complex {
  const magnitude = Math.hypot(re, im);
  const real = Math.sqrt((magnitude + re) / 2);
  return { re: real, im: real === 0 ? Math.sqrt(magnitude) : im / (2 * real) };
}

/** tan(x + jy) = (sin 2x + j sinh 2y) / (cos 2x + cosh 2y). */
function tangent({ re, im }: Complex): Complex {
  const denominator = Math.cos(2 * re) + Math.cosh(2 * im);
  return { re: Math.sin(2 * re) / denominator, im: Math.sinh(2 * im) / denominator };
}
