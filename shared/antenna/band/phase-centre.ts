import { linearThrough } from '../../math/interpolate';
import type { BandParameters } from '../../model/band-run';
import { illuminateCells } from '../illumination';
import type { PlacedDesign } from '../place-cells';
import type { SiHorn } from '../si-design';

/** Offset of the phase centre towards the aim at a frequency: linear between the pairs given, held beyond them. */
export function phaseCentreOffsetM(pairs: NonNullable<BandParameters['phaseCentre']>, frequencyGHz: number): number {
  const frequenciesGHz = pairs.map(([frequency]) => frequency);
  const offsetsMm = pairs.map(([, offsetMm]) => offsetMm);
  return linearThrough(frequenciesGHz, offsetsMm, frequencyGHz) / 1000;
}

/** The horn with its phase centre moved towards its aim. */
export function movedHorn(horn: SiHorn, offsetM: number): SiHorn {
  const { position, aim } = horn;
  const distanceM = Math.hypot(aim.xM - position.xM, aim.yM - position.yM, aim.zM - position.zM);
  const share = offsetM / distanceM;
  return {
    ...horn,
    position: {
      xM: position.xM + share * (aim.xM - position.xM),
      yM: position.yM + share * (aim.yM - position.yM),
      zM: position.zM + share * (aim.zM - position.zM),
    },
  };
}

/**
 * The placed design lit from where the phase centre stands at a frequency: paths R(f), amplitudes and spillover follow.
 * The cells stay those chosen for the design position; their responses keep the angles of incidence of that position,
 * from which a phase centre moves the panel's view by a small part of a degree.
 */
export function relitDesign(placed: PlacedDesign, parameters: Pick<BandParameters, 'phaseCentre'>, frequencyGHz: number): PlacedDesign {
  const { si, lattice } = placed;
  if (parameters.phaseCentre === undefined || si.illumination.kind !== 'horn') return placed;
  const illumination = movedHorn(si.illumination, phaseCentreOffsetM(parameters.phaseCentre, frequencyGHz));
  return { ...placed, si: { ...si, illumination }, light: illuminateCells(illumination, lattice, si.receiveExponent) };
}
