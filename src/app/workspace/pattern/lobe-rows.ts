import { designMask } from '../../../../shared/antenna/masks/design-mask';
import type { DesignDocument } from '../../../../shared/model/design-document';
import type { Figures } from '../../../../shared/model/figures';
import type { LetteredLobe, MarkedDirection } from '../../ui/plots/uv-map';
import { numberText, signedNumberText } from '../../ui/plots/plot-text';
import { maskLevelDbi, offAxisDeg } from './mask-level';

export interface LobeRow extends LetteredLobe {
  readonly theta: string;
  readonly phi: string;
  readonly offAxis: string;
  readonly gain: string;
  readonly relative: string;
  readonly margin: string;
  readonly kept: boolean | null;
}

/** The highest lobes outside the wanted beam with letters. `beamPeakDbi` is the level they are given against. */
export function lobeRows(figures: Figures, design: DesignDocument, beamPeakDbi: number): readonly LobeRow[] {
  const { beams } = design.requirement;
  const mask = designMask(design, figures);
  return figures.highestLobes.map(({ thetaDeg, phiDeg, levelDb }, i) => {
    const off = offAxisDeg({ thetaDeg, phiDeg }, beams);
    const allowed = maskLevelDbi(mask, off);
    const gain = beamPeakDbi + levelDb;
    return {
      letter: String.fromCharCode(97 + i),
      ...{ thetaDeg, phiDeg },
      theta: numberText(thetaDeg, 1),
      phi: numberText(phiDeg > -179.95 ? phiDeg : phiDeg + 360, 1),
      offAxis: numberText(off, 1),
      gain: numberText(gain, 2),
      relative: numberText(levelDb, 2),
      margin: allowed === null ? '–' : signedNumberText(allowed - gain, 2),
      kept: allowed === null ? null : allowed >= gain,
    };
  });
}

export interface DirectionsShown {
  readonly specular: boolean;
  /** Beam that has the handle; the others are rings. */
  readonly beam: number;
}

/** Grating lobes, the found peak, the other beams and, when wanted, the direction in which a bare plate would send the light. */
export function markedDirections(figures: Figures, design: DesignDocument, shown: DirectionsShown): readonly MarkedDirection[] {
  const say = (name: string, thetaDeg: number, phiDeg: number): string => `${name}: θ ${numberText(thetaDeg, 1)}°, φ ${numberText(phiDeg, 1)}°`;
  const { peakThetaDeg, peakPhiDeg } = figures;
  const marked: MarkedDirection[] = figures.gratingLobes.map(({ thetaDeg, phiDeg, orderX, orderY }) => ({
    ...{ kind: 'grating-lobe' as const, thetaDeg, phiDeg },
    label: say(`grating lobe (${orderX}, ${orderY})`, thetaDeg, phiDeg),
  }));
  design.requirement.beams.forEach(({ thetaDeg, phiDeg }, i) => {
    if (i !== shown.beam) marked.push({ kind: 'other-beam', thetaDeg, phiDeg, label: say(`beam ${i + 1}`, thetaDeg, phiDeg) });
  });
  const specular = shown.specular ? specularDirection(design) : null;
  if (specular) {
    const { thetaDeg, phiDeg } = specular;
    marked.push({ kind: 'specular', thetaDeg, phiDeg, label: say('specular direction', thetaDeg, phiDeg) });
  }
  if (typeof peakThetaDeg === 'number' && typeof peakPhiDeg === 'number') {
    marked.push({ kind: 'found-peak', thetaDeg: peakThetaDeg, phiDeg: peakPhiDeg, label: say('highest lobe', peakThetaDeg, peakPhiDeg) });
  }
  return marked;
}

/** Where a plain plate sends (or lets through) the light from the middle of the source: the tangential part goes on. A guided wave has none. */
export function specularDirection({ illumination }: DesignDocument): { readonly thetaDeg: number; readonly phiDeg: number } | null {
  if (illumination.kind === 'guided-wave') return null;
  const degrees = 180 / Math.PI;
  if (illumination.kind === 'plane-wave') return { thetaDeg: illumination.thetaDeg, phiDeg: wrapped(illumination.phiDeg + 180) };
  const [x, y, z] = illumination.positionMm;
  return { thetaDeg: Math.atan2(Math.hypot(x, y), Math.abs(z)) * degrees, phiDeg: x === 0 && y === 0 ? 0 : wrapped(Math.atan2(-y, -x) * degrees) };
}

function wrapped(deg: number): number {
  const turned = deg - 360 * Math.ceil((deg - 180) / 360);
  return Object.is(turned, -0) ? 0 : turned;
}
