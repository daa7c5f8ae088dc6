import type { CellEdition, FamilyDescription } from '../model/cell-family';
import { degFromRad } from '../units/angles';
import type { AzimuthNodes } from './azimuth-nodes';

type Region = NonNullable<FamilyDescription['excludedRegions']>[number];

/** A region that the laboratory says not to use, at one frequency. */
interface ActiveRegion {
  readonly fromThetaDeg: number;
  readonly toThetaDeg: number;
  /** 1 where the region concerns the cell. */
  readonly cells: Uint8Array;
  /** cos(fold phi) of the azimuths it concerns; all where undefined. */
  readonly cosines?: readonly number[];
}

/** Says which cells may not be used at an angle of incidence. */
export interface RegionFilter {
  readonly isEmpty: boolean;
  /** Adds 1 into `barred` for every cell barred at this angle; returns whether any is. */
  mark(incidenceRad: number, azimuthRad: number, barred: Uint8Array): boolean;
}

const SLACK_GHZ = 1e-9;

/**
 * The laboratory's excluded regions at a frequency. A list of azimuths names nodes of the table: a position belongs to the
 * node nearest to it.
 */
export function regionFilter(edition: CellEdition, azimuths: AzimuthNodes, frequencyHz: number): RegionFilter {
  const frequencyGHz = frequencyHz / 1e9;
  const regions = (edition.description.excludedRegions ?? [])
    .filter((region) => (region.fromGHz ?? -Infinity) - SLACK_GHZ <= frequencyGHz && frequencyGHz <= (region.toGHz ?? Infinity) + SLACK_GHZ)
    .map((region) => activeRegion(region, edition, azimuths));
  return {
    isEmpty: regions.length === 0,
    mark: (incidenceRad, azimuthRad, barred) => {
      const thetaDeg = degFromRad(incidenceRad);
      let any = false;
      for (const region of regions) {
        if (thetaDeg < region.fromThetaDeg || thetaDeg > region.toThetaDeg) continue;
        if (region.cosines && !region.cosines.includes(nearestNode(azimuths, azimuthRad))) continue;
        for (let k = 0; k < barred.length; k++) barred[k] |= region.cells[k];
        any = true;
      }
      return any;
    },
  };
}

function activeRegion(region: Region, edition: CellEdition, azimuths: AzimuthNodes): ActiveRegion {
  const from = region.fromParameterMm;
  const cosines = region.phisDeg?.map((phiDeg) => nearestNode(azimuths, (phiDeg * Math.PI) / 180));
  return {
    fromThetaDeg: region.fromThetaDeg ?? -Infinity,
    toThetaDeg: region.toThetaDeg ?? Infinity,
    cells: Uint8Array.from(edition.cells, (cell) => (from === undefined || cell.parametersMm[0] >= from - 1e-9 ? 1 : 0)),
    ...(cosines ? { cosines } : {}),
  };
}

const nearestNode = (azimuths: AzimuthNodes, azimuthRad: number): number => azimuths.cosines[nearestAzimuth(azimuths, azimuthRad)];

/** Index of the node that an azimuth belongs to; of two equally near ones the first. */
export function nearestAzimuth({ cosines, fold }: AzimuthNodes, azimuthRad: number): number {
  const cosine = Math.cos(fold * azimuthRad);
  return cosines.reduce((best, node, i) => (Math.abs(node - cosine) < Math.abs(cosines[best] - cosine) ? i : best), 0);
}
