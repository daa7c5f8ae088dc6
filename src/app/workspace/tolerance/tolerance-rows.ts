import type { Figure } from '../../../../shared/model/figures';
import { CONTRIBUTORS } from '../../../../shared/model/tolerance-contributors';
import type { CutEnvelope, MeasureSpread, ShareMet, ToleranceLine, ToleranceMeasure, ToleranceResult } from '../../../../shared/model/tolerance-run';
import type { NamedBar } from '../../ui/plots/bar-chart';
import type { LineFigure } from '../../ui/plots/line-figure';
import { numberText, signedNumberText } from '../../ui/plots/plot-text';

/** A line of the requirement with its yield, in words. */
export interface YieldRow {
  readonly name: string;
  readonly limit: string;
  readonly nominal: string;
  readonly p5: string;
  readonly p50: string;
  readonly p95: string;
  readonly share: string;
  readonly interval: string;
  readonly reason: string | null;
  /** Whether even the lower end of the interval is above nine in ten, or the upper one below. */
  readonly word: 'high' | 'low' | 'between' | 'open';
}

const LINE_NAMES: Readonly<Record<ToleranceLine['line'], string>> = {
  gain: 'Gain',
  sidelobe: 'Sidelobe level',
  pointing: 'Pointing error',
  mask: 'Margin to the mask',
  'cross-polar': 'Cross-polar discrimination',
  'cross-polar-mask': 'Margin to the cross-polar mask',
  'received-power': 'Received power',
  'gain-over-temperature': 'G/T',
  'eirp-density': 'EIRP density',
};

const MEASURE_OF_LINE: Readonly<Partial<Record<ToleranceLine['line'], ToleranceMeasure>>> = { gain: 'gainDbi', sidelobe: 'sidelobeDb', pointing: 'pointingDeg', mask: 'maskMarginDb' };

export const MEASURE_NAMES: Readonly<Record<ToleranceMeasure, { readonly name: string; readonly unit: string; readonly digits: number }>> = {
  gainDbi: { name: 'Gain at the beam', unit: 'dB', digits: 3 },
  sidelobeDb: { name: 'Sidelobe level', unit: 'dB', digits: 2 },
  pointingDeg: { name: 'Pointing error', unit: '°', digits: 3 },
  maskMarginDb: { name: 'Margin to the mask', unit: 'dB', digits: 2 },
};

const NINE_IN_TEN = 0.9;
const figureText = (figure: Figure | undefined, digits = 2): string => (typeof figure === 'number' ? numberText(figure, digits) : '–');
const percent = (share: number): string => numberText(100 * share, 1);

export function intervalText({ low, high }: ShareMet): string {
  return `${percent(low)} to ${percent(high)} %`;
}

/** Every line of the requirement, judged or not. */
export function yieldRows({ lines, spreads }: ToleranceResult): YieldRow[] {
  return lines.map(({ line, sense, limit, unit, nominal, share }) => {
    const spread = spreads.find(({ measure }) => measure === MEASURE_OF_LINE[line]);
    const digits = line === 'pointing' ? 3 : 2;
    const common = {
      name: LINE_NAMES[line],
      limit: `${sense === 'at-least' ? '≥' : '≤'} ${numberText(limit, digits)} ${unit}`,
      nominal: figureText(nominal, digits),
      ...{ p5: figureText(spread?.p5, digits), p50: figureText(spread?.p50, digits), p95: figureText(spread?.p95, digits) },
    };
    if ('reason' in share) return { ...common, share: '–', interval: '–', reason: share.reason, word: 'open' };
    return { ...common, share: `${share.met} of ${share.of}`, interval: intervalText(share), reason: null, word: yieldWord(share) };
  });
}

function yieldWord({ low, high }: ShareMet): YieldRow['word'] {
  if (low >= NINE_IN_TEN) return 'high';
  return high < NINE_IN_TEN ? 'low' : 'between';
}

/** What the trials say of all lines at once, and what they cannot say. */
export function yieldSentence({ allLines, lines, trials }: ToleranceResult): string {
  if (allLines === null) return lines.length === 0 ? 'The requirement has no limit, so nothing is judged.' : 'No line of the requirement could be judged by trials.';
  const { met, of } = allLines;
  const bound = met === of ? ` ${of} of ${of} does not prove 100 %: the true share may be as low as ${percent(allLines.low)} %.` : '';
  return `${met} of ${trials} panels meet every line judged, ${percent(met / of)} %; 95 % interval ${intervalText(allLines)}.${bound}`;
}

/** Contributors by how much they hurt a measure, worst first; those that do not act come last with their reason. */
export function rankingBars({ ranking }: ToleranceResult, measure: ToleranceMeasure): NamedBar[] {
  const { unit, digits } = MEASURE_NAMES[measure];
  const bars = ranking.map(({ id, change, notApplied }): NamedBar => {
    const value = change[measure];
    const name = CONTRIBUTORS[id].label;
    if (notApplied !== null) return { name, value: null, text: notApplied };
    return typeof value === 'number' ? { name, value, text: `${signedNumberText(value, digits)} ${unit}` } : { name, value: null, text: value.reason };
  });
  const harm = ({ value }: NamedBar): number => (value === null ? -Infinity : measure === 'gainDbi' || measure === 'maskMarginDb' ? -value : value);
  return bars.sort((a, b) => harm(b) - harm(a));
}

/** Measures that the run read at all. */
export function readMeasures(spreads: readonly MeasureSpread[]): ToleranceMeasure[] {
  return spreads.filter(({ p50 }) => typeof p50 === 'number').map(({ measure }) => measure);
}

/** The cut as drawn between what 5 and 95 of 100 panels stay below. */
export function envelopeFigure({ plane, angleDeg, nominalDbi, p5Dbi, p50Dbi, p95Dbi }: CutEnvelope, least: number | undefined): LineFigure {
  const top = Math.ceil((Math.max(...nominalDbi, ...p95Dbi) + 3) / 10) * 10;
  const levels = least === undefined ? [] : [{ at: least, label: `least ${numberText(least, 1)} dBi` }];
  return {
    title: `Envelope of the cut ${plane} the beam`,
    x: { title: 'angle from the wanted beam, °', from: angleDeg[0], to: angleDeg[angleDeg.length - 1] },
    y: { title: 'gain, dBi', from: top - 60, to: top },
    lines: [
      { label: 'as drawn', x: angleDeg, y: nominalDbi, ink: 'ink' },
      { label: '5 of 100 stay below', x: angleDeg, y: p5Dbi, ink: 'patina', dashed: true },
      { label: 'half stay below', x: angleDeg, y: p50Dbi, ink: 'patina' },
      { label: '95 of 100 stay below', x: angleDeg, y: p95Dbi, ink: 'copper', dashed: true },
    ],
    levels,
  };
}
