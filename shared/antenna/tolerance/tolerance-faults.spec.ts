import { DEFAULT_TOLERANCE } from '../../model/tolerance-contributors';
import type { ToleranceContributor } from '../../model/tolerance-run';
import { exampleDesign } from '../example-design';
import { toleranceFaults } from './tolerance-faults';

const faultsOf = (contributors: ToleranceContributor[]): string[] =>
  toleranceFaults({ design: exampleDesign(), parameters: { ...DEFAULT_TOLERANCE, contributors } }).map(({ pointer, detail }) => `${pointer} ${detail}`);

describe('toleranceFaults', () => {
  it('takes the defaults on any design', () => {
    expect(faultsOf(DEFAULT_TOLERANCE.contributors)).toEqual([]);
  });

  it('wants something that varies', () => {
    expect(faultsOf([{ id: 'bow', spread: 0, distribution: 'normal' }])).toEqual(['#/parameters/contributors give at least one contributor a spread above 0']);
  });

  it('wants something that acts on this design', () => {
    expect(faultsOf([{ id: 'etch-random', spread: 0.02, distribution: 'normal' }])).toEqual([
      '#/parameters/contributors nothing that acts on this design is varied: etch, cell by cell need cells of an edition or a horn',
    ]);
  });
});
