import type { Verdict } from '../../../shared/model/figures';
import { panelOverviewOf } from './project-fixture';
import { requirementMark } from './requirement-mark';

const line = (name: Verdict['line'], verdict: Verdict['verdict']): Verdict => ({ line: name, sense: 'at-least', limit: 30, unit: 'dB', value: 31, margin: 1, verdict });
const markOf = (...verdicts: Verdict[]) => requirementMark(panelOverviewOf({ summary: { cellCount: 4, gainDbi: 30, verdicts, overall: 'not-evaluated' } }));

describe('mark of the requirement', () => {
  it('names what falls short before what was not evaluated, and both before what is met', () => {
    const [met, short, open] = [line('gain', 'meets'), line('cross-polar', 'falls-short'), line('mask', 'not-evaluated')];
    expect(markOf(met, short, open)).toEqual({ state: 'falls-short', detail: 'Falls short in cross polar' });
    expect(markOf(met, open)).toEqual({ state: 'in-work', detail: 'Not evaluated: mask' });
    expect(markOf(met)).toEqual({ state: 'meets', detail: 'Every line is met, as predicted' });
  });

  it('does not call a requirement without a limit met', () => {
    expect(markOf()).toEqual({ state: 'in-work', detail: 'No limit set' });
  });
});
