import { randomStream, type RandomStream } from '../../math/seeded-random';
import { CONTRIBUTORS } from '../../model/tolerance-contributors';
import type { ContributorId, ToleranceContributor } from '../../model/tolerance-run';
import { radFromDeg } from '../../units/angles';
import type { PanelLattice } from '../panel-lattice';

/** What one panel made differs by from the panel drawn: SI and radians. What is not named is as drawn. */
export interface Deviations {
  /** One value for the whole panel: m, K, rad or a plain number. */
  readonly panel: ReadonlyMap<ContributorId, number>;
  /** One value for each cell. */
  readonly cells: ReadonlyMap<ContributorId, Float64Array>;
  /** 1 where a cell returns nothing. */
  readonly dead: Uint8Array | null;
}

export const NO_DEVIATIONS: Deviations = { panel: new Map(), cells: new Map(), dead: null };

const SI_PER_UNIT = { mm: 1e-3, '': 1, K: 1, '°': radFromDeg(1) } as const;

/** A spread of the options in SI. */
export function spreadSi({ id, spread }: ToleranceContributor): number {
  return spread * SI_PER_UNIT[CONTRIBUTORS[id].unit];
}

/**
 * Place of each cell's draw in a stream: column by column from the lowest x, within a column from the lowest y, over the
 * full grid, so that a cell keeps its draw when others are left out.
 */
export function drawPlaces({ grid, column, row }: PanelLattice): Int32Array {
  return column.map((c, n) => c * grid.rowCount + row[n]);
}

/** Draws the deviations of trials; the same trial gives the same bits wherever and in whatever order it is drawn. */
export function deviationDrawer(lattice: PanelLattice, seed: number): (trial: number, contributors: readonly ToleranceContributor[]) => Deviations {
  const places = drawPlaces(lattice);
  const draws = new Float64Array(lattice.grid.columnCount * lattice.grid.rowCount);
  return (trial, contributors) => {
    const panel = new Map<ContributorId, number>();
    const cells = new Map<ContributorId, Float64Array>();
    let dead: Uint8Array | null = null;
    for (const contributor of contributors) {
      if (contributor.spread === 0) continue;
      const { channel, extent } = CONTRIBUTORS[contributor.id];
      const stream = randomStream({ seed, trial, channel });
      const size = spreadSi(contributor);
      if (extent === 'panel') panel.set(contributor.id, size * panelDraw(stream, contributor));
      else if (contributor.distribution === 'share') dead = deadCells(stream, { places, draws, share: size });
      else cells.set(contributor.id, cellDraws(stream, contributor, { places, draws, size }));
    }
    return { panel, cells, dead };
  };
}

function panelDraw(stream: RandomStream, { distribution }: ToleranceContributor): number {
  return distribution === 'uniform' ? 2 * stream.uniformAt(0) - 1 : stream.normalAt(0);
}

function cellDraws(stream: RandomStream, { distribution }: ToleranceContributor, { places, draws, size }: { places: Int32Array; draws: Float64Array; size: number }): Float64Array {
  const values = new Float64Array(places.length);
  if (distribution === 'uniform') {
    stream.fillUniforms(draws);
    for (let n = 0; n < values.length; n++) values[n] = size * (2 * draws[places[n]] - 1);
    return values;
  }
  stream.fillNormals(draws);
  for (let n = 0; n < values.length; n++) values[n] = size * draws[places[n]];
  return values;
}

function deadCells(stream: RandomStream, { places, draws, share }: { places: Int32Array; draws: Float64Array; share: number }): Uint8Array {
  stream.fillUniforms(draws);
  return Uint8Array.from(places, (place) => (draws[place] < share ? 1 : 0));
}
