import { degFromRad, wrapDeg } from '../units/angles';
import { exampleEdition, exampleResponse } from './example-edition';
import { prepareEdition } from './prepare-edition';
import { curveOverCells, curveOverFrequency, curveOverIncidence, type CurvePoint } from './response-curve';

const prepared = prepareEdition(exampleEdition());
const fixed: CurvePoint = { cellIndex: 8, frequencyGHz: 10, incidenceDeg: 30, azimuthDeg: 0, polarisation: 'first' };

describe('response curves', () => {
  it('run over the cells by their first parameter with a phase free of jumps', () => {
    const { abscissa, phaseDeg, magnitudeDb, cellIndex } = curveOverCells(prepared, fixed);
    expect(Array.from(cellIndex.slice(0, 3))).toEqual([0, 1, 2]);
    expect(abscissa[23]).toBeCloseTo(3.3, 9);
    phaseDeg.forEach((phase, k) => {
      const truth = exampleResponse(k / 24, 10, { thetaDeg: 30, phiDeg: 0, entry: 0 });
      expect(wrapDeg(phase - degFromRad(truth.phaseRad))).toBeCloseTo(0, 3);
      expect(magnitudeDb[k]).toBeCloseTo(20 * Math.log10(truth.magnitude), 3);
      if (k > 0) expect(Math.abs(phase - phaseDeg[k - 1])).toBeLessThan(60);
    });
    expect(phaseDeg[0] - phaseDeg[23]).toBeGreaterThan(300);
  });

  it('run over the frequencies of the edition', () => {
    const { abscissa, phaseDeg } = curveOverFrequency(prepared, fixed);
    expect(Array.from(abscissa)).toEqual([9, 9.5, 10, 10.5, 11]);
    expect(phaseDeg[4] - phaseDeg[0]).toBeCloseTo(degFromRad(-0.8), 6);
  });

  it('run over the angles that are covered, TM and the mixtures too', () => {
    const te = curveOverIncidence(prepared, fixed, 15);
    const tm = curveOverIncidence(prepared, { ...fixed, polarisation: 'second' }, 15);
    const x = curveOverIncidence(prepared, { ...fixed, polarisation: 'x' }, 15);
    expect(Array.from(te.abscissa, (deg) => Number(deg.toFixed(6)))).toEqual([0, 15, 30, 45, 60]);
    expect(te.phaseDeg[0]).toBeCloseTo(tm.phaseDeg[0], 9);
    expect(te.phaseDeg[4]).not.toBeCloseTo(tm.phaseDeg[4], 0);
    expect(x.phaseDeg[3]).toBeCloseTo(tm.phaseDeg[3], 6);
    const y = curveOverIncidence(prepared, { ...fixed, polarisation: 'y' }, 15);
    expect(y.phaseDeg[3]).toBeCloseTo(te.phaseDeg[3], 6);
  });
});
