import * as fc from 'fast-check';
import type { DesignDocument } from '../../../shared/model/design-document';
import { replacedAt } from '../../../shared/model/design-pointer';
import { STARTING_DESIGN } from '../../../shared/model/starting-design';
import { STEP_LIMIT, beginHistory, recordChange, redoStep, undoStep } from './draft-history';
import type { DraftHistory } from './draft-history';

const aimed = (thetaDeg: number): DesignDocument => replacedAt(STARTING_DESIGN, '/requirement/beams/0/thetaDeg', thetaDeg);
const steer = (history: DraftHistory, thetaDeg: number, at: number, mergeKey?: string): DraftHistory =>
  recordChange(history, { name: 'Steer beam', design: aimed(thetaDeg), at, mergeKey });
const theta = (history: DraftHistory): number => history.design.requirement.beams[0].thetaDeg;

describe('the history of a draft', () => {
  it('takes a named step back and makes it again', () => {
    const steered = steer(beginHistory(STARTING_DESIGN), 25, 0);
    expect(steered.done.at(-1)?.name).toBe('Steer beam');
    const back = undoStep(steered);
    expect(theta(back)).toBe(20);
    expect(theta(redoStep(back))).toBe(25);
  });

  it('merges a drag into one step, even one that lasts longer than the window', () => {
    let history = beginHistory(STARTING_DESIGN);
    for (let i = 1; i <= 5; i += 1) history = steer(history, 20 + i, i * 900, 'drag');
    expect(history.done).toHaveLength(1);
    expect(theta(undoStep(history))).toBe(20);
  });

  it('keeps two changes apart when a second has passed, the key differs, or there is none', () => {
    const first = steer(beginHistory(STARTING_DESIGN), 21, 0, 'drag');
    expect(steer(first, 22, 1001, 'drag').done).toHaveLength(2);
    expect(steer(first, 22, 10, 'type').done).toHaveLength(2);
    expect(steer(steer(beginHistory(STARTING_DESIGN), 21, 0), 22, 1).done).toHaveLength(2);
  });

  it('does not merge into a step that was taken back in between', () => {
    const redone = redoStep(undoStep(steer(beginHistory(STARTING_DESIGN), 21, 0, 'drag')));
    expect(steer(redone, 22, 10, 'drag').done).toHaveLength(2);
  });

  it('forgets what was undone once something new is done', () => {
    const branched = steer(undoStep(steer(beginHistory(STARTING_DESIGN), 21, 0)), 30, 5);
    expect(branched.undone).toEqual([]);
    expect(redoStep(branched)).toBe(branched);
  });

  it('counts no step for a change that changes nothing', () => {
    const history = beginHistory(STARTING_DESIGN);
    expect(recordChange(history, { name: 'Steer beam', design: STARTING_DESIGN, at: 0 })).toBe(history);
  });

  it('keeps the last hundred steps', () => {
    let history = beginHistory(STARTING_DESIGN);
    for (let i = 0; i < STEP_LIMIT + 30; i += 1) history = steer(history, i / 10, i);
    expect(history.done).toHaveLength(STEP_LIMIT);
    for (let i = 0; i < STEP_LIMIT; i += 1) history = undoStep(history);
    expect(theta(history)).toBeCloseTo(2.9, 12);
    expect(undoStep(history)).toBe(history);
  });

  it('comes back to the same design after undoing and redoing everything', () => {
    fc.assert(
      fc.property(fc.array(fc.integer({ min: 0, max: 89 }), { minLength: 1, maxLength: 40 }), (thetas) => {
        let history = beginHistory(STARTING_DESIGN);
        thetas.forEach((value, at) => (history = steer(history, value, at * 2000)));
        const { design } = history;
        const steps = history.done.length;
        for (let i = 0; i < steps; i += 1) history = undoStep(history);
        expect(history.design).toBe(STARTING_DESIGN);
        for (let i = 0; i < steps; i += 1) history = redoStep(history);
        expect(history.design).toBe(design);
      }),
      { seed: 11 },
    );
  });
});
