import { loadChecks, loadPending, type CheckTable } from './published-check';
import { arrayChecks } from './tables/array-checks';
import { apertureChecks } from './tables/aperture-checks';
import { cellChecks } from './tables/cell-checks';
import { cellMatrixChecks } from './tables/cell-matrix-checks';
import { conventionsChecks } from './tables/conventions-checks';
import { feedChecks } from './tables/feed-checks';
import { guidedWaveChecks } from './tables/guided-wave-checks';
import { linkChecks } from './tables/link-checks';
import { maskChecks } from './tables/mask-checks';
import { measuringCellChecks } from './tables/measuring-cell-checks';
import { panelChecks } from './tables/panel-checks';
import { phaseChecks } from './tables/phase-checks';
import { refractionChecks } from './tables/refraction-checks';
import { synthesisChecks } from './tables/synthesis-checks';
import { toleranceChecks } from './tables/tolerance-checks';
import { vectorChecks } from './tables/vector-checks';
import { vectorFormChecks } from './tables/vector-form-checks';
import { vectorPanelChecks } from './tables/vector-panel-checks';
import { vectorSpecialChecks } from './tables/vector-special-checks';

const tables: CheckTable = { ...conventionsChecks, ...refractionChecks, ...arrayChecks, ...apertureChecks, ...phaseChecks, ...panelChecks, ...cellChecks, ...maskChecks, ...linkChecks, ...feedChecks, ...guidedWaveChecks, ...measuringCellChecks, ...synthesisChecks, ...toleranceChecks };
/** Run by specs of their own beside this one, since they take longer. */
const elsewhere: CheckTable = { ...vectorChecks, ...cellMatrixChecks, ...vectorFormChecks, ...vectorPanelChecks, ...vectorSpecialChecks };
const checks = loadChecks();
const pending = loadPending();

describe('published checks', () => {
  it('holds every published check: it runs, or says what it waits for, never both', () => {
    const runs = new Set([...Object.keys(tables), ...Object.keys(elsewhere)]);
    const unaccounted = checks.filter(({ id }) => runs.has(id) === pending.has(id)).map(({ id }) => id);
    const known = new Set(checks.map(({ id }) => id));
    const strangers = [...runs, ...pending.keys()].filter((id) => !known.has(id));
    expect({ unaccounted, strangers, total: checks.length }).toEqual({ unaccounted: [], strangers: [], total: 143 });
  });

  for (const check of checks.filter(({ id }) => !(id in elsewhere))) {
    const run = tables[check.id];
    const waitsFor = pending.get(check.id);
    if (run !== undefined) it(`${check.id}: ${check.what} [${check.source}]`, () => run(check));
    else it.todo(`${check.id}: ${check.what} - waits for ${waitsFor ?? 'nobody'}`);
  }
});
