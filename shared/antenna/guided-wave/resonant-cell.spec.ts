import * as fc from 'fast-check';
import { bestState, chosenField, coupledField, ruleAverages, tunedField, type CoupledField } from './resonant-cell';
import { resonantStock } from './resonant-stock';

const out: CoupledField = { magnitude: 0, phaseRad: 0 };
const angle = fc.double({ min: -10, max: 10, noNaN: true });
const parts = ({ magnitude, phaseRad }: CoupledField): [number, number] => [magnitude * Math.cos(phaseRad), magnitude * Math.sin(phaseRad)];

describe('a resonant cell', () => {
  it('couples (j + exp(j psi)) / 2 for any tuning', () => {
    fc.assert(
      fc.property(angle, (psi) => {
        const [re, im] = parts(coupledField(psi, out));
        expect(re).toBeCloseTo(Math.cos(psi) / 2, 12);
        expect(im).toBeCloseTo((1 + Math.sin(psi)) / 2, 12);
      }),
    );
  });

  it('has its full strength at 90 degrees and none at 0', () => {
    expect(coupledField(Math.PI / 2, out).magnitude).toBeCloseTo(1, 12);
    expect(coupledField(-Math.PI / 2, out).magnitude).toBeCloseTo(0, 12);
  });

  it('with the rule of projection gives the largest part in phase, with the nearest the smallest distance', () => {
    fc.assert(
      fc.property(angle, angle, (target, other) => {
        const [re, im] = parts(coupledField(other, out));
        const inPhase = (a: number, b: number): number => a * Math.cos(target) + b * Math.sin(target);
        const off = (a: number, b: number): number => Math.hypot(a - Math.cos(target), b - Math.sin(target));
        expect(inPhase(...parts(tunedField('projection', target, out)))).toBeGreaterThanOrEqual(inPhase(re, im) - 1e-12);
        expect(off(...parts(tunedField('nearest', target, out)))).toBeLessThanOrEqual(off(re, im) + 1e-12);
      }),
    );
  });

  it('with the rule of phase only is off for targets beyond 180 degrees', () => {
    expect(tunedField('phase-only', Math.PI / 3, out)).toEqual({ magnitude: expect.closeTo(Math.sin(Math.PI / 3), 12), phaseRad: expect.closeTo(Math.PI / 3, 12) });
    expect(tunedField('phase-only', -0.5, out).magnitude).toBe(0);
  });

  it('chooses the best of its states, by trying them all', () => {
    fc.assert(
      fc.property(angle, fc.integer({ min: 2, max: 9 }), fc.constantFrom('projection' as const, 'nearest' as const), (target, states, rule) => {
        const cost = (k: number): number => {
          const [re, im] = parts(coupledField((2 * Math.PI * k) / states, out));
          return rule === 'projection' ? -(re * Math.cos(target) + im * Math.sin(target)) : Math.hypot(re - Math.cos(target), im - Math.sin(target));
        };
        const least = Math.min(...Array.from({ length: states }, (_, k) => cost(k)));
        expect(cost(bestState(rule, target, states))).toBeCloseTo(least, 9);
      }),
    );
  });

  it('takes the lower of two states that are as good', () => {
    expect([bestState('projection', Math.PI / 2, 2), bestState('projection', Math.PI / 4, 4), bestState('projection', -Math.PI / 4, 4)]).toEqual([0, 0, 3]);
  });

  it('puts 4 / pi^2 of what it couples into the beam with phase only, one half by projection', () => {
    expect(ruleAverages('phase-only', null).modulationEfficiency).toBeCloseTo(4 / Math.PI ** 2, 6);
    expect(ruleAverages('projection', null)).toEqual({ meanInPhase: expect.closeTo(0.5, 9), modulationEfficiency: expect.closeTo(0.5, 9) });
  });
});

describe('a stock of resonant cells', () => {
  it('names the state chosen, or none for a continuous tuning, and is frozen with frequency', () => {
    const stock = resonantStock({ kind: 'resonant', rule: 'projection', states: 4 });
    const assignment = stock.assign(Float64Array.of(0, Math.PI));
    expect([...assignment.cellIndex]).toEqual([0, 2]);
    expect(stock.respond(assignment, 1e9)).toBe(assignment);
    expect([...resonantStock({ kind: 'resonant', rule: 'nearest', states: null }).assign(Float64Array.of(1)).cellIndex]).toEqual([-1]);
  });

  it('searches the reference phase that gives the most field', () => {
    const cells = { kind: 'resonant', rule: 'phase-only', states: null } as const;
    // One cell: the most field is where the circle is strongest, at 90 degrees.
    const query = { targetRad: Float64Array.of(0.3), weightRe: Float64Array.of(1), weightIm: Float64Array.of(0) };
    const found = resonantStock(cells).searchReferenceRad(query);
    expect(chosenField(cells, 0.3 + found, out)).toBe(-1);
    expect(out.magnitude).toBeGreaterThan(0.9999);
  });
});
