import { DEFAULT_TOLERANCE } from '../../../../shared/model/tolerance-contributors';
import { STARTING_DESIGN } from '../../../../shared/model/starting-design';
import { fieldValue, sameParameters, toleranceFormFault, withField } from './tolerance-form';

describe('the form of a tolerance run', () => {
  it('takes numbers within their limits and says the limits otherwise', () => {
    const next = withField(DEFAULT_TOLERANCE, 'expansionPpmPerK', 24);
    expect('parameters' in next && fieldValue(next.parameters, 'expansionPpmPerK')).toBe(24);
    expect(withField(DEFAULT_TOLERANCE, 'trials', 12.5)).toEqual({ reason: 'A whole number from 10 to 5000' });
    expect(withField(DEFAULT_TOLERANCE, 'seed', -1)).toEqual({ reason: 'A whole number from 0 to 2⁵³ − 1' });
  });

  it('says why a run would have nothing to vary', () => {
    expect(toleranceFormFault(DEFAULT_TOLERANCE, STARTING_DESIGN)).toBeNull();
    expect(toleranceFormFault({ ...DEFAULT_TOLERANCE, contributors: [] }, STARTING_DESIGN)).toBe('Give at least one contributor a spread above 0');
    const etchAlone = DEFAULT_TOLERANCE.contributors.filter(({ id }) => id === 'etch-common');
    expect(toleranceFormFault({ ...DEFAULT_TOLERANCE, contributors: etchAlone }, STARTING_DESIGN)).toBe('Nothing that acts on this design is varied');
  });

  it('tells two runs apart by what is varied, not by the order or by what is left out', () => {
    const turned = { ...DEFAULT_TOLERANCE, contributors: [...DEFAULT_TOLERANCE.contributors].reverse() };
    const more = { ...DEFAULT_TOLERANCE, contributors: DEFAULT_TOLERANCE.contributors.map((one) => (one.id === 'bow' ? { ...one, spread: 0 } : one)) };
    const fewer = { ...more, contributors: more.contributors.filter(({ id }) => id !== 'bow') };
    expect([sameParameters(DEFAULT_TOLERANCE, turned), sameParameters(more, fewer), sameParameters(DEFAULT_TOLERANCE, fewer)]).toEqual([true, true, false]);
  });
});
