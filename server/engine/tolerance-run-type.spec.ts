import { placeCells } from '../../shared/antenna/place-cells';
import { SAMPLE_TOLERANCE_DESIGN, SAMPLE_TOLERANCE_PARAMETERS, sampleToleranceResult } from '../../shared/antenna/tolerance/sample-tolerance';
import { runRequest } from '../../shared/contracts/runs';
import { runTypeOf } from './run-types';
import type { RunQuestion } from './run-type';

const question: RunQuestion<'tolerance'> = { design: SAMPLE_TOLERANCE_DESIGN, parameters: SAMPLE_TOLERANCE_PARAMETERS };
const type = runTypeOf('tolerance');

describe('the tolerance run', () => {
  it('gives through plan, chunks and merge what the engine gives', () => {
    const placed = placeCells(SAMPLE_TOLERANCE_DESIGN);
    let asked = 0;
    const parts = type.plan(question).map(({ chunk }) => JSON.parse(JSON.stringify(type.compute({ ...question, placed, chunk, checkStop: () => void (asked += 1) }))) as unknown);
    expect(type.merge(question, parts)).toEqual(sampleToleranceResult());
    // 20 trials together and 20 of each of three contributors alone.
    expect(asked).toBe(80);
  });

  it('is asked by parameters that keep their schema', () => {
    expect(runRequest.safeParse({ kind: 'tolerance', parameters: SAMPLE_TOLERANCE_PARAMETERS }).success).toBe(true);
    expect(runRequest.safeParse({ kind: 'tolerance', parameters: { ...SAMPLE_TOLERANCE_PARAMETERS, trials: 3 } }).success).toBe(false);
  });

  it('names what cannot be varied before anything is stored', () => {
    const still: RunQuestion<'tolerance'> = { ...question, parameters: { ...SAMPLE_TOLERANCE_PARAMETERS, contributors: [{ id: 'bow', spread: 0, distribution: 'normal' }] } };
    expect(type.faults(still)).toEqual([{ pointer: '#/parameters/contributors', detail: 'give at least one contributor a spread above 0' }]);
  });
});
