import type { ApertureLaw, LawSite } from '../aperture-law';
import { InvalidDesign } from '../invalid-design';
import { directLaw } from '../direct-law';
import type { SiDesign, SiSynthesis } from '../si-design';
import { cellGrid, type CellGrid } from './cell-grid';
import { placedPhaseLaw } from './placed-phase-law';
import { maskBounds, sectorBounds, type Bounds, type BoundsGrid, type Sector } from './projection-bounds';
import { runProjections, type ProjectionProblem, type ProjectionRun } from './projection-run';

type SiProjections = Extract<SiSynthesis, { kind: 'projections' }>;

/** The phases of alternating projections, at the design frequency and with the amplitudes that light the cells. */
export function projectionsLaw(design: SiDesign, site?: LawSite): ApertureLaw {
  if (design.synthesis.kind !== 'projections' || site === undefined) throw new TypeError('projections need their synthesis and a lit lattice');
  const grid = cellGrid(site.lattice);
  const run = remembered(design, () => runFor(design, design.synthesis as SiProjections, site, grid));
  return { ...placedPhaseLaw(grid, run.phaseRad), projections: run };
}

function runFor(design: SiDesign, synthesis: SiProjections, site: LawSite, grid: CellGrid): ProjectionRun {
  const { lattice, light, wavenumber } = site;
  const places = grid.columnCount * grid.rowCount;
  const amplitude = new Float64Array(places);
  const startPhaseRad = new Float64Array(places);
  const start = startPhases(design, synthesis, site);
  for (let n = 0; n < lattice.count; n++) {
    amplitude[grid.placeOf[n]] = light.amplitude[n];
    startPhaseRad[grid.placeOf[n]] = start[n];
  }
  const wavelengthM = (2 * Math.PI) / wavenumber;
  const boundsGrid = { columns: grid.columns, rows: grid.rows, uStep: wavelengthM / (grid.columns * grid.stepXM), vStep: wavelengthM / (grid.rows * grid.stepYM), radiateExponent: design.radiateExponent, copies: grid.copies };
  const bounds = boundsOf(design, synthesis, boundsGrid, amplitude);
  const problem: ProjectionProblem = { ...grid, ...bounds, amplitude, startPhaseRad };
  const watched = [1, 2, 5, 10, 20, ...Array.from({ length: Math.ceil(synthesis.iterations / 50) }, (_, i) => 50 * (i + 1))];
  return runProjections(problem, { iterations: synthesis.iterations, watched });
}

function boundsOf(design: SiDesign, { goal }: SiProjections, grid: BoundsGrid, amplitude: Float64Array): Bounds {
  if (goal.kind === 'mask') {
    return maskBounds(goal, grid, { beams: design.beams.map(({ direction }) => direction), fullField: amplitude.reduce((sum, a) => sum + a, 0) });
  }
  const bounds = sectorBounds(goal, grid, amplitude.reduce((sum, a) => sum + a * a, 0));
  if (bounds.heldCount > 0) return bounds;
  throw new InvalidDesign([{ pointer: '#/synthesis/goal/sectors', detail: 'no sample of the pattern lies in a sector: it is narrower than a beam of this panel, or not in front of it' }]);
}

/** Bend of the phase at the rim from which beams start: all cells in step, the pattern is real and clipping never turns a phase. */
const BEND_RAD = 0.4;

/** The broad beam from which projections start; a random start would end in a poor local minimum. */
function startPhases(design: SiDesign, { goal }: SiProjections, { lattice, wavenumber }: LawSite): Float64Array {
  const phases = new Float64Array(lattice.count);
  if (goal.kind === 'mask') {
    const law = directLaw(design);
    const [halfX, halfY] = [reach(lattice.xM), reach(lattice.yM)];
    const bend = (n: number): number => BEND_RAD * ((lattice.xM[n] / halfX) ** 2 + (lattice.yM[n] / halfY) ** 2);
    return phases.map((_, n) => law.phaseRad(wavenumber, lattice.xM[n], lattice.yM[n]) + bend(n));
  }
  const [halfX, halfY] = [reach(lattice.xM), reach(lattice.yM)];
  const spreads = goal.sectors.map((sector) => spreadOf(sector, halfX, halfY));
  return phases.map((_, n) => {
    let [re, im] = [0, 0];
    for (const spread of spreads) {
      const phase = -wavenumber * spread(lattice.xM[n], lattice.yM[n]);
      re += Math.cos(phase);
      im += Math.sin(phase);
    }
    return Math.atan2(im, re);
  });
}

const reach = (values: Float64Array): number => values.reduce((most, value) => Math.max(most, Math.abs(value)), 1e-9);

/** Path whose slope runs evenly over the sector from one side of the panel to the other: centre x + half x^2 / (2 reach). */
function spreadOf({ azimuthRad, elevationRad }: Sector, halfX: number, halfY: number): (xM: number, yM: number) => number {
  const ends = (range: readonly [number, number], scale: number): [number, number] => [Math.sin(range[0]) * scale, Math.sin(range[1]) * scale];
  const [v1, v2] = ends(elevationRad, 1);
  const [u1, u2] = ends(azimuthRad, Math.cos((elevationRad[0] + elevationRad[1]) / 2));
  const part = (a: number, b: number, at: number, half: number): number => ((a + b) / 2) * at + (((b - a) / 2) * at * at) / (2 * half);
  return (xM, yM) => part(u1, u2, xM, halfX) + part(v1, v2, yM, halfY);
}

/** Runs kept: a live preview asks for the same one again with every other cut or frequency. */
const KEPT = 4;
const kept = new Map<string, ProjectionRun>();

function remembered(design: SiDesign, make: () => ProjectionRun): ProjectionRun {
  const key = JSON.stringify({ ...design, referencePhaseRad: 0 });
  const known = kept.get(key);
  if (known) return known;
  const run = make();
  if (kept.size >= KEPT) kept.delete(kept.keys().next().value ?? '');
  kept.set(key, run);
  return run;
}
