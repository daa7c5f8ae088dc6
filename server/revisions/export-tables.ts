import { CUT_ARRAY_NAMES } from '../../shared/contracts/predictions';
import { writeCsv, type CsvCell } from '../../shared/files/csv-writer';
import type { Figures, Verdict } from '../../shared/model/figures';
import type { Cut } from '../../shared/antenna/pattern-cut';
import { positionMm } from './cell-table';

/** Four decimals in degrees and dB: far below what the model says, and above the noise of single precision. */
const rounded = (value: number): number => Math.round(value * 1e4) / 1e4 + 0;

export function cutTable(cut: Cut): string {
  const { crossGainDbi } = cut;
  const rows = Array.from(cut.angleDeg, (_, i) => [
    ...CUT_ARRAY_NAMES.map((name) => (name.endsWith('Deg') ? positionMm(cut[name][i]) : rounded(cut[name][i]))),
    ...(crossGainDbi ? [rounded(crossGainDbi[i])] : []),
  ]);
  return writeCsv([['angle_deg', 'theta_deg', 'phi_deg', 'directivity_dbi', 'gain_dbi', ...(crossGainDbi ? ['cross_polar_gain_dbi'] : [])], ...rows]);
}

/** Every figure under its name in the prediction, then every line of the requirement. A figure without value says why. */
export function figureTable(figures: Figures, verdicts: readonly Verdict[]): string {
  const { uncertainty, ...values } = figures;
  const rows = leavesOf(values, []).map(({ path, value, reason }): CsvCell[] => {
    const name = path.join('.');
    return [name, value, unitOf(path), uncertainty[name] ?? uncertainty[path[0]] ?? null, null, null, null, reason];
  });
  const lines = verdicts.map(({ line, value, unit, limit, sense, verdict, reason }): CsvCell[] => [
    `requirement.${line}`,
    typeof value === 'number' ? value : null,
    unit,
    null,
    limit,
    sense,
    verdict,
    reason ?? null,
  ]);
  return writeCsv([['figure', 'value', 'unit', 'uncertainty', 'limit', 'sense', 'verdict', 'reason'], ...rows, ...lines]);
}

interface Leaf {
  readonly path: readonly string[];
  readonly value: number | null;
  readonly reason: string | null;
}

function leavesOf(value: unknown, path: readonly string[]): Leaf[] {
  if (typeof value === 'number') return [{ path, value, reason: null }];
  if (typeof value !== 'object' || value === null) return [];
  if ('reason' in value && typeof value.reason === 'string') return [{ path, value: null, reason: value.reason }];
  return Object.entries(value).flatMap(([name, inner]) => leavesOf(inner, [...path, name]));
}

const UNITS: readonly (readonly [suffix: string, unit: string])[] = [
  ['Dbi', 'dBi'],
  ['Db', 'dB'],
  ['Deg', 'deg'],
  ['GHz', 'GHz'],
  ['Mm', 'mm'],
  ['WPerM2', 'W/m2'],
  ['DbPerK', 'dB/K'],
  ['Dbm', 'dBm'],
  ['Dbw', 'dBW'],
  ['Dbsm', 'dBsm'],
  ['PowerW', 'W'],
  ['TemperatureK', 'K'],
  ['Min', 'min'],
  ['FromM', 'm'],
  ['EndM', 'm'],
  ['distanceM', 'm'],
];

/** The unit stands in the name of the figure or of the group it belongs to. */
function unitOf(path: readonly string[]): string {
  for (const name of [...path].reverse()) {
    const found = UNITS.find(([suffix]) => name.endsWith(suffix));
    if (found !== undefined) return found[1];
  }
  return '';
}
