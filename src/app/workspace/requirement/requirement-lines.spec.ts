import { STARTING_DESIGN } from '../../../../shared/model/starting-design';
import { SAMPLE_VERDICTS } from '../sample-prediction';
import { requirementLines } from './requirement-lines';

const { requirement } = STARTING_DESIGN;
const words = (lines: ReturnType<typeof requirementLines>) => Object.fromEntries(lines.map(({ line, word }) => [line, word]));

describe('requirementLines', () => {
  it('judges the lines that have a limit and says of the others that they have none', () => {
    expect(words(requirementLines(requirement, { verdicts: SAMPLE_VERDICTS, stale: false }))).toEqual({
      gain: 'meets',
      sidelobe: 'meets',
      pointing: 'meets',
      'cross-polar': 'no-limit',
      mask: 'no-limit',
    });
  });

  it('shows value and signed margin with the unit of the line', () => {
    const [gain, sidelobe] = requirementLines(requirement, { verdicts: SAMPLE_VERDICTS, stale: false });
    expect([gain.value, gain.margin]).toEqual(['34.76 dBi', '+0.76']);
    expect([sidelobe.value, sidelobe.margin]).toEqual(['−19.50 dB', '+1.50']);
  });

  it('never takes a verdict of an older design for one of this design', () => {
    expect(words(requirementLines(requirement, { verdicts: SAMPLE_VERDICTS, stale: true }))['gain']).toBe('stale');
  });

  it('never shows what was not evaluated as met, and gives the reason', () => {
    const verdict = {
      line: 'cross-polar' as const,
      sense: 'at-least' as const,
      limit: 25,
      unit: 'dB',
      value: { kind: 'scalar-model', reason: 'the scalar prediction has no cross-polar field' },
      margin: { kind: 'scalar-model', reason: 'the scalar prediction has no cross-polar field' },
      verdict: 'not-evaluated' as const,
    };
    const line = requirementLines({ ...requirement, minCrossPolarDiscriminationDb: 25 }, { verdicts: [verdict], stale: false })[3];
    expect(line).toMatchObject({ word: 'not-evaluated', value: '–', margin: null, reason: 'the scalar prediction has no cross-polar field' });
  });

  it('tells a discrimination that is rounding alone as a bound', () => {
    const verdict = { line: 'cross-polar' as const, sense: 'at-least' as const, limit: 25, unit: 'dB', value: 200, margin: 175, verdict: 'meets' as const };
    const lineOf = (value: number) => requirementLines({ ...requirement, minCrossPolarDiscriminationDb: 25 }, { verdicts: [{ ...verdict, value, margin: value - 25 }], stale: false })[3];
    expect(lineOf(200)).toMatchObject({ word: 'meets', value: '> 100.00 dB', margin: '> +75.00' });
    expect(lineOf(31.5)).toMatchObject({ value: '31.50 dB', margin: '+6.50' });
  });

  it('waits for the first prediction', () => {
    expect(words(requirementLines(requirement, { verdicts: null, stale: false }))['gain']).toBe('waiting');
  });
});
