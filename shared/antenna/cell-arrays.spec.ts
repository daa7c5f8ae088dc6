import fc from 'fast-check';
import { wrapDeg } from '../units/angles';
import { cellArrays, phaseInTurnDeg } from './cell-arrays';
import { exampleDesign } from './example-design';
import { placeCells } from './place-cells';
import { FLOOR_DBI } from './pattern-cut';

describe('phaseInTurnDeg', () => {
  it('lies in one turn whatever the phase, also once it is rounded to single precision', () => {
    fc.assert(
      fc.property(fc.oneof(fc.double({ min: -1e4, max: 1e4, noNaN: true }), fc.integer({ min: -50, max: 50 }).map((turns) => 2 * Math.PI * turns - 1e-12)), (rad) => {
        const deg = phaseInTurnDeg(rad);
        expect(deg).toBeGreaterThanOrEqual(0);
        expect(deg).toBeLessThan(360);
        expect(Math.fround(deg)).toBe(deg);
        // A phase of 10^4 radians is known to 1e-10 degrees, single precision to 3e-5.
        expect(Math.abs(wrapDeg(deg - (rad * 180) / Math.PI))).toBeLessThan(4e-5);
      }),
    );
  });
});

describe('cellArrays', () => {
  const placed = placeCells(exampleDesign({ cells: { kind: 'inline', cells: [{ phaseDeg: 10, magnitude: 0.5 }, { phaseDeg: 190, magnitude: 0 }] } }));
  const arrays = cellArrays({ ...placed, responses: placed.assignment });

  it('give the place, the cell and the light of every position in millimetres and degrees', () => {
    expect([arrays.xMm[0], arrays.yMm[0], arrays.column[0], arrays.row[0]]).toEqual([expect.closeTo(-142.5, 9), expect.closeTo(-142.5, 9), 0, 0]);
    expect(arrays.cellIndex).toBe(placed.assignment.cellIndex);
    expect(arrays.incidenceDeg[399]).toBeCloseTo((placed.light.incidenceRad[399] * 180) / Math.PI, 4);
  });

  it('hold the error as achieved less target, the short way round', () => {
    arrays.errorDeg.forEach((error, n) => {
      expect(Math.abs(error)).toBeLessThanOrEqual(180);
      expect(Math.abs(wrapDeg(arrays.phaseDeg[n] - arrays.targetPhaseDeg[n] - error))).toBeLessThan(1e-3);
    });
  });

  it('stand on the floor where a cell returns nothing', () => {
    const levels = new Set(Array.from(arrays.responseDb, (db) => Number(db.toFixed(2))));
    expect(levels).toEqual(new Set([Number((20 * Math.log10(0.5)).toFixed(2)), FLOOR_DBI]));
  });
});
