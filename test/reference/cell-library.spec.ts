import { createHash } from 'node:crypto';
import { readdirSync, readFileSync } from 'node:fs';
import { join } from 'node:path';
import { judgeEdition } from '../../shared/antenna/cell-quality';
import { readCsv } from '../../shared/files/csv-table';
import { assembleEdition } from '../../shared/files/edition-assembly';
import { inspectFamilyFiles } from '../../shared/files/family-import';
import type { InspectedFamily, NamedFile } from '../../shared/files/family-inspection';
import { familyDescription } from '../../shared/model/cell-family';
import type { CellEdition, FamilyDescription, QualityReport, QualityVerdict } from '../../shared/model/cell-family';

const LIBRARY = join(__dirname, '../../cell-library');

interface Family {
  readonly files: readonly NamedFile[];
  readonly description: FamilyDescription;
  readonly inspected: InspectedFamily;
  readonly edition: CellEdition;
  readonly report: QualityReport;
}

function load(folder: string): Family {
  const files = readdirSync(join(LIBRARY, folder)).map((name): NamedFile => {
    const bytes = new Uint8Array(readFileSync(join(LIBRARY, folder, name)));
    return { name, bytes, sha256: createHash('sha256').update(bytes).digest('hex') };
  });
  const description = familyDescription.parse(JSON.parse(readFileSync(join(LIBRARY, folder, 'family.json'), 'utf8')));
  const inspected = inspectFamilyFiles(files);
  const assembled = assembleEdition(inspected, description);
  if (assembled.kind === 'refused') throw new Error(`${folder}: ${JSON.stringify(assembled.messages)}`);
  return { files, description, inspected, edition: assembled.edition, report: judgeEdition(assembled.edition) };
}

interface Expected {
  readonly cells: number;
  readonly grid: readonly [thetas: number, phis: number, frequencies: number];
  readonly ports: number;
  readonly verdict: QualityVerdict;
  /** Checks that do not pass, family and cells together. */
  readonly troubles: readonly string[];
  /** Phase range at the design frequency and normal incidence as the family's README states it, to its rounding. */
  readonly rangeDeg?: number;
}

const EXPECTED: Readonly<Record<string, Expected>> = {
  'square-patch-15': { cells: 28, grid: [1, 1, 41], ports: 1, verdict: 'pass', troubles: [], rangeDeg: 311 },
  'ring-and-patch-5': { cells: 33, grid: [1, 1, 41], ports: 1, verdict: 'pass', troubles: [], rangeDeg: 474 },
  'four-state-5': { cells: 4, grid: [1, 1, 41], ports: 1, verdict: 'warn', troubles: ['phase-range', 'largest-gap'] },
  'rectangular-patch-15': { cells: 49, grid: [1, 1, 41], ports: 2, verdict: 'warn', troubles: ['phase-range', 'largest-gap'] },
  'square-patch-5-oblique': { cells: 30, grid: [5, 3, 21], ports: 2, verdict: 'pass', troubles: [], rangeDeg: 304 },
  // Steep resonances beside the excluded regions, and steps between sizes up to 76 degrees: worth a look, not wrong.
  'square-patch-15-oblique': { cells: 28, grid: [5, 3, 21], ports: 2, verdict: 'warn', troubles: ['largest-gap', 'phase-jump', 'phase-jump', 'phase-jump', 'phase-jump'], rangeDeg: 311 },
  'square-patch-15-laboratory': { cells: 28, grid: [1, 1, 41], ports: 1, verdict: 'fail', troubles: ['reference-plane', 'passivity', 'phase-jump', 'missing-points'] },
};

describe('the cell library', () => {
  it('holds one folder per family and nothing unexpected', () => {
    const folders = readdirSync(LIBRARY, { withFileTypes: true }).filter((entry) => entry.isDirectory());
    expect(folders.map(({ name }) => name).sort()).toEqual(Object.keys(EXPECTED).sort());
  });

  describe.each(Object.entries(EXPECTED))('%s', (folder, expected) => {
    const family = load(folder);

    it('is described, explained and labelled as what it is', () => {
      const names = family.files.map(({ name }) => name);
      expect(names).toEqual(expect.arrayContaining(['README.md', 'family.json', 'index.csv']));
      const readme = readFileSync(join(LIBRARY, folder, 'README.md'), 'utf8');
      expect(readme).toMatch(family.description.provenance === 'invented' ? /Invented data, not a measurement/ : /Simulated, not measured/);
      expect(family.inspected.inspection.detected.provenanceHint).toBe(family.description.provenance);
    });

    it('is read whole, without an error or a warning', () => {
      const { files, messages, detected } = family.inspected.inspection;
      const complaints = [...messages, ...files.flatMap((file) => file.messages)].filter(({ severity }) => severity !== 'notice');
      expect(complaints).toEqual([]);
      expect(detected.portCount).toBe(expected.ports);
      expect([family.description.timeConvention, null]).toContain(detected.timeConventionHint);
    });

    it('fills the grid it should', () => {
      const { responses, cells } = family.edition;
      expect([cells.length, responses.thetasRad.length, responses.phisRad.length, responses.frequenciesHz.length]).toEqual([expected.cells, ...expected.grid]);
      expect(cells.every(({ fileHashes }) => fileHashes.length === expected.grid[0] * expected.grid[1])).toBe(true);
      expect(responses.values.every(Number.isFinite)).toBe(true);
    });

    it(`is judged "${expected.verdict}"`, () => {
      const { report } = family;
      const troubles = [...report.family, ...report.cells.flatMap((cell) => cell.findings)].filter(({ verdict }) => verdict === 'fail' || verdict === 'warn');
      expect(troubles.map(({ check }) => check)).toEqual(expected.troubles);
      expect(report.verdict).toBe(expected.verdict);
    });

    it('agrees with its index in parameters and, where given, in the phase at the design frequency', () => {
      const index = readCsv(readFileSync(join(LIBRARY, folder, 'index.csv')));
      if (index.kind === 'refused') throw new Error(JSON.stringify(index.messages));
      const [heads, ...rows] = index.table.rows;
      expect(rows.length).toBe(family.inspected.curves.length);
      const phaseColumn = heads.indexOf('phase_deg_at_f0');
      const designHz = family.description.designFrequencyGHz * 1e9;
      for (const row of rows.filter((cells) => phaseColumn >= 0 && cells[phaseColumn] !== '')) {
        const curve = family.inspected.curves.find(({ file }) => file === row[0]);
        const at = curve === undefined ? -1 : curve.frequenciesHz.indexOf(designHz);
        const phaseDeg = curve === undefined ? Number.NaN : (Math.atan2(curve.values[2 * at + 1], curve.values[2 * at]) * 180) / Math.PI;
        // The index prints three decimals.
        expect([row[0], Math.abs(phaseDeg - Number(row[phaseColumn])) < 6e-4]).toEqual([row[0], true]);
      }
    });

    if (expected.rangeDeg !== undefined)
      it(`reaches the ${expected.rangeDeg} degrees its README states`, () => {
        const detail = family.report.family.find(({ check }) => check === 'phase-range')?.detail ?? '';
        expect(Math.abs(Number(/Phase range ([\d.]+)°/.exec(detail)?.[1]) - (expected.rangeDeg ?? 0))).toBeLessThan(0.5);
      });
  });
});

describe('the faults put into the laboratory exercise', () => {
  const { report, files } = load('square-patch-15-laboratory');
  const truth = files.find(({ name }) => name === 'faults.csv');
  const table = readCsv(truth?.bytes ?? new Uint8Array());
  const rows = table.kind === 'read' ? table.table.rows.slice(1) : [];
  const checkFor: Readonly<Record<string, string | null>> = { none: null, mhz_ma: null, db_crlf: null, gain_above_unity: 'passivity', phase_jump: 'phase-jump', missing_points: 'missing-points' };

  it('are listed for all 28 files', () => {
    expect(rows.length).toBe(28);
    expect(new Set(rows.map((row) => row[1]))).toEqual(new Set(Object.keys(checkFor)));
  });

  it.each(rows.map((row) => [row[0], row[1]]))('of %s (%s) are found by the check that looks for them, and no other fails', (name, fault) => {
    const cell = report.cells.find(({ cellId }) => `${cellId}.s1p` === name);
    const failed = cell?.findings.filter(({ verdict }) => verdict === 'fail' || verdict === 'warn').map(({ check }) => check);
    expect(failed).toEqual(checkFor[fault] === null ? [] : [checkFor[fault]]);
  });

  it('are located where they were put', () => {
    const detail = (cellId: string, check: string) => report.cells.find((cell) => cell.cellId === cellId)?.findings.find((finding) => finding.check === check)?.detail;
    expect(detail('patch15_a08.20_lab', 'phase-jump')).toMatch(/at 10\.2 GHz/);
    expect(detail('patch15_a09.20_lab', 'missing-points')).toBe('8 of 41 points are missing: 8.5 GHz, 8.6 GHz, 9.8 GHz, 9.9 GHz, 10 GHz, 10.1 GHz, 10.2 GHz, 11.3 GHz; the design frequency is among them');
    // The README of the family: 0.3 mm above the surface (with 0.08 degrees of drift and the patch's own 0.7), noise -50 dB.
    expect(report.family.find(({ check }) => check === 'reference-plane')?.detail).toMatch(/0\.3[0-4] mm above the patches/);
    const noiseDb = report.cells.flatMap((cell) => cell.findings.filter(({ check }) => check === 'noise').map(({ value }) => value ?? 0)).sort((a, b) => a - b);
    expect(Math.abs(noiseDb[14] + 50)).toBeLessThan(1.5);
    // faults.csv gives 1.11522 as the largest magnitude.
    expect(detail('patch15_a06.50_lab', 'passivity')).toMatch(/1\.1152 \(0\.95 dB\).*41 of 41 points/);
  });
});
