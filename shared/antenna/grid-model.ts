import { SPEED_OF_LIGHT_M_PER_S } from '../units/constants';

/** A slab on metal. */
export interface GroundedSlab {
  readonly thicknessM: number;
  readonly relativePermittivity: number;
  /** 0 for a lossless slab. */
  readonly lossTangent: number;
}

/** A square grid of square patches on a grounded slab. */
export interface PatchGrid extends GroundedSlab {
  readonly periodM: number;
  /** Distance between the edges of neighbouring patches. */
  readonly gapM: number;
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
  return reflectionOf(slabAdmittance(grid, incidence), gridSusceptance(grid, incidence), incidence);
}

/**
 * Reflection of a plane wave by a bare slab on metal, as the ratio of tangential E at its top: exact transmission-line theory,
 * Z_s as in `gridReflection`. What a grid of vanishing patches tends to. Throws as `gridReflection` does.
 */
export function groundedSlabReflection(slab: GroundedSlab, incidence: GridIncidence): Complex {
  checkSlab(slab, incidence);
  return reflectionOf(slabAdmittance(slab, incidence), 0, incidence);
}

/** An admittance as a quotient: a slab of half a wave has an infinite one, and its reflection is still a number. */
interface Quotient {
  readonly numerator: Complex;
  readonly denominator: Complex;
}

function reflectionOf({ numerator, denominator }: Quotient, susceptance: number, { thetaRad, polarisation }: GridIncidence): Complex {
  const cosine = Math.cos(thetaRad);
  // Wave admittance over that of free space: cos(theta) for TE, its inverse for TM.
  const wave = polarisation === 'te' ? cosine : 1 / cosine;
  const sheet = { re: numerator.re - susceptance * denominator.im, im: numerator.im + susceptance * denominator.re };
  return divide(
    { re: wave * denominator.re - sheet.re, im: wave * denominator.im - sheet.im },
    { re: wave * denominator.re + sheet.re, im: wave * denominator.im + sheet.im },
  );
}

/** eta_0 / Z_g over j. */
function gridSusceptance(grid: PatchGrid, { frequencyHz, thetaRad, polarisation }: GridIncidence): number {
  const { periodM, gapM, relativePermittivity } = grid;
  const k0 = (2 * Math.PI * frequencyHz) / SPEED_OF_LIGHT_M_PER_S; // rad/m
  const effective = Math.sqrt((relativePermittivity + 1) / 2);
  const alpha = ((k0 * effective * periodM) / Math.PI) * Math.log(1 / Math.sin((Math.PI * gapM) / (2 * periodM)));
  const teFactor = polarisation === 'te' ? 1 - Math.sin(thetaRad) ** 2 / (relativePermittivity + 1) : 1;
  return 2 * alpha * effective * teFactor;
}

/** eta_0 / Z_s = -j (beta / k0) cos(beta h) / sin(beta h), for TM over 1 - sin^2(theta) / eps_r. */
function slabAdmittance({ thicknessM, relativePermittivity, lossTangent }: GroundedSlab, { frequencyHz, thetaRad, polarisation }: GridIncidence): Quotient {
  const k0 = (2 * Math.PI * frequencyHz) / SPEED_OF_LIGHT_M_PER_S; // rad/m
  const sine2 = Math.sin(thetaRad) ** 2;
  const permittivity = { re: relativePermittivity, im: -relativePermittivity * lossTangent };
  const slowness = squareRoot({ re: permittivity.re - sine2, im: permittivity.im }); // beta / k0
  const [x, y] = [slowness.re * k0 * thicknessM, slowness.im * k0 * thicknessM];
  const sine = { re: Math.sin(x) * Math.cosh(y), im: Math.cos(x) * Math.sinh(y) };
  const cosine = { re: Math.cos(x) * Math.cosh(y), im: -Math.sin(x) * Math.sinh(y) };
  const tilted = divide({ re: sine2, im: 0 }, permittivity);
  const denominator = polarisation === 'te' ? sine : times(sine, { re: 1 - tilted.re, im: -tilted.im });
  return { numerator: times({ re: slowness.im, im: -slowness.re }, cosine), denominator };
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
  const susceptance = (frequencyHz: number) => {
    const incidence: GridIncidence = { frequencyHz, thetaRad, polarisation };
    const { numerator, denominator } = slabAdmittance(grid, incidence);
    return divide(numerator, denominator).im + gridSusceptance(grid, incidence);
  };
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

function checkGrid(grid: PatchGrid, incidence: GridIncidence): void {
  checkLength('period', grid.periodM);
  checkLength('gap', grid.gapM);
  if (!(grid.gapM < grid.periodM)) throw new RangeError(`The gap must be smaller than the period ${grid.periodM} m; got ${grid.gapM} m`);
  checkSlab(grid, incidence);
}

function checkLength(name: string, lengthM: number): void {
  if (!(lengthM > 0 && Number.isFinite(lengthM))) throw new RangeError(`The ${name} must be greater than 0 m; got ${lengthM} m`);
}

function checkSlab({ thicknessM, relativePermittivity, lossTangent }: GroundedSlab, { frequencyHz, thetaRad }: GridIncidence): void {
  checkLength('thickness', thicknessM);
  if (!(relativePermittivity >= 1 && Number.isFinite(relativePermittivity))) throw new RangeError(`The relative permittivity must be at least 1; got ${relativePermittivity}`);
  if (!(lossTangent >= 0 && Number.isFinite(lossTangent))) throw new RangeError(`The loss tangent must be at least 0; got ${lossTangent}`);
  if (!(frequencyHz > 0 && Number.isFinite(frequencyHz))) throw new RangeError(`The frequency must be greater than 0 Hz; got ${frequencyHz} Hz`);
  if (!(Math.abs(thetaRad) < Math.PI / 2)) throw new RangeError(`The angle of incidence must be below 90 degrees; got ${thetaRad} rad`);
}

function times(a: Complex, b: Complex): Complex {
  return { re: a.re * b.re - a.im * b.im, im: a.re * b.im + a.im * b.re };
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
