import { CUT_ARRAY_NAMES } from '../../shared/contracts/predictions';
import type { CellEntry, FamilyDescription } from '../../shared/model/cell-family';
import { writeCsv, type CsvCell } from '../../shared/files/csv-writer';
import type { DesignDocument } from '../../shared/model/design-document';
import type { Figures, Verdict } from '../../shared/model/figures';
import type { CellArrays } from '../../shared/antenna/cell-arrays';
import type { Cut } from '../../shared/antenna/pattern-cut';

/** What the numbers of cells in a design point at: the edition where there is one. */
export interface ExportedStock {
  readonly cells: DesignDocument['cells'];
  readonly edition: { readonly description: FamilyDescription; readonly cells: readonly CellEntry[] } | null;
}

/** Four decimals in degrees and dB: far below what the model says, and above the noise of single precision. */
const rounded = (value: number): number => Math.round(value * 1e4) / 1e4 + 0;
/** Positions are given to the nanometre. */
const position = (mm: number): number => Math.round(mm * 1e6) / 1e6 + 0;

/** Rows written between two turns of the event loop, so that others are answered meanwhile. */
const ROWS_PER_TURN = 5000;

/** One row for each cell, in the order of the panel. */
export async function cellTable(arrays: CellArrays, stock: ExportedStock): Promise<string> {
  const parameters = stock.edition?.description.parameters ?? [];
  const pieces = [
    writeCsv([
      [
        'x_mm', 'y_mm', 'column', 'row', 'cell_id', ...parameters.map(({ id }) => `${id}_mm`), 'target_phase_deg', 'phase_deg', 'error_deg',
        'amplitude', 'response_db', 'incidence_deg', 'incidence_azimuth_deg',
      ],
    ]),
  ];
  for (let from = 0; from < arrays.xMm.length; from += ROWS_PER_TURN) {
    const rows: CsvCell[][] = [];
    for (let n = from; n < Math.min(from + ROWS_PER_TURN, arrays.xMm.length); n++) rows.push(cellRow(arrays, n, stock, parameters.length));
    pieces.push(writeCsv(rows));
    await new Promise((resolve) => setImmediate(resolve));
  }
  return pieces.join('');
}

function cellRow(arrays: CellArrays, n: number, { cells, edition }: ExportedStock, parameterCount: number): CsvCell[] {
  const index = arrays.cellIndex[n];
  const entry = edition?.cells[index];
  const parameters = Array.from({ length: parameterCount }, (_, i): CsvCell => entry?.parametersMm[i] ?? null);
  return [
    position(arrays.xMm[n]),
    position(arrays.yMm[n]),
    arrays.column[n],
    arrays.row[n],
    entry?.id ?? plainCellId(cells, index),
    ...parameters,
    rounded(arrays.targetPhaseDeg[n]),
    rounded(arrays.phaseDeg[n]),
    rounded(arrays.errorDeg[n]),
    Number(arrays.amplitude[n].toPrecision(6)),
    rounded(arrays.responseDb[n]),
    rounded(arrays.incidenceDeg[n]),
    rounded(arrays.incidenceAzimuthDeg[n]),
  ];
}

/** Cells without a name of their own; a continuous ideal phase has no cell at all. */
function plainCellId(cells: DesignDocument['cells'], index: number): CsvCell {
  if (index < 0) return null;
  return cells.kind === 'ideal' ? `level-${index}` : `cell-${index}`;
}

export function cutTable(cut: Cut): string {
  const rows = Array.from(cut.angleDeg, (_, i) => CUT_ARRAY_NAMES.map((name) => (name.endsWith('Deg') ? position(cut[name][i]) : rounded(cut[name][i]))));
  return writeCsv([['angle_deg', 'theta_deg', 'phi_deg', 'directivity_dbi', 'gain_dbi'], ...rows]);
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
];

/** The unit stands in the name of the figure or of the group it belongs to. */
function unitOf(path: readonly string[]): string {
  for (const name of [...path].reverse()) {
    const found = UNITS.find(([suffix]) => name.endsWith(suffix));
    if (found !== undefined) return found[1];
  }
  return '';
}
