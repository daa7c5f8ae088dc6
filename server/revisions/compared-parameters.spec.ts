import type { DesignDocument } from '../../shared/model/design-document';
import { STARTING_DESIGN } from '../../shared/model/starting-design';
import { exampleEdition } from '../../shared/antenna/example-edition';
import { parameterDifferences } from './compared-parameters';
import { identitiesOf, sideOf, type ComparedEdition, type ComparedState } from './compared-state';

const IDS = ['00000000-0000-4000-8000-000000000001', '00000000-0000-4000-8000-000000000002'] as const;
const { description, cells } = exampleEdition();
const edition = (number: number, count: number): ComparedEdition => ({ id: IDS[number - 1], familyId: 'rings', familyName: 'Rings', number, description, cells: cells.slice(0, count) });
const on = (editionId: string): DesignDocument => ({ ...STARTING_DESIGN, cells: { kind: 'edition', editionId, rule: 'nearest-phase', excludedCells: [] } });

function state(design: DesignDocument, of: ComparedEdition | null = null): ComparedState {
  return { reference: 'draft:x', panelId: 'x', panelName: 'Panel', projectName: 'Project', hash: 'a'.repeat(64), header: null, design, edition: of };
}

describe('parameterDifferences', () => {
  it('names editions and says how many cells each offers', () => {
    const rows = parameterDifferences(state(on(IDS[0]), edition(1, 2)), state(on(IDS[1]), edition(2, 3)));
    expect(rows.map(({ label, before, after }) => [label, before, after])).toEqual([
      ['Edition', 'Rings, edition 1', 'Rings, edition 2'],
      ['Cells offered', 2, 3],
    ]);
  });

  it('goes through the document in its own order, however its fields were stored', () => {
    const after: DesignDocument = { ...STARTING_DESIGN, referencePhaseDeg: 10, cells: { kind: 'ideal', levels: 4 }, requirement: { ...STARTING_DESIGN.requirement, minGainDbi: 33 } };
    const stored = Object.fromEntries(Object.entries(after).reverse()) as DesignDocument;
    expect(parameterDifferences(state(STARTING_DESIGN), state(stored)).map(({ pointer }) => pointer)).toEqual(['/requirement/minGainDbi', '/cells/levels', '/referencePhaseDeg']);
  });

  it('finds none between equal designs', () => {
    expect(parameterDifferences(state(on(IDS[0]), edition(1, 2)), state(on(IDS[0]), edition(1, 2)))).toEqual([]);
  });
});

describe('the state of a side', () => {
  it('counts what of the requirement is met, short and open', () => {
    const verdict = { line: 'gain', sense: 'at-least', limit: 1, unit: 'dBi', value: 2, margin: 1 } as const;
    const words = ['meets', 'meets', 'falls-short', 'not-evaluated'] as const;
    expect(sideOf(state(STARTING_DESIGN), words.map((word) => ({ ...verdict, verdict: word })))).toMatchObject({ editionName: null, requirement: { met: 2, short: 1, open: 1 } });
  });

  it('tells what the indices of its cells point into', () => {
    expect(identitiesOf(state(STARTING_DESIGN))).toEqual({ kind: 'continuous' });
    expect(identitiesOf(state({ ...STARTING_DESIGN, cells: { kind: 'ideal', levels: 4 } }))).toEqual({ kind: 'table', key: 'ideal 4' });
    expect(identitiesOf(state({ ...STARTING_DESIGN, cells: { kind: 'inline', cells: [{ phaseDeg: 1, magnitude: 1 }] } }))).toEqual({ kind: 'table', key: '[{"magnitude":1,"phaseDeg":1}]' });
    expect(identitiesOf(state(on(IDS[0]), edition(1, 2)))).toMatchObject({ kind: 'family', familyId: 'rings', editionId: IDS[0], parametersMm: [cells[0].parametersMm, cells[1].parametersMm] });
  });
});
