import { wrapDeg } from '../../../../shared/units/angles';
import type { CutRequest } from '../../../../shared/contracts/predictions';
import type { LivePrediction } from '../live-prediction-data';

/** Which cut is shown: through the beam along theta, across it, or a plane of one's own. */
export type CutChoice = 'along' | 'across' | 'plane';

const STEP_DEG = 0.1;
const HALF_CIRCLE: [number, number, number] = [-90, 90, STEP_DEG];

/** A cut with the angle it is drawn over. */
export interface ShownCut {
  readonly angleDeg: ArrayLike<number>;
  readonly thetaDeg: ArrayLike<number>;
  readonly phiDeg: ArrayLike<number>;
  readonly gainDbi: ArrayLike<number>;
  /** Of the cross-polar field; the vector model alone has one. */
  readonly crossGainDbi?: ArrayLike<number>;
  /** Angle of the wanted beam on this cut, or of what comes nearest to it. */
  readonly beamDeg: number;
  readonly angleTitle: string;
}

export interface CutWish {
  readonly choice: CutChoice;
  /** Of the wanted beam in question. */
  readonly beam: { readonly thetaDeg: number; readonly phiDeg: number };
  /** Of the plane of one's own. */
  readonly planePhiDeg: number;
}

/** What to ask the engine for; the cut across the first beam comes by itself. */
export function cutRequests({ choice, beam, planePhiDeg }: CutWish): readonly CutRequest[] {
  if (choice === 'across') return [];
  return [{ phiDeg: choice === 'along' ? beam.phiDeg : planePhiDeg, thetaDeg: HALF_CIRCLE }];
}

/**
 * The wished cut from a prediction, or null when the prediction does not hold it yet. While a drag turns the beam in azimuth,
 * an answer may hold the plane that was asked for just before; it is shown for that moment and named by its own azimuth.
 */
export function shownCut({ cuts }: LivePrediction, wish: CutWish): ShownCut | null {
  const cut = cuts.find(({ request }) => fits(request, wish)) ?? (wish.choice === 'along' ? cuts.find(({ request }) => 'phiDeg' in request) : undefined);
  if (!cut) return null;
  const { angleDeg, thetaDeg, phiDeg, gainDbi, crossGainDbi, request } = cut;
  const arrays = { angleDeg, thetaDeg, phiDeg, gainDbi, ...(crossGainDbi ? { crossGainDbi } : {}) };
  if (!('phiDeg' in request)) return { ...arrays, beamDeg: 0, angleTitle: 'angle across the beam, °' };
  return { ...arrays, beamDeg: nearestThetaDeg(wish.beam, request.phiDeg), angleTitle: `θ in the plane φ = ${tidy(request.phiDeg)}°, °` };
}

function fits(request: CutRequest, { choice, beam, planePhiDeg }: CutWish): boolean {
  if (choice === 'across') return 'plane' in request && request.plane === 'across';
  return 'phiDeg' in request && Math.abs(request.phiDeg - (choice === 'along' ? beam.phiDeg : planePhiDeg)) < 1e-9;
}

/** The signed theta in a plane whose direction lies nearest to the beam: its projection. */
function nearestThetaDeg({ thetaDeg, phiDeg }: CutWish['beam'], planePhiDeg: number): number {
  const theta = (thetaDeg * Math.PI) / 180;
  const along = Math.cos((wrapDeg(phiDeg - planePhiDeg) * Math.PI) / 180);
  return (Math.atan2(Math.sin(theta) * along, Math.cos(theta)) * 180) / Math.PI;
}

function tidy(deg: number): string {
  return String(Number(deg.toFixed(1))).replace('-', '\u2212');
}
