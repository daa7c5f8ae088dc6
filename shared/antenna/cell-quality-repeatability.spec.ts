import fc from 'fast-check';
import type { CellEdition, QualityFinding } from '../model/cell-family';
import type { RepeatedCurve, ResponseOrigin } from '../model/response-origin';
import { judgeEdition } from './cell-quality';
import { exampleEdition } from './example-edition';
import { radFromDeg } from '../units/angles';

const GRID = { cellCount: 4, frequenciesGHz: [9, 9.5, 10, 10.5, 11], thetasDeg: [0, 30], phisDeg: [0] };
const measured = (): CellEdition => exampleEdition(GRID, { provenance: 'measured' });
const [CELL, THETA] = [2, 1];
const CURVE = CELL * 2 + THETA;

/** The curve of one cell at 30 degrees once more, with an error added to S11 and S22 of some points. */
function again(edition: CellEdition, error: (index: number) => { gain?: number; turnDeg?: number }): RepeatedCurve {
  const values = edition.responses.values.slice(CURVE * 5 * 8, (CURVE + 1) * 5 * 8);
  for (let index = 0; index < 5; index++) {
    const { gain = 1, turnDeg = 0 } = error(index);
    const [cos, sin] = [gain * Math.cos(radFromDeg(turnDeg)), gain * Math.sin(radFromDeg(turnDeg))];
    for (const at of [8 * index, 8 * index + 6]) [values[at], values[at + 1]] = [values[at] * cos - values[at + 1] * sin, values[at] * sin + values[at + 1] * cos];
  }
  return { file: 'again.s2p', cell: CELL, theta: THETA, phi: 0, frequenciesHz: edition.responses.frequenciesHz, values, lines: Int32Array.of(4, 5, 6, 7, 8) };
}

function judged(repeats: readonly RepeatedCurve[], edition = measured()): QualityFinding[] {
  const origin: ResponseOrigin = { fileOfCurve: new Array<string>(8).fill('first.s2p'), lineOfPoint: new Int32Array(40), repeats };
  const report = judgeEdition(edition, origin);
  return [...report.family, ...report.cells.flatMap(({ findings }) => findings)].filter(({ check }) => check === 'repeatability');
}

describe('checkRepeatability', () => {
  it('passes a measurement that gave the same', () => {
    expect(judged([again(measured(), () => ({}))])).toMatchObject([{ verdict: 'pass', cellId: 'cell-2', file: 'again.s2p', line: 4 }]);
  });

  it('gives the RMS and the largest deviation in decibels and degrees, where it stands, and a verdict', () => {
    // 3 degrees at one of five frequencies: |exp(j 3 deg) - 1| = 0.05236, over the RMS of five by sqrt(5).
    const [finding] = judged([again(measured(), (index) => (index === 3 ? { turnDeg: 3 } : {}))]);
    const magnitudes = [0, 3].map((entry) => {
      const at = (CURVE * 5 + 3) * 8 + 2 * entry;
      const { values } = measured().responses;
      return Math.hypot(values[at], values[at + 1]) * 2 * Math.sin(radFromDeg(1.5));
    });
    const rms = Math.sqrt(magnitudes.reduce((sum, size) => sum + size * size, 0) / 10);
    expect(finding).toMatchObject({ verdict: 'pass', line: 7, value: expect.closeTo(20 * Math.log10(rms), 9) });
    expect(finding.detail).toBe(
      `again.s2p measures cell-2 at θ 30°, φ 0° again: the two differ by ${(20 * Math.log10(rms)).toFixed(1)} dB RMS (phase 1.3°) over 10 responses, ` +
        `at most ${(20 * Math.log10(Math.max(...magnitudes))).toFixed(1)} dB (phase 3.0°) at 10.5 GHz`,
    );
  });

  it.each([
    [{ turnDeg: 3 }, 'warn'],
    [{ turnDeg: 8 }, 'fail'],
    [{ gain: 1.05 }, 'warn'],
    [{ gain: 0.8 }, 'fail'],
  ] as const)('judges an error of %j in the whole sweep: %s', (error, verdict) => {
    expect(judged([again(measured(), () => error)])[0].verdict).toBe(verdict);
  });

  it('does not forgive a single slip because the rest agrees', () => {
    expect(judged([again(measured(), (index) => (index === 0 ? { turnDeg: 6 } : {}))])[0].verdict).toBe('warn');
    expect(judged([again(measured(), (index) => (index === 0 ? { turnDeg: 180 } : {}))])[0].verdict).toBe('fail');
  });

  it('says the same whichever of the two was first', () => {
    fc.assert(
      fc.property(fc.double({ min: -20, max: 20, noNaN: true }), fc.double({ min: 0.8, max: 1.2, noNaN: true }), (turnDeg, gain) => {
        const first = measured();
        const second = again(first, () => ({ turnDeg, gain }));
        const swapped = measured();
        swapped.responses.values.set(second.values, CURVE * 5 * 8);
        const back = judged([again(first, () => ({}))], swapped)[0];
        const there = judged([second], first)[0];
        expect([back.verdict, back.value]).toEqual([there.verdict, expect.closeTo(there.value ?? NaN, 9)]);
      }),
      { numRuns: 30 },
    );
  });

  it('compares only frequencies that both have, and says when there is none', () => {
    const edition = measured();
    const curve = again(edition, (index) => (index === 1 ? { turnDeg: 90 } : {}));
    const moved = { ...curve, frequenciesHz: curve.frequenciesHz.map((hz, i) => (i === 1 ? hz + 1e6 : hz)) };
    expect(judged([moved])[0]).toMatchObject({ verdict: 'pass', detail: expect.stringContaining('over 8 responses') });
    const elsewhere = { ...curve, frequenciesHz: curve.frequenciesHz.map((hz) => hz + 1e6) };
    expect(judged([elsewhere])[0]).toMatchObject({ verdict: 'not-evaluated', file: 'again.s2p' });
  });

  it('asks for a second measurement of measured families only', () => {
    expect(judged([])).toEqual([{ check: 'repeatability', verdict: 'not-evaluated', detail: 'No cell was measured twice' }]);
    expect(judged([], exampleEdition(GRID))).toEqual([]);
  });
});
