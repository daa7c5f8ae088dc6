import type { Verdict } from '../../shared/model/figures';
import { overallVerdict } from './figure-service';

const verdict = (word: Verdict['verdict']): Verdict => ({ line: 'gain', sense: 'at-least', limit: 30, unit: 'dBi', value: 31, margin: 1, verdict: word });

describe('overallVerdict', () => {
  it.each([
    [['meets', 'meets'], 'meets'],
    [['meets', 'not-evaluated'], 'not-evaluated'],
    [['not-evaluated', 'falls-short', 'meets'], 'falls-short'],
    [[], 'not-evaluated'],
  ] as const)('of %j is %s', (words, overall) => {
    expect(overallVerdict(words.map(verdict))).toBe(overall);
  });
});
