import type { CellEdition } from '../model/cell-family';

/**
 * The azimuths of incidence of an edition as nodes of an even, periodic variable. A cell of square symmetry has the
 * same response at phi, -phi, 90 - phi and phi + 90, so the variable is cos 4 phi; where the data tell such
 * azimuths apart, or the periods or the ports do, only -phi and phi + 180 are alike and it is cos 2 phi.
 */
export interface AzimuthNodes {
  /** 4 or 2. */
  readonly fold: 2 | 4;
  /** cos(fold phi) at the nodes used, rising. */
  readonly cosines: Float64Array;
  /** Index of each node in the edition's list of azimuths. */
  readonly indices: Int32Array;
}

/** Two nodes nearer than this in the cosine are one. */
const SAME = 1e-6;

export function azimuthNodes({ description, responses }: CellEdition): AzimuthNodes {
  const phis = Array.from(responses.phisRad);
  const squareLooking = description.periodXMm === description.periodYMm && description.ports !== 'x-and-y';
  const distinctBy = (fold: number): number => distinctNodes(phis, fold).length;
  const fold = squareLooking && distinctBy(4) === distinctBy(2) ? 4 : 2;
  const nodes = distinctNodes(phis, fold);
  return { fold, cosines: Float64Array.from(nodes, (node) => node.cosine), indices: Int32Array.from(nodes, (node) => node.index) };
}

function distinctNodes(phisRad: readonly number[], fold: number): { cosine: number; index: number }[] {
  const nodes = phisRad.map((phi, index) => ({ cosine: Math.cos(fold * phi), index })).sort((a, b) => a.cosine - b.cosine || a.index - b.index);
  return nodes.filter((node, i) => i === 0 || node.cosine - nodes[i - 1].cosine > SAME);
}
