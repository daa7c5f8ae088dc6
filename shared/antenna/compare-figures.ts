import type { Figure, Figures, Verdict, VerdictWord } from '../model/figures';
import { isReason, limitDistance } from './exposure/exposure-readings';
import { isNumber, noFigure } from './no-figure';
import { figureOfLine } from './requirement-verdicts';

/** Figures of one side with what its requirement says of them. */
export interface JudgedFigures {
  readonly figures: Figures;
  readonly verdicts: readonly Verdict[];
}

export interface FigureDifference {
  readonly id: string;
  readonly label: string;
  readonly unit: string;
  readonly before: Figure;
  readonly after: Figure;
  /** After minus before. */
  readonly change: Figure;
  /** Both limits where they differ; null where neither side has one. */
  readonly limit: string | null;
  readonly verdictBefore: VerdictWord | null;
  readonly verdictAfter: VerdictWord | null;
}

interface Row {
  readonly id: string;
  readonly label: string;
  readonly unit: string;
  readonly of: (figures: Figures) => Figure;
  /** The line of the requirement that this figure is held against. */
  readonly line?: Verdict['line'];
  /** Listed only where one of the two has it. */
  readonly where?: 'asked';
}

const UNASKED = noFigure('not-asked', 'the requirement does not ask for it');

function publicDistance({ exposure }: Figures): Figure {
  if (exposure === undefined) return UNASKED;
  return isReason(exposure) ? exposure : limitDistance(exposure.fccPublic);
}

const judged = (line: Verdict['line'], label: string, unit: string): Row => ({ id: line, label, unit, line, of: (figures) => figureOfLine(line, figures) });

/** What a comparison lists, in this order. */
const ROWS: readonly Row[] = [
  { id: 'gain-at-peak', label: 'Gain at the peak', unit: 'dBi', of: ({ gainDbi }) => gainDbi },
  judged('gain', 'Gain in the beam', 'dBi'),
  { id: 'directivity', label: 'Directivity', unit: 'dBi', of: ({ directivityDbi }) => directivityDbi },
  { id: 'beamwidth-along', label: 'Beamwidth along', unit: '°', of: ({ halfPowerBeamwidthDeg }) => halfPowerBeamwidthDeg.along },
  { id: 'beamwidth-across', label: 'Beamwidth across', unit: '°', of: ({ halfPowerBeamwidthDeg }) => halfPowerBeamwidthDeg.across },
  judged('sidelobe', 'Sidelobe level', 'dB'),
  judged('mask', 'Mask margin', 'dB'),
  judged('pointing', 'Pointing error', '°'),
  { id: 'phase-error-rms', label: 'Phase error RMS', unit: '°', of: ({ phaseErrorRmsDeg }) => phaseErrorRmsDeg },
  { id: 'phase-loss', label: 'Phase loss', unit: 'dB', of: ({ phaseLossDb }) => phaseLossDb },
  { id: 'cell-loss', label: 'Cell loss', unit: 'dB', of: ({ cellLossDb }) => cellLossDb },
  { id: 'taper', label: 'Taper', unit: 'dB', of: ({ taperDb }) => taperDb },
  { id: 'spillover', label: 'Spillover', unit: 'dB', of: ({ spilloverDb }) => spilloverDb },
  { id: 'aperture-efficiency', label: 'Aperture efficiency', unit: '%', of: ({ apertureEfficiency }) => percent(apertureEfficiency) },
  judged('cross-polar', 'Cross-polar', 'dB'),
  { id: 'worst-cross-polar', label: 'Worst XPD within half power', unit: 'dB', where: 'asked', of: ({ vector }) => vector?.worstDiscriminationDb ?? UNASKED },
  { id: 'axial-ratio', label: 'Axial ratio', unit: 'dB', where: 'asked', of: ({ vector }) => vector?.axialRatioDb ?? UNASKED },
  { ...judged('cross-polar-mask', 'Cross-polar mask margin', 'dB'), where: 'asked' },
  { ...judged('received-power', 'Received power', 'dBm'), where: 'asked' },
  { ...judged('gain-over-temperature', 'Gain over temperature', 'dB/K'), where: 'asked' },
  { ...judged('eirp-density', 'EIRP density margin', 'dB'), where: 'asked' },
  { id: 'eirp', label: 'EIRP', unit: 'dBW', where: 'asked', of: ({ eirpDbw }) => eirpDbw ?? UNASKED },
  { id: 'exposure-public', label: 'Distance to the FCC public limit, estimate', unit: 'm', where: 'asked', of: publicDistance },
];

/** The figures of two designs beside each other, each with its limit and both verdicts. */
export function compareFigures(before: JudgedFigures, after: JudgedFigures): FigureDifference[] {
  return ROWS.filter((row) => isAsked(row, before) || isAsked(row, after)).map(({ id, label, unit, line, of }) => {
    const [left, right] = [of(before.figures), of(after.figures)];
    const [old, now] = [verdictOf(before, line), verdictOf(after, line)];
    const limits = [...new Set([old, now].flatMap((verdict) => (verdict === undefined ? [] : [limitText(verdict)])))];
    return {
      id,
      label,
      unit,
      before: left,
      after: right,
      change: differenceOf(left, right),
      limit: limits.length === 0 ? null : limits.join(', then '),
      verdictBefore: old?.verdict ?? null,
      verdictAfter: now?.verdict ?? null,
    };
  });
}

function isAsked({ where, line, of }: Row, side: JudgedFigures): boolean {
  return where === undefined || isNumber(of(side.figures)) || verdictOf(side, line) !== undefined;
}

/** The one figure whose verdict decides between the two; null when none or several changed. */
export function decidingFigure(differences: readonly FigureDifference[]): string | null {
  const turned = differences.filter(({ verdictBefore, verdictAfter }) => verdictBefore !== null && verdictAfter !== null && verdictBefore !== verdictAfter);
  return turned.length === 1 ? turned[0].id : null;
}

const verdictOf = ({ verdicts }: JudgedFigures, line: Verdict['line'] | undefined): Verdict | undefined => verdicts.find((verdict) => verdict.line === line);

/** "≥ 34.0": one decimal at least, more where the limit has more. */
function limitText({ sense, limit }: Verdict): string {
  const text = Number.isInteger(limit * 10) ? limit.toFixed(1) : String(limit);
  return `${sense === 'at-least' ? '≥' : '≤'} ${limit === 0 ? '0' : text}`;
}

const percent = (figure: Figure): Figure => (isNumber(figure) ? 100 * figure : figure);

function differenceOf(before: Figure, after: Figure): Figure {
  if (isNumber(before) && isNumber(after)) return after - before;
  const missing = [before, after].find((figure) => !isNumber(figure));
  return missing === undefined || isNumber(missing) ? noFigure('no-change', 'one of the two has no value') : noFigure(missing.kind, missing.reason);
}
