import * as fc from 'fast-check';
import { radFromDeg } from '../units/angles';
import { coPolarResponse, incidenceWeigher } from './cell-response';
import { complexError, editionChooser, phaseError } from './edition-choice';
import { exampleEdition } from './example-edition';
import { prepareEdition } from './prepare-edition';

const prepared = prepareEdition(exampleEdition());
const at = prepared.atFrequency(10.1e9);
const all = Int32Array.from({ length: 24 }, (_, k) => k);
const someCase = fc.record({
  target: fc.double({ min: -40, max: 40, noNaN: true }),
  thetaDeg: fc.double({ min: 0, max: 65, noNaN: true }),
  phiDeg: fc.double({ min: -180, max: 180, noNaN: true }),
  polarisation: fc.constantFrom('x' as const, 'y' as const, 'rhcp' as const),
});

describe('choosing a cell of an edition', () => {
  it.each([
    ['nearest-phase', phaseError],
    ['least-error', complexError],
  ] as const)('by %s gives what trying every cell gives', (rule, errorOf) => {
    const choose = editionChooser(at, rule);
    fc.assert(
      fc.property(someCase, ({ target, thetaDeg, phiDeg, polarisation }) => {
        const weights = incidenceWeigher(prepared, polarisation)(radFromDeg(thetaDeg), radFromDeg(phiDeg));
        const errors = Array.from(all, (k) => errorOf(coPolarResponse(at, k, weights, { magnitude: 0, phaseRad: 0 }), target));
        expect(choose(target, weights, all)).toBe(errors.indexOf(Math.min(...errors)));
      }),
      { numRuns: 600 },
    );
  });

  it('keeps to the cells allowed, and has none where none is', () => {
    const choose = editionChooser(at, 'nearest-phase');
    const weights = incidenceWeigher(prepared, 'x')(0.3, 0.2);
    const best = choose(1, weights, all);
    const others = all.filter((k) => k !== best);
    expect(choose(1, weights, others)).not.toBe(best);
    expect(choose(1, weights, new Int32Array(0))).toBe(-1);
  });

  it('gives equal errors to the smallest index', () => {
    const twins = exampleEdition();
    const perCell = twins.responses.values.length / 24;
    twins.responses.values.copyWithin(9 * perCell, 3 * perCell, 4 * perCell);
    const doubled = prepareEdition(twins);
    const weights = incidenceWeigher(doubled, 'x')(0.3, 0.2);
    const own = coPolarResponse(doubled.atFrequency(10e9), 3, weights, { magnitude: 0, phaseRad: 0 });
    expect(editionChooser(doubled.atFrequency(10e9), 'nearest-phase')(own.phaseRad, weights, all)).toBe(3);
  });

  it('never leaves a wrapped error above 180 degrees', () => {
    fc.assert(fc.property(fc.double({ min: -1e3, max: 1e3, noNaN: true }), (target) => expect(phaseError({ magnitude: 1, phaseRad: 2 }, target)).toBeLessThanOrEqual(Math.PI)));
  });
});
