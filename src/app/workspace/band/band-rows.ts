import type { BandLine, BandPoint, BandResult, Extreme, GainBandwidth } from '../../../../shared/model/band-run';
import type { Figure, VerdictWord } from '../../../../shared/model/figures';
import type { PlotTable } from '../../ui/plots/plot-export';
import { numberText, signedNumberText } from '../../ui/plots/plot-text';
import { BY_SYMMETRY_DB } from '../by-symmetry';
import { lineName } from '../sheet-states';

/** A line of the requirement over the whole band. */
export interface BandLineRow {
  readonly line: string;
  readonly name: string;
  readonly limit: string;
  readonly value: string;
  readonly margin: string;
  readonly at: string;
  readonly word: VerdictWord;
  readonly reason: string | null;
}

export function lineRows({ lines }: BandResult): readonly BandLineRow[] {
  return lines.map((line) => ({
    line: line.line,
    name: capital(lineName(line.line)),
    limit: `${line.sense === 'at-least' ? '≥' : '≤'} ${numberText(line.limit, 2)} ${line.unit}`,
    ...valueTexts(line),
    at: gigahertz(line.frequencyGHz),
    word: line.verdict,
    reason: line.reason ?? null,
  }));
}

function valueTexts(line: BandLine): Pick<BandLineRow, 'value' | 'margin'> {
  const beyond = line.line === 'cross-polar' && typeof line.value === 'number' ? Math.max(0, line.value - BY_SYMMETRY_DB) : 0;
  const over = beyond > 0 ? '> ' : '';
  return {
    value: typeof line.value === 'number' ? `${over}${numberText(line.value - beyond, digitsOf(line))}` : '–',
    margin: typeof line.margin === 'number' ? `${over}${signedNumberText(line.margin - beyond, digitsOf(line))}` : '–',
  };
}

const digitsOf = ({ unit }: BandLine): number => (unit === '°' ? 3 : 2);
const capital = (text: string): string => text.charAt(0).toUpperCase() + text.slice(1);
export const gigahertz = (frequencyGHz: number): string => numberText(frequencyGHz, 3);

export interface BandwidthRow {
  readonly name: string;
  readonly from: string;
  readonly to: string;
  readonly width: string;
  /** Why an edge has no number. */
  readonly reason: string | null;
}

export function bandwidthRows({ bandwidths }: BandResult): readonly BandwidthRow[] {
  return bandwidths.map((bandwidth) => ({
    name: `${numberText(bandwidth.dropDb, 0)}\u00a0dB`,
    from: edgeText(bandwidth.lowerGHz),
    to: edgeText(bandwidth.upperGHz),
    width: widthText(bandwidth),
    reason: typeof bandwidth.widthGHz === 'number' ? null : bandwidth.widthGHz.reason,
  }));
}

const edgeText = (edge: Figure): string => (typeof edge === 'number' ? gigahertz(edge) : 'not reached');

function widthText({ widthGHz, widthPercent }: GainBandwidth): string {
  if (typeof widthGHz === 'number' && typeof widthPercent === 'number') return `${gigahertz(widthGHz)} (${numberText(widthPercent, 1)} %)`;
  const least = typeof widthGHz === 'number' ? undefined : widthGHz['atLeastGHz'];
  return typeof least === 'number' ? `> ${gigahertz(least)}` : '–';
}

export interface ExtremeRow {
  readonly name: string;
  readonly value: string;
  readonly at: string;
}

export function extremeRows({ extremes }: BandResult): readonly ExtremeRow[] {
  return [
    extremeRow('Highest gain, wanted direction, dBi', extremes.highestGainAtBeamDbi, 2),
    extremeRow('Lowest gain, wanted direction, dBi', extremes.lowestGainAtBeamDbi, 2),
    extremeRow('Largest pointing error, °', extremes.largestPointingErrorDeg, 3),
    extremeRow('Highest sidelobe, dB', extremes.highestSidelobeDb, 2),
  ];
}

function extremeRow(name: string, extreme: Extreme, digits: number): ExtremeRow {
  return 'frequencyGHz' in extreme && typeof extreme.value === 'number' && typeof extreme.frequencyGHz === 'number'
    ? { name, value: numberText(extreme.value, digits), at: gigahertz(extreme.frequencyGHz) }
    : { name, value: 'reason' in extreme ? String(extreme.reason) : '–', at: '–' };
}

export interface PointRow {
  readonly frequency: string;
  readonly cells: readonly string[];
  readonly covered: boolean;
}

export const POINT_HEADS = ['Gain at beam, dBi', 'Gain at peak, dBi', 'Squint along, °', 'Squint across, °', 'Sidelobe, dB', 'Width along, °', 'Width across, °', 'Cell loss, dB', 'RMS error, °', 'Spatial part, dBi'] as const;

export function pointRows({ points }: BandResult): readonly PointRow[] {
  return points.map((point) => ({ frequency: gigahertz(point.frequencyGHz), cells: cellsOf(point), covered: point.covered }));
}

function cellsOf(point: BandPoint): readonly string[] {
  const signed = (figure: Figure): string => (typeof figure === 'number' ? signedNumberText(figure, 3) : '–');
  const plain = (figure: Figure | undefined, digits: number): string => (typeof figure === 'number' ? numberText(figure, digits) : '–');
  return [
    plain(point.gainAtBeamDbi, 2),
    plain(point.gainDbi, 2),
    signed(point.squintAlongDeg),
    signed(point.squintAcrossDeg),
    plain(point.sidelobeDb, 2),
    plain(point.beamwidthAlongDeg, 2),
    plain(point.beamwidthAcrossDeg, 2),
    plain(point.cellLossDb, 2),
    plain(point.phaseErrorRmsDeg, 1),
    plain(point.spatial?.gainAtBeamDbi, 2),
  ];
}

/** Every point with its full values, for a file. A figure without value leaves its place empty. */
export function bandTable({ points }: BandResult): PlotTable {
  const column = (head: string, figure: (point: BandPoint) => Figure | undefined): PlotTable['columns'][number] => ({
    head,
    values: points.map((point) => {
      const value = figure(point);
      return typeof value === 'number' ? value : '';
    }),
  });
  return {
    columns: [
      column('frequency, GHz', ({ frequencyGHz }) => frequencyGHz),
      column('gain in the wanted direction, dBi', ({ gainAtBeamDbi }) => gainAtBeamDbi),
      column('gain at the peak, dBi', ({ gainDbi }) => gainDbi),
      column('directivity in the wanted direction, dBi', ({ directivityAtBeamDbi }) => directivityAtBeamDbi),
      column('pointing error, deg', ({ pointingErrorDeg }) => pointingErrorDeg),
      column('squint along, deg', ({ squintAlongDeg }) => squintAlongDeg),
      column('squint across, deg', ({ squintAcrossDeg }) => squintAcrossDeg),
      column('highest sidelobe, dB', ({ sidelobeDb }) => sidelobeDb),
      column('beamwidth along, deg', ({ beamwidthAlongDeg }) => beamwidthAlongDeg),
      column('beamwidth across, deg', ({ beamwidthAcrossDeg }) => beamwidthAcrossDeg),
      column('cell loss, dB', ({ cellLossDb }) => cellLossDb),
      column('RMS phase error, deg', ({ phaseErrorRmsDeg }) => phaseErrorRmsDeg),
      column('gain in the wanted direction, spatial part alone, dBi', ({ spatial }) => spatial?.gainAtBeamDbi),
      { head: 'within the data of the cells', values: points.map(({ covered }) => (covered ? 'yes' : 'no')) },
    ],
  };
}
