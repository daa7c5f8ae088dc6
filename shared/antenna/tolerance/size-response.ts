import { nearestBranchRad } from '../../math/unwrap-phase';
import type { CellEdition } from '../../model/cell-family';
import { coPolarResponse, incidenceWeigher, type PolarResponse } from '../cell-response';
import type { PlacedDesign } from '../place-cells';
import type { PreparedEdition } from '../prepare-edition';

/** How a cell's response changes with its size: both are sums over what is added, so 0 leaves the cell as it is. */
export interface ResponseChange {
  phaseRad: number;
  logMagnitude: number;
}

/** Changes of response with size at every position. */
export interface SizeResponse {
  /** Adds the change of the cell at a position whose sizes are all larger by a length. */
  addChange(n: number, growthM: number, into: ResponseChange): void;
  /** Positions whose cell has no neighbour of another size: their response stays. */
  readonly withoutNeighbour: number;
}

/** Points of one cell's response against size: growth rises and holds 0 at `own`. */
interface SizeCurve {
  readonly growthM: Float64Array;
  readonly phaseRad: Float64Array;
  readonly logMagnitude: Float64Array;
  readonly own: number;
}

const LEAST_MAGNITUDE = 1e-12;

/**
 * Reads the change of response with size off the edition's own neighbouring cells: linear between them in ln |S| and in
 * unwrapped phase, at the incidence of the position, each parameter by itself; beyond the last cell the last slope goes on.
 * `reachM` is how far sizes may stray: cells farther away are not looked at.
 */
export function sizeResponse(placed: PlacedDesign, edition: PreparedEdition, reachM: number): SizeResponse {
  const { light, assignment, si } = placed;
  const at = edition.atFrequency(si.designFrequencyHz);
  const weigh = incidenceWeigher(edition, si.illumination.polarisation);
  const chains = sizeChains(edition.edition, at.usable, reachM);
  const response: PolarResponse = { magnitude: 0, phaseRad: 0 };
  let withoutNeighbour = 0;
  const curves = Array.from(assignment.cellIndex, (cell, n): SizeCurve[] => {
    if (cell < 0) return [];
    const weights = weigh(light.incidenceRad[n], light.azimuthRad[n]);
    const found = chains[cell].map(({ cells, growthM, own }) => {
      const phaseRad = new Float64Array(cells.length);
      const logMagnitude = new Float64Array(cells.length);
      cells.forEach((k, i) => {
        coPolarResponse(at, k, weights, response);
        phaseRad[i] = i === 0 ? response.phaseRad : nearestBranchRad(response.phaseRad, phaseRad[i - 1]);
        logMagnitude[i] = Math.log(Math.max(LEAST_MAGNITUDE, response.magnitude));
      });
      return { growthM, phaseRad, logMagnitude, own };
    });
    if (found.length === 0) withoutNeighbour += 1;
    return found;
  });
  return { withoutNeighbour, addChange: (n, growthM, into) => curves[n].forEach((curve) => addCurveChange(curve, growthM, into)) };
}

function addCurveChange({ growthM, phaseRad, logMagnitude, own }: SizeCurve, growth: number, into: ResponseChange): void {
  let upper = 1;
  while (upper < growthM.length - 1 && growthM[upper] < growth) upper += 1;
  const fraction = (growth - growthM[upper - 1]) / (growthM[upper] - growthM[upper - 1]);
  into.phaseRad += phaseRad[upper - 1] + fraction * (phaseRad[upper] - phaseRad[upper - 1]) - phaseRad[own];
  into.logMagnitude += logMagnitude[upper - 1] + fraction * (logMagnitude[upper] - logMagnitude[upper - 1]) - logMagnitude[own];
}

interface SizeChain {
  readonly cells: readonly number[];
  readonly growthM: Float64Array;
  readonly own: number;
}

const M_PER_MM = 1e-3;

/** For every cell and each of its parameters the cells that differ in that one alone, by size, within reach and one beyond. */
function sizeChains({ cells }: CellEdition, usable: Uint8Array, reachM: number): SizeChain[][] {
  return cells.map((cell, own) =>
    cell.parametersMm.flatMap((ownMm, p): SizeChain[] => {
      const inLine = (k: number): boolean => cells[k].parametersMm.every((value, q) => q === p || value === cell.parametersMm[q]);
      const line = [...cells.keys()].filter((k) => k === own || (usable[k] === 1 && inLine(k) && cells[k].parametersMm[p] !== ownMm));
      line.sort((a, b) => cells[a].parametersMm[p] - cells[b].parametersMm[p]);
      if (line.length < 2) return [];
      const growth = (k: number): number => (cells[k].parametersMm[p] - ownMm) * M_PER_MM;
      const at = line.indexOf(own);
      let [first, last] = [Math.max(0, at - 1), Math.min(line.length - 1, at + 1)];
      while (first > 0 && growth(line[first]) > -reachM) first -= 1;
      while (last < line.length - 1 && growth(line[last]) < reachM) last += 1;
      const near = line.slice(first, last + 1);
      return [{ cells: near, growthM: Float64Array.from(near, growth), own: at - first }];
    }),
  );
}
