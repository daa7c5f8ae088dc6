import type { MaskEnvelope } from '../../../../shared/antenna/masks/mask-envelope';
import type { DesignDocument } from '../../../../shared/model/design-document';
import { levelAt } from '../../ui/plots/cut-figure';
import { numberText, signedNumberText } from '../../ui/plots/plot-text';
import type { ShownCut } from './beam-cut';
import type { CutMarkers, CutPlace } from './cut-markers';
import { leastMargin, maskLevelDbi, offAxisDeg } from './mask-level';

/** One marker of the table beside a cut, in numbers. */
export interface Marker {
  /** Number in the balloon. */
  readonly name: string;
  readonly what: string;
  readonly angleDeg: number;
  readonly levelDbi: number;
  /** To the mask, or to the least gain at the peak; null where nothing is demanded. Positive when kept. */
  readonly marginDb: number | null;
  /** True of markers a person has set. */
  readonly own: boolean;
}

export interface MarkerSource {
  readonly cut: ShownCut;
  readonly found: CutMarkers;
  readonly design: DesignDocument;
  readonly mask: MaskEnvelope | null;
  /** Angles at which a person has set markers. */
  readonly ownDeg: readonly number[];
}

/** Peak, half power, sidelobes, least margin to the mask, first nulls, then one's own; numbered in this order. */
export function markersOf({ cut, found, design, mask, ownDeg }: MarkerSource): readonly Marker[] {
  const { beams, minGainDbi } = design.requirement;
  const toMask = ({ angleDeg, levelDb }: CutPlace): number | null => {
    const level = maskLevelDbi(mask, offAxisDeg(directionAt(cut, angleDeg), beams));
    return level === null ? null : level - levelDb;
  };
  const least = leastMargin(mask, beams, cut);
  const listed: readonly Omit<Marker, 'name'>[] = [
    { ...marker('peak', found.peak), marginDb: minGainDbi === undefined ? null : found.peak.levelDb - minGainDbi },
    ...found.halfPower.flatMap((place) => (place ? [marker('half power', place)] : [])),
    ...found.sidelobes.flatMap((place) => (place ? [{ ...marker('sidelobe', place), marginDb: toMask(place) }] : [])),
    ...(least ? [{ ...marker('least margin', { angleDeg: cut.angleDeg[least.at], levelDb: cut.gainDbi[least.at] }), marginDb: least.marginDb }] : []),
    ...found.firstNulls.flatMap((place) => (place ? [marker('first null', place)] : [])),
    ...ownDeg.flatMap((angleDeg) => {
      const level = levelAt({ label: '', angleDeg: cut.angleDeg, levelDb: cut.gainDbi }, angleDeg);
      const place = level && { angleDeg, levelDb: level.levelDb };
      return place ? [{ ...marker('set by you', place), marginDb: toMask(place), own: true }] : [];
    }),
  ];
  return listed.map((each, i) => ({ ...each, name: String(i + 1) }));
}

function marker(what: string, place: CutPlace): Omit<Marker, 'name'> {
  return { what, angleDeg: place.angleDeg, levelDbi: place.levelDb, marginDb: null, own: false };
}

function directionAt(cut: ShownCut, angleDeg: number): { readonly thetaDeg: number; readonly phiDeg: number } {
  let at = 0;
  for (let i = 1; i < cut.angleDeg.length; i++) if (Math.abs(cut.angleDeg[i] - angleDeg) < Math.abs(cut.angleDeg[at] - angleDeg)) at = i;
  return { thetaDeg: cut.thetaDeg[at], phiDeg: cut.phiDeg[at] };
}

/** The same as text. `relative` is against the peak, `step` against the marker before, for the last two set by hand. */
export interface MarkerRow {
  readonly name: string;
  readonly what: string;
  readonly angle: string;
  readonly level: string;
  readonly relative: string;
  readonly margin: string;
  readonly kept: boolean | null;
  readonly own: boolean;
  readonly angleDeg: number;
}

export function markerRows(markers: readonly Marker[]): readonly MarkerRow[] {
  const peakDbi = markers[0]?.levelDbi ?? 0;
  return markers.map((each) => ({
    name: each.name,
    what: each.what,
    angle: numberText(each.angleDeg, 2),
    level: numberText(each.levelDbi, 2),
    relative: numberText(each.levelDbi - peakDbi, 2),
    margin: each.marginDb === null ? '–' : signedNumberText(each.marginDb, 2),
    kept: each.marginDb === null ? null : each.marginDb >= 0,
    own: each.own,
    angleDeg: each.angleDeg,
  }));
}

/** What lies between the last two markers that a person has set: a delta marker. Null with fewer than two. */
export function deltaText(markers: readonly Marker[]): string | null {
  const own = markers.filter((each) => each.own);
  if (own.length < 2) return null;
  const [from, to] = own.slice(-2);
  return `Δ ${from.name} → ${to.name}: ${signedNumberText(to.angleDeg - from.angleDeg, 2)}°, ${signedNumberText(to.levelDbi - from.levelDbi, 2)} dB`;
}
