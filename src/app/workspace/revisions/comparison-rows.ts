import type { Comparison, FigureDifference, ParameterDifference, Side } from '../../../../shared/contracts/comparisons';
import type { Figure, VerdictWord } from '../../../../shared/model/figures';
import { fullNumberText, numberText, signedNumberText } from '../../ui/plots/plot-text';
import { requirementText, requirementWord, utcText } from './revision-rows';

/** In a head that shares the line with four more facts. */
const SHORT_HASH_LETTERS = 8;

/** The head of one side of a comparison. */
export interface SideHead {
  readonly name: string;
  readonly mark: string;
  readonly lineage: string;
  readonly facts: readonly { readonly label: string; readonly value: string; readonly figure: boolean; readonly word: VerdictWord | null }[];
}

export function sideName(side: Side): string {
  return side.revision ? `revision ${side.revision.number}` : 'draft';
}

/** What stands over a column of figures: the number, or D of the draft. */
export function sideMark(side: Side): string {
  return side.revision ? String(side.revision.number) : 'D';
}

export function sideHead(side: Side, other: Side): SideHead {
  const { revision } = side;
  const related = revision && other.revision ? (revision.id === other.revision.parentId ? 'parent' : revision.parentId === other.revision.id ? `child of ${other.revision.number}` : '') : '';
  const otherPanel = side.panelId === other.panelId ? '' : `${side.projectName}, ${side.panelName}`;
  const plain = (label: string, value: string, figure = false) => ({ label, value, figure, word: null });
  return {
    name: revision ? `Revision ${revision.number}` : 'Draft',
    mark: sideMark(side),
    lineage: [related, otherPanel].filter((text) => text !== '').join('; '),
    facts: [
      plain('Hash', side.hash.slice(0, SHORT_HASH_LETTERS), true),
      ...(revision ? [plain('Frozen, UTC', utcText(revision.createdAt), true), plain('Drawn by', revision.author.name)] : [plain('State', 'changes with every edit')]),
      plain('Cells', side.editionName ?? 'no library edition'),
      { label: 'Requirement', value: requirementText(side.requirement), figure: false, word: requirementWord(side.requirement) },
    ],
  };
}

export interface ParameterRow {
  readonly pointer: string;
  readonly label: string;
  readonly before: string;
  readonly after: string;
}

export function parameterRows(parameters: readonly ParameterDifference[]): readonly ParameterRow[] {
  return parameters.map(({ pointer, label, unit, before, after }) => ({ pointer, label, before: valueText(before, unit), after: valueText(after, unit) }));
}

function valueText(value: ParameterDifference['before'], unit: string): string {
  if (value === null) return 'not set';
  if (typeof value === 'boolean') return value ? 'yes' : 'no';
  const text = typeof value === 'number' ? fullNumberText(value).replace('-', '\u2212') : value;
  return unit === '' || typeof value !== 'number' ? text : unit === '°' ? `${text}°` : `${text} ${unit}`;
}

export interface CellRow {
  readonly label: string;
  readonly value: string;
}

/** How many cells differ, or why they cannot be matched. */
export function cellRows({ cells }: Comparison): readonly CellRow[] | { readonly reason: string } {
  // A figure that does not exist carries its reason instead of arrays.
  if (!isCompared(cells)) return { reason: cells.reason };
  const share = cells.total > 0 ? (100 * cells.changed) / cells.total : 0;
  const { parameter } = cells;
  return [
    { label: 'Changed', value: `${numberText(cells.changed, 0)} of ${numberText(cells.total, 0)}, ${numberText(share, 1)}\u00a0%` },
    ...(parameter
      ? [
          { label: `Larger ${insidePhrase(parameter.label)}`, value: numberText(parameter.larger, 0) },
          { label: `Smaller ${insidePhrase(parameter.label)}`, value: numberText(parameter.smaller, 0) },
          { label: `Mean |change of ${insidePhrase(parameter.label)}|`, value: `${numberText(parameter.meanChangeMm, 3)} mm` },
        ]
      : []),
    { label: 'Phase error over 15°', value: `${numberText(cells.errorOver15Before, 0)} → ${numberText(cells.errorOver15After, 0)}` },
    { label: 'RMS phase error', value: `${numberText(cells.rmsErrorBeforeDeg, 2)}° → ${numberText(cells.rmsErrorAfterDeg, 2)}°` },
  ];
}

/** "ring outer side" from "Ring outer side"; a letter that stands alone keeps its case. */
export function insidePhrase(label: string): string {
  return /^\p{Lu}\p{Ll}/u.test(label) ? label.charAt(0).toLowerCase() + label.slice(1) : label;
}

export type ComparedCells = Extract<Comparison['cells'], { arrays: unknown }>;

export function isCompared(cells: Comparison['cells']): cells is ComparedCells {
  return cells.kind === 'compared' && 'arrays' in cells && typeof cells.arrays === 'object';
}

export interface FigureRow {
  readonly id: string;
  readonly label: string;
  readonly before: string;
  readonly after: string;
  readonly change: string;
  readonly limit: string;
  readonly verdictBefore: VerdictWord | null;
  readonly verdictAfter: VerdictWord | null;
  readonly deciding: boolean;
  /** Why a figure does not exist on one of the sides. */
  readonly reason: string | null;
}

export function figureRows({ figures, deciding }: Comparison): readonly FigureRow[] {
  return figures.map((figure) => {
    const digits = figureDigits(figure);
    const text = (value: Figure): string => (typeof value === 'number' ? numberText(value, digits) : '–');
    const missing = [figure.before, figure.after].find((value) => typeof value !== 'number');
    return {
      id: figure.id,
      label: figure.unit === '' ? figure.label : `${figure.label}, ${figure.unit}`,
      before: text(figure.before),
      after: text(figure.after),
      change: changeText(figure.change, digits),
      limit: (figure.limit ?? '').replace('>=', '≥').replace('<=', '≤').replace('-', '\u2212'),
      verdictBefore: figure.verdictBefore,
      verdictAfter: figure.verdictAfter,
      deciding: figure.id === deciding,
      reason: missing !== undefined && typeof missing !== 'number' ? missing.reason : null,
    };
  });
}

function changeText(change: Figure, digits: number): string {
  if (typeof change !== 'number') return '–';
  return Number(change.toFixed(digits)) === 0 ? '=' : signedNumberText(change, digits);
}

/** Hundredths of a decibel, thousandths of a degree, tenths of a per cent; counts are whole. */
function figureDigits({ unit, before, after }: FigureDifference): number {
  if (unit === '°') return 3;
  if (unit === '%') return 1;
  if (unit.startsWith('dB')) return 2;
  return [before, after].every((value) => typeof value !== 'number' || Number.isInteger(value)) ? 0 : 3;
}
