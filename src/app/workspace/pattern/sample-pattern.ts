import { exampleDesign } from '../../../../shared/antenna/example-design';
import type { DesignDocument } from '../../../../shared/model/design-document';
import { computedPrediction } from '../computed-prediction';
import { cutRequests, shownCut } from './beam-cut';
import type { CutWish, ShownCut } from './beam-cut';

/** The example panel with a mask, predicted by the engine; for specs. */
export const MASKED_DESIGN: DesignDocument = exampleDesign({
  requirement: {
    ...exampleDesign().requirement,
    minGainDbi: 25,
    mask: { kind: 'custom', points: [[9, 18], [20, 10], [90, -2]] },
  },
});
export const ALONG: CutWish = { choice: 'along', beam: { thetaDeg: 20, phiDeg: 0 }, planePhiDeg: 45 };
export const SAMPLE_PATTERN = computedPrediction(MASKED_DESIGN, { cuts: [...cutRequests(ALONG), ...cutRequests({ ...ALONG, choice: 'plane' })], uvSize: 65 });

export function sampleCut(wish: CutWish = ALONG): ShownCut {
  const cut = shownCut(SAMPLE_PATTERN, wish);
  if (!cut) throw new Error('the sample does not hold this cut');
  return cut;
}
