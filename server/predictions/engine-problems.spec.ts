import { InvalidDesign } from '../../shared/antenna/invalid-design';
import { EngineRefusal, abandoned, superseded } from '../engine/engine-refusals';
import { InvalidInput, Superseded, TooMany, Unavailable } from '../http/problems';
import { problemOfEngine } from './engine-problems';

describe('problemOfEngine', () => {
  it('points the faults of a design into the request that carried it, all of them', () => {
    const problem = problemOfEngine(new InvalidDesign([{ pointer: '#/panel', detail: 'too many cells' }, { pointer: '#/cells/editionId', detail: 'not at hand' }]));
    expect(problem).toBeInstanceOf(InvalidInput);
    expect(problem).toMatchObject({
      message: '2 values are not valid.',
      faults: [{ pointer: '#/design/panel', detail: 'too many cells' }, { pointer: '#/design/cells/editionId', detail: 'not at hand' }],
    });
  });

  it.each([
    [superseded(), Superseded, 'A newer preview of the same name took its place.'],
    [new EngineRefusal('busy', 'The line is long.'), TooMany, 'The line is long. Try again in 2 s.'],
    [abandoned(), Unavailable, 'The caller went away.'],
    [new EngineRefusal('timed-out', 'The prediction took longer than 120 s.'), Unavailable, 'The prediction took longer than 120 s.'],
  ])('tells a caller why there is no prediction: %s', (refusal, kind, message) => {
    const problem = problemOfEngine(refusal);
    expect(problem).toBeInstanceOf(kind);
    expect(problem).toMatchObject({ message });
  });

  it('says of a costly design what it would cost, at the design', () => {
    expect(problemOfEngine(new EngineRefusal('too-costly', 'It would take about 90 s.'))).toMatchObject({ faults: [{ pointer: '#/design', detail: 'It would take about 90 s.' }] });
  });

  it('leaves a fault of our own as it is: it answers 500 and is logged', () => {
    const error = new TypeError('undefined is not a function');
    expect(problemOfEngine(error)).toBe(error);
    expect(problemOfEngine('text')).toBe('text');
  });
});
