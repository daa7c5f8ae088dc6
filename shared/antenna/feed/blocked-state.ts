import type { BlockageFigures } from '../../model/law-figures';
import { amplitudeRatioToDb, powerRatioToDb } from '../../units/decibels';
import type { CellResponses } from '../cell-stock';
import type { CellIllumination } from '../illumination';
import { noFigure } from '../no-figure';
import type { PanelLattice } from '../panel-lattice';
import type { SiDesign } from '../si-design';
import { shadowedCells } from './feed-shadow';

/** Cells in the shadow that the horn and its mount throw along the first beam; undefined where none is described or the horn is behind. */
export function shadowOf({ illumination, operation, beams }: SiDesign, lattice: PanelLattice): Uint8Array | undefined {
  if (illumination.kind !== 'horn' || illumination.blockageRadiusM === undefined || operation !== 'reflect') return undefined;
  return shadowedCells(lattice, { position: illumination.position, radiusM: illumination.blockageRadiusM }, beams[0].direction);
}

/** Null field: what a shadowed cell re-radiates is taken away. */
export function openResponses(responses: CellResponses, shadow: Uint8Array | undefined): CellResponses {
  return shadow ? { phaseRad: responses.phaseRad, magnitude: responses.magnitude.map((size, n) => (shadow[n] === 1 ? 0 : size)) } : responses;
}

export interface BlockageQuery {
  readonly si: SiDesign;
  readonly lattice: PanelLattice;
  readonly light: CellIllumination;
  readonly responses: CellResponses;
  readonly shadow: Uint8Array;
  readonly wavenumber: number;
}

/** At the beam 20 log |sum of the open cells / sum of all|; in power the share that the open cells leave. */
export function blockageFigures({ si, lattice, light, responses, shadow, wavenumber }: BlockageQuery): BlockageFigures {
  const { u, v } = si.beams[0].direction;
  const open = [0, 0, 0];
  const all = [0, 0, 0];
  let cells = 0;
  for (let n = 0; n < lattice.count; n++) {
    const size = light.amplitude[n] * responses.magnitude[n];
    const phase = responses.phaseRad[n] + wavenumber * (lattice.xM[n] * u + lattice.yM[n] * v - light.pathM[n]);
    const term = [size * Math.cos(phase), size * Math.sin(phase), size * size];
    cells += shadow[n];
    term.forEach((part, i) => {
      all[i] += part;
      if (shadow[n] === 0) open[i] += part;
    });
  }
  const field = Math.hypot(open[0], open[1]) / Math.hypot(all[0], all[1]);
  const gone = noFigure('all-blocked', 'the feed stands in the way of every lit cell');
  return { cells, atBeamDb: field > 0 ? amplitudeRatioToDb(field) : gone, powerDb: open[2] > 0 ? powerRatioToDb(open[2] / all[2]) : gone };
}
