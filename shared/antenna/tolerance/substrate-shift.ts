import { nearestBranchRad } from '../../math/unwrap-phase';
import type { EditionAtFrequency } from '../edition-at-frequency';
import { groundedSlabReflection, type GridIncidence, type GroundedSlab } from '../grid-model';
import type { PreparedEdition } from '../prepare-edition';

interface Complex {
  readonly re: number;
  readonly im: number;
}

/** What the substrate differs by from that of the cell data. */
export interface SubstrateShift {
  readonly permittivity?: number;
  readonly thicknessM?: number;
}

/**
 * ESTIMATE of an edition's responses on another substrate. Each cell is taken for a thin sheet on a grounded slab: the sheet's
 * admittance is what the data leave when the slab's (exact line theory) is taken out, Y_sheet = Y - Y_slab. On another thickness
 * the sheet stays. On another permittivity it is that of patches in a medium of (eps_r + 1) / 2, so it scales as
 * Y'(f) = sqrt(r) Y(f sqrt(r)), r the ratio of those mean permittivities; the slab is recomputed.
 * Valid for reflecting cells of one layer on metal. Fields that reach from the patch edges to the metal are left out: a slab
 * thickened by 3.4 % (3 mm and 1 mm per 5 mm period, two full-wave data sets of one solver) turned the phase near resonance by
 * 7.8 degrees, the estimate says 13.3; away from resonance both agree to about 1 degree.
 */
export function shiftedEdition(prepared: PreparedEdition, frequencyHz: number, shift: SubstrateShift): EditionAtFrequency {
  const { substrate } = prepared.edition.description;
  const drawn: GroundedSlab = { thicknessM: substrate.thicknessMm * 1e-3, relativePermittivity: substrate.relativePermittivity, lossTangent: substrate.lossTangent };
  const made: GroundedSlab = {
    ...drawn,
    thicknessM: drawn.thicknessM + (shift.thicknessM ?? 0),
    relativePermittivity: drawn.relativePermittivity + (shift.permittivity ?? 0),
  };
  const stretch = Math.sqrt((made.relativePermittivity + 1) / (drawn.relativePermittivity + 1));
  const at = prepared.atFrequency(frequencyHz);
  const source = stretch === 1 ? at : prepared.atFrequency(frequencyHz * stretch);
  const turns = nodeIncidences(prepared, frequencyHz).map((incidence) => sheetTurn({ incidence, drawn, made, stretch }));
  const phaseRad = at.phaseRad.slice();
  const logMagnitude = at.logMagnitude.slice();
  for (let i = 0; i < phaseRad.length; i++) {
    const size = Math.exp(source.logMagnitude[i]);
    const turned = turns[i % turns.length]({ re: size * Math.cos(source.phaseRad[i]), im: size * Math.sin(source.phaseRad[i]) });
    phaseRad[i] = nearestBranchRad(Math.atan2(turned.im, turned.re), at.phaseRad[i]);
    logMagnitude[i] = Math.log(Math.max(1e-12, Math.hypot(turned.re, turned.im)));
  }
  return { ...at, phaseRad, logMagnitude };
}

/** The incidence of every entry and node of one cell, in the order of the tables. Ports x and y are taken as TE and TM. */
function nodeIncidences(prepared: PreparedEdition, frequencyHz: number): GridIncidence[] {
  const { thetasRad } = prepared.edition.responses;
  const azimuths = prepared.azimuths.indices.length;
  return prepared.ports.entries.flatMap((_, e) =>
    Array.from(thetasRad).flatMap((thetaRad) => Array.from({ length: azimuths }, (): GridIncidence => ({ frequencyHz, thetaRad, polarisation: e === 0 ? 'te' : 'tm' }))),
  );
}

interface SheetCase {
  readonly incidence: GridIncidence;
  readonly drawn: GroundedSlab;
  readonly made: GroundedSlab;
  readonly stretch: number;
}

/**
 * With w the wave admittance and B = Y_slab' - s Y_slab, both over that of free space:
 * Gamma' = [w (1 + G) - s w (1 - G) - B (1 + G)] / [w (1 + G) + s w (1 - G) + B (1 + G)], regular at G = -1.
 */
function sheetTurn({ incidence, drawn, made, stretch }: SheetCase): (response: Complex) => Complex {
  const cosine = Math.cos(incidence.thetaRad);
  const wave = incidence.polarisation === 'te' ? cosine : 1 / cosine;
  const before = slabAdmittance(drawn, { ...incidence, frequencyHz: incidence.frequencyHz * stretch }, wave);
  const after = slabAdmittance(made, incidence, wave);
  const change = { re: after.re - stretch * before.re, im: after.im - stretch * before.im };
  return (g) => {
    const plus = { re: 1 + g.re, im: g.im };
    const minus = { re: stretch * wave * (1 - g.re), im: -stretch * wave * g.im };
    const load = { re: minus.re + change.re * plus.re - change.im * plus.im, im: minus.im + change.re * plus.im + change.im * plus.re };
    return divide({ re: wave * plus.re - load.re, im: wave * plus.im - load.im }, { re: wave * plus.re + load.re, im: wave * plus.im + load.im });
  };
}

/** Slab thinner than half a wave, so that it is no short at its top. */
function slabAdmittance(slab: GroundedSlab, incidence: GridIncidence, wave: number): Complex {
  const { re, im } = groundedSlabReflection(slab, incidence);
  const quotient = divide({ re: 1 - re, im: -im }, { re: 1 + re, im });
  return { re: wave * quotient.re, im: wave * quotient.im };
}

function divide(a: Complex, b: Complex): Complex {
  const size = b.re * b.re + b.im * b.im;
  return { re: (a.re * b.re + a.im * b.im) / size, im: (a.im * b.re - a.re * b.im) / size };
}
