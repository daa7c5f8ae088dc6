import { CONTRIBUTOR_IDS, CONTRIBUTORS, DEFAULT_TOLERANCE } from './tolerance-contributors';
import { contributorId, toleranceParameters } from './tolerance-run';

const faultsOf = (contributors: unknown): string[] => {
  const parsed = toleranceParameters.safeParse({ ...DEFAULT_TOLERANCE, contributors });
  return parsed.success ? [] : parsed.error.issues.map(({ path, message }) => `${path.join('/')}: ${message}`);
};

describe('parameters of a tolerance run', () => {
  it('take the defaults', () => {
    expect(toleranceParameters.parse(DEFAULT_TOLERANCE)).toEqual(DEFAULT_TOLERANCE);
  });

  it('refuse a contributor given twice and a distribution that does not fit', () => {
    expect(faultsOf([{ id: 'bow', spread: 1, distribution: 'normal' }, { id: 'bow', spread: 2, distribution: 'uniform' }])).toEqual(['contributors/1/id: bow is given twice']);
    expect(faultsOf([{ id: 'dead-cells', spread: 0.1, distribution: 'normal' }])).toEqual(['contributors/0/distribution: dead cells are drawn as a share']);
    expect(faultsOf([{ id: 'bow', spread: 0.1, distribution: 'share' }])).toEqual(['contributors/0/distribution: only dead cells are drawn as a share']);
    expect(faultsOf([{ id: 'dead-cells', spread: 1.5, distribution: 'share' }])).toEqual(['contributors/0/spread: a share is at most 1']);
  });

  it('give every contributor a channel of its own, so that one seed draws them apart', () => {
    expect(CONTRIBUTOR_IDS.slice().sort()).toEqual(contributorId.options.slice().sort());
    expect(new Set(CONTRIBUTOR_IDS.map((id) => CONTRIBUTORS[id].channel)).size).toBe(CONTRIBUTOR_IDS.length);
  });

  it('say what each default rests on', () => {
    for (const id of CONTRIBUTOR_IDS) expect(CONTRIBUTORS[id].source).toMatch(/common practice|from memory/);
  });
});
