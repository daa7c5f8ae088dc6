import type { Figure, Figures, Verdict, VerdictWord } from '../../../shared/model/figures';

export type StripFigureId = 'gain' | 'beamwidth' | 'sidelobe' | 'mask' | 'pointing' | 'efficiency' | 'phase-error' | 'cells';

/** A dimension line: 0 is its left end, 1 its right. */
export interface FigureGauge {
  readonly limitAt: number;
  readonly valueAt: number;
  readonly forbidden: 'left' | 'right';
}

export interface StripFigure {
  readonly id: StripFigureId;
  readonly label: string;
  /** The figure as shown; a dash when it does not exist. */
  readonly value: string;
  readonly unit: string;
  /** Signed change against the parent revision, or null when there is none. */
  readonly trend: string | null;
  /** "≥ 34.0", or what stands instead. */
  readonly limit: string;
  readonly margin: string | null;
  readonly verdict: VerdictWord | null;
  readonly gauge: FigureGauge | null;
  /** Why the figure does not exist or was not evaluated. */
  readonly reason: string | null;
}

export interface PredictedFigures {
  readonly figures: Figures;
  readonly verdicts: readonly Verdict[];
}

interface FigureRow {
  readonly id: StripFigureId;
  readonly label: string;
  readonly unit: string;
  readonly digits: number;
  /** How far from the limit the gauge reaches, in the unit of the figure. */
  readonly reach: number;
  readonly line?: Verdict['line'];
  read(figures: Figures): Figure;
}

const ROWS: readonly FigureRow[] = [
  { id: 'gain', label: 'Gain at the peak', unit: 'dBi', digits: 2, reach: 2, line: 'gain', read: (figures) => figures.gainDbi },
  { id: 'beamwidth', label: 'Beamwidth, along × across', unit: '°', digits: 2, reach: 1, read: (figures) => figures.halfPowerBeamwidthDeg.along },
  { id: 'sidelobe', label: 'Sidelobe level', unit: 'dB', digits: 2, reach: 4, line: 'sidelobe', read: worstSidelobe },
  { id: 'mask', label: 'Mask margin', unit: 'dB', digits: 2, reach: 2, line: 'mask', read: maskMarginDb },
  { id: 'pointing', label: 'Pointing error', unit: '°', digits: 3, reach: 0.3, line: 'pointing', read: (figures) => figures.pointingErrorDeg },
  { id: 'efficiency', label: 'Aperture efficiency', unit: '%', digits: 1, reach: 1, read: (figures) => scaled(figures.apertureEfficiency, 100) },
  { id: 'phase-error', label: 'RMS phase error', unit: '°', digits: 2, reach: 1, read: (figures) => figures.phaseErrorRmsDeg },
  { id: 'cells', label: 'Cells', unit: '', digits: 0, reach: 1, read: (figures) => figures.cellCount },
];

function maskMarginDb({ maskMargin }: Figures): Figure {
  return 'kind' in maskMargin ? maskMargin : maskMargin.marginDb;
}

function worstSidelobe({ sidelobeDb: { hemisphere } }: Figures): Figure {
  return 'kind' in hemisphere ? hemisphere : hemisphere.levelDb;
}

function scaled(figure: Figure, factor: number): Figure {
  return typeof figure === 'number' ? figure * factor : figure;
}

/** The headline figures of the draft, each with its limit, margin and change against the parent revision. */
export function stripFigures(now: PredictedFigures, parent: PredictedFigures | null): readonly StripFigure[] {
  return ROWS.map((row) => (row.id === 'beamwidth' ? beamwidthFigure(row, now.figures) : plainFigure(row, now, parent)));
}

function plainFigure(row: FigureRow, now: PredictedFigures, parent: PredictedFigures | null): StripFigure {
  const verdict = now.verdicts.find((line) => line.line === row.line) ?? null;
  const shown = verdict?.value ?? row.read(now.figures);
  const before = parent ? (parent.verdicts.find((line) => line.line === row.line)?.value ?? row.read(parent.figures)) : null;
  return {
    id: row.id,
    label: row.label,
    value: typeof shown === 'number' ? figureText(shown, row.digits) : '–',
    unit: typeof shown === 'number' ? row.unit : '',
    trend: typeof shown === 'number' && typeof before === 'number' ? signedText(shown - before, row.digits) : null,
    limit: limitText(row, verdict, now.figures),
    margin: verdict && typeof verdict.margin === 'number' ? signedText(verdict.margin, row.digits) : null,
    verdict: verdict?.verdict ?? null,
    gauge: verdict ? gaugeOf(verdict, row.reach) : null,
    reason: typeof shown === 'number' ? (verdict?.reason ?? null) : shown.reason,
  };
}

function beamwidthFigure(row: FigureRow, { halfPowerBeamwidthDeg: { along, across } }: Figures): StripFigure {
  const missing = [along, across].find((figure) => typeof figure !== 'number');
  const isThere = typeof along === 'number' || typeof across === 'number';
  const shown = [along, across].map((figure) => (typeof figure === 'number' ? figureText(figure, row.digits) : '–')).join('×');
  return {
    ...{ id: row.id, label: row.label, unit: isThere ? row.unit : '', trend: null, margin: null, verdict: null, gauge: null },
    value: isThere ? shown : '–',
    limit: 'no limit set',
    reason: missing && typeof missing !== 'number' ? missing.reason : null,
  };
}

function limitText(row: FigureRow, verdict: Verdict | null, figures: Figures): string {
  if (verdict) {
    const sign = verdict.sense === 'at-least' ? '≥' : '≤';
    const text = `${sign} ${figureText(verdict.limit, row.id === 'pointing' ? 3 : row.id === 'mask' ? 0 : 1)}`;
    return verdict.verdict === 'not-evaluated' ? `${text}, not evaluated` : text;
  }
  if (row.id !== 'cells') return 'no limit set';
  return figures.evanescentCells === 0 ? 'all propagating' : `${figures.evanescentCells} evanescent`;
}

/** The limit stands at a third of the line from its forbidden end, the value as far from it as its margin. */
function gaugeOf(verdict: Verdict, reach: number): FigureGauge | null {
  if (typeof verdict.margin !== 'number') return null;
  const inward = Math.max(-1 / 3, Math.min(2 / 3, (verdict.margin / reach) * (2 / 3)));
  return verdict.sense === 'at-least'
    ? { limitAt: 1 / 3, valueAt: 1 / 3 + inward, forbidden: 'left' }
    : { limitAt: 2 / 3, valueAt: 2 / 3 - inward, forbidden: 'right' };
}

const MINUS = '\u2212';

/** A figure with a fixed number of decimals, a true minus sign and a space every three digits. */
export function figureText(value: number, digits: number): string {
  const fixed = Math.abs(value).toFixed(digits);
  const [whole, part] = fixed.split('.');
  const grouped = whole.length > 3 ? whole.replace(/\B(?=(\d{3})+$)/g, '\u00a0') : whole;
  const negative = value < 0 && Number(fixed) !== 0;
  return `${negative ? MINUS : ''}${grouped}${part === undefined ? '' : `.${part}`}`;
}

/** The same with its sign always shown; zero has none. */
export function signedText(value: number, digits: number): string {
  const text = figureText(value, digits);
  return Number(Math.abs(value).toFixed(digits)) === 0 || value < 0 ? text : `+${text}`;
}
