import type { CellEdition } from '../model/cell-family';
import { azimuthNodes, type AzimuthNodes } from './azimuth-nodes';
import { editionAtFrequency, type EditionAtFrequency } from './edition-at-frequency';

/** Which of S11, S21, S12, S22 (0 to 3) carry the co-polar response, and what they mean. */
export type PortUse =
  | { readonly kind: 'one'; readonly entries: readonly [number] }
  /** Ports along x and y. */
  | { readonly kind: 'x-and-y'; readonly entries: readonly [number, number] }
  /** E across and in the plane of incidence. */
  | { readonly kind: 'te-and-tm'; readonly entries: readonly [number, number] };

/** An edition ready for the engine: what does not depend on position is worked out once. */
export interface PreparedEdition {
  readonly edition: CellEdition;
  readonly ports: PortUse;
  /** sin^2 of the angles of incidence given, rising. */
  readonly sineSquaredNodes: Float64Array;
  readonly smallestThetaRad: number;
  readonly largestThetaRad: number;
  readonly azimuths: AzimuthNodes;
  /** Responses interpolated to one frequency, unwrapped over the angles. The last few are kept. */
  atFrequency(frequencyHz: number): EditionAtFrequency;
}

const KEPT_FREQUENCIES = 8;

/** Prepares an edition; keep the result and use it for every design on that edition. */
export function prepareEdition(edition: CellEdition): PreparedEdition {
  const { thetasRad } = edition.responses;
  const ports = portUse(edition);
  const azimuths = azimuthNodes(edition);
  const kept = new Map<number, EditionAtFrequency>();
  return {
    edition,
    ports,
    sineSquaredNodes: thetasRad.map((theta) => Math.sin(theta) ** 2),
    smallestThetaRad: thetasRad[0],
    largestThetaRad: thetasRad[thetasRad.length - 1],
    azimuths,
    atFrequency: (frequencyHz) => {
      const known = kept.get(frequencyHz);
      if (known) return known;
      const made = editionAtFrequency({ responses: edition.responses, entries: ports.entries, azimuthIndices: azimuths.indices }, frequencyHz);
      kept.set(frequencyHz, made);
      const [oldest] = kept.keys();
      if (kept.size > KEPT_FREQUENCIES) kept.delete(oldest);
      return made;
    },
  };
}

function portUse({ description, responses }: CellEdition): PortUse {
  if (description.ports === 'te-and-tm') return { kind: 'te-and-tm', entries: [0, 3] };
  if (description.ports === 'x-and-y') return { kind: 'x-and-y', entries: [0, 3] };
  // A transmitting cell of one polarisation is described from face to face, so its response is S21; a file of one port
  // holds the insertion itself and has no S21.
  const through = description.operation === 'transmit' && hasEntry(responses.values, 1);
  return { kind: 'one', entries: [through ? 1 : 0] };
}

function hasEntry(values: Float64Array, entry: number): boolean {
  for (let at = 2 * entry; at < values.length; at += 8) if (values[at] !== 0 || values[at + 1] !== 0) return true;
  return false;
}
