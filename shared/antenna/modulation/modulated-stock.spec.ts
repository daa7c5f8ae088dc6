import type { DesignDocument } from '../../model/design-document';
import { figures as figuresSchema } from '../../model/figures';
import { designFaults } from '../design-faults';
import { planeWaveDesign } from '../example-design';
import { placeCells } from '../place-cells';
import { predictDesign } from '../predict-design';

const flip: Extract<DesignDocument['cells'], { kind: 'modulated' }> = { kind: 'modulated', states: [{ phaseDeg: 0, magnitude: 1 }, { phaseDeg: 180, magnitude: 1 }], modulationMHz: 0.1, harmonic: 1 };
const requirement = { ...planeWaveDesign().requirement, beams: [{ thetaDeg: 10, phiDeg: 0 }] };
const modulated = (changes: Partial<typeof flip> = {}): DesignDocument => planeWaveDesign({ requirement, cells: { ...flip, ...changes } });

describe('time-modulated cells', () => {
  it('give the steered harmonic every wanted phase, for either sign and any order', () => {
    for (const harmonic of [1, -1, 3]) {
      const { assignment, targetRad } = placeCells(modulated({ harmonic }));
      assignment.phaseRad.forEach((phase, n) => expect(Math.cos(phase - targetRad[n])).toBeCloseTo(1, 9));
      expect(assignment.magnitude[0]).toBeCloseTo(2 / (Math.PI * Math.abs(harmonic)), 9);
    }
  });

  it('lose 3.92 dB into the other harmonics, and steer those by their own order', () => {
    const at = (harmonic?: number) => predictDesign(modulated(), { harmonic, include: {} }).figures;
    const [first, third, mirrored] = [at(), at(3), at(-1)];
    expect(figuresSchema.safeParse(first).success).toBe(true);
    expect(Number(first.cellLossDb)).toBeCloseTo(-3.922, 3);
    expect(Number(first.peakThetaDeg)).toBeCloseTo(10, 0);
    // sin theta three times as large; the minus first to the other side.
    expect(Number(third.peakThetaDeg)).toBeCloseTo((Math.asin(3 * Math.sin(Math.PI / 18)) * 180) / Math.PI, -0.3);
    expect(Math.abs(Number(mirrored.peakPhiDeg))).toBeCloseTo(180, 3);
    expect(third.modulation).toMatchObject({ harmonic: 3, offsetMHz: expect.closeTo(0.3, 9) as number });
  });

  it('tell that no power is lost between harmonics', () => {
    const { modulation } = predictDesign(modulated(), { include: {} }).figures;
    expect(modulation?.wholePower).toBeCloseTo(1, 12);
    const listed = modulation?.harmonics.reduce((sum, { share }) => sum + share, 0) ?? 0;
    expect(listed).toBeGreaterThan(0.9);
    expect(listed).toBeLessThanOrEqual(1);
  });

  it('refuse a harmonic that the sequence does not have, the carrier, and edges that do not fit', () => {
    const pointers = (changes: Partial<typeof flip>): string[] => designFaults(modulated(changes)).map(({ pointer }) => pointer);
    expect(pointers({ harmonic: 2 })).toEqual(['#/cells/harmonic']);
    expect(pointers({ harmonic: 0 })).toEqual(['#/cells/harmonic']);
    expect(pointers({ edges: [0, 0.7, 0.5] })).toEqual(['#/cells/edges']);
    expect(pointers({ edges: [0, 0.3, 1] })).toEqual([]);
  });
});
