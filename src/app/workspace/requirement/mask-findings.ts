import type { Figures } from '../../../../shared/model/figures';
import type { MaskFindings } from '../../../../shared/model/mask-figures';
import { figureText, signedText } from '../strip-figures';

export interface ViolationRow {
  readonly range: string;
  readonly worst: string;
  readonly direction: string;
  readonly level: string;
  readonly allowed: string;
  readonly excess: string;
}

/** The stretches above the mask as rows, in the order of their angles. */
export function violationRows({ violations }: MaskFindings): readonly ViolationRow[] {
  return violations.map((each) => ({
    range: `${figureText(each.fromDeg, 1)}–${figureText(each.toDeg, 1)}`,
    worst: figureText(each.offAxisDeg, 2),
    direction: `${figureText(each.thetaDeg, 1)}, ${figureText(each.phiDeg, 1)}`,
    level: figureText(each.levelDbi, 2),
    allowed: figureText(each.allowedDbi, 2),
    excess: signedText(each.excessDb, 2),
  }));
}

/** What was judged and found, in one or two sentences. */
export function findingsText(margin: Figures['maskMargin'], findings: MaskFindings | string): string {
  if ('reason' in margin) return `Not evaluated: ${margin.reason}.`;
  if (typeof findings === 'string') return findings;
  const { judgedFromDeg, violationCount, violations, peaksJudged, peaksAbove, angleFractionAbove } = findings;
  const parts = [`Judged from ${figureText(judgedFromDeg, 2)}° off the beam outwards, over the whole hemisphere in front of the panel.`];
  if (peaksJudged !== undefined && peaksAbove !== undefined) parts.push(`${peaksAbove} of ${peaksJudged} sidelobe peaks stand above it; one in ten may.`);
  if (angleFractionAbove !== undefined) parts.push(`The highest level stands above it in ${figureText(100 * angleFractionAbove, 1)} % of the angles from 7° to 180°; 10 % may, by up to 3 dB.`);
  if (violationCount === 0) parts.push('Nothing stands above it.');
  else parts.push(violationCount > violations.length ? `The ${violations.length} worst of ${violationCount} stretches above it:` : 'Where the gain stands above it:');
  return parts.join(' ');
}
