import type { ApertureLaw, LawSite } from '../aperture-law';
import type { SiDesign } from '../si-design';
import { cellGrid } from './cell-grid';
import { searchBoard, type BoardSearch } from './diffuse-board';
import { placedPhaseLaw } from './placed-phase-law';

const KEPT = 4;
const kept = new Map<string, BoardSearch>();

/**
 * Blocks of cells in states that scatter as evenly as the search finds. The states are what the cells add to the incident
 * wave, as on a plate; so the law holds the incident phase, and the target is the state itself.
 */
export function diffuseLaw(design: SiDesign, site?: LawSite): ApertureLaw {
  const { synthesis } = design;
  if (synthesis.kind !== 'diffuse' || site === undefined) throw new TypeError('a diffuse law needs its synthesis and a lit lattice');
  const { lattice, light, wavenumber } = site;
  const grid = cellGrid(lattice);
  const columns = Math.ceil(lattice.grid.columnCount / synthesis.blockColumns);
  const rows = Math.ceil(lattice.grid.rowCount / synthesis.blockRows);
  const board = remembered(JSON.stringify([synthesis, columns, rows]), () => searchBoard({ ...synthesis, columns, rows }));
  const stateRad = new Float64Array(grid.columnCount * grid.rowCount);
  const pathM = new Float64Array(stateRad.length);
  for (let n = 0; n < lattice.count; n++) {
    const block = Math.floor(lattice.row[n] / synthesis.blockRows) * columns + Math.floor(lattice.column[n] / synthesis.blockColumns);
    stateRad[grid.placeOf[n]] = (2 * Math.PI * board.state[block]) / synthesis.states;
    pathM[grid.placeOf[n]] = light.pathM[n];
  }
  const placed = placedPhaseLaw(grid, stateRad.map((rad, place) => rad - wavenumber * pathM[place]));
  const phaseRad = (at: number, xM: number, yM: number): number => {
    const place = grid.placeAt(xM, yM);
    return stateRad[place] - at * pathM[place];
  };
  return { ...placed, phaseRad, board };
}

function remembered(key: string, make: () => BoardSearch): BoardSearch {
  const known = kept.get(key);
  if (known) return known;
  const made = make();
  if (kept.size >= KEPT) kept.delete(kept.keys().next().value ?? '');
  kept.set(key, made);
  return made;
}
