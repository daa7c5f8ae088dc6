import { radFromDeg } from '../units/angles';
import { apertureLosses, commonPhaseRad, edgeTaperDb, phaseErrorsRad } from './aperture-figures';
import { EXAMPLE_DESIGN, planeWaveDesign } from './example-design';
import type { CellIllumination } from './illumination';
import { panelLattice } from './panel-lattice';
import { siDesign } from './si-design';

const lit = (amplitude: number[]): CellIllumination => ({
  amplitude: Float64Array.from(amplitude),
  pathM: new Float64Array(amplitude.length),
  incidenceRad: new Float64Array(amplitude.length),
  azimuthRad: new Float64Array(amplitude.length),
});
const cells = (magnitude: number[]): { magnitude: Float64Array; phaseRad: Float64Array } => ({ magnitude: Float64Array.from(magnitude), phaseRad: new Float64Array(magnitude.length) });

describe('the losses of an aperture', () => {
  it('are by definition of taper, phase error, phase loss and cell loss', () => {
    const losses = apertureLosses(lit([1, 2]), cells([0.9, 0.8]), Float64Array.of(radFromDeg(30), radFromDeg(-30)));
    expect(losses.taperDb).toBeCloseTo(10 * Math.log10(9 / (2 * 5)), 12);
    expect(losses.phaseErrorRmsDeg).toBeCloseTo(30, 10);
    expect(losses.phaseLossDb).toBeCloseTo(10 * Math.log10((3 * Math.cos(radFromDeg(30))) ** 2 + Math.sin(radFromDeg(30)) ** 2) - 10 * Math.log10(9), 10);
    expect(losses.cellLossDb).toBeCloseTo(10 * Math.log10((0.81 + 4 * 0.64) / 5), 12);
  });

  it.each([
    [2, -3.9224, 51.9615],
    [4, -0.912098, 25.9808],
    [16, -0.0558833, 6.49519],
  ])('are, for phases spread evenly over %d levels, %d dB and %d degrees rms', (levels, lossDb, rmsDeg) => {
    const count = 20000;
    const errors = Float64Array.from({ length: count }, (_, i) => ((i + 0.5) / count - 0.5) * ((2 * Math.PI) / levels));
    const { phaseLossDb, phaseErrorRmsDeg } = apertureLosses(lit(Array.from(errors, () => 1)), cells(Array.from(errors, () => 1)), errors);
    expect(phaseLossDb).toBeCloseTo(lossDb, 4);
    expect(phaseErrorRmsDeg).toBeCloseTo(rmsDeg, 3);
  });

  it('say why they do not exist when nothing is lit or nothing comes back', () => {
    expect(apertureLosses(lit([0, 0]), cells([1, 1]), new Float64Array(2)).taperDb).toEqual({ kind: 'nothing-lit', reason: expect.any(String) });
    const dark = apertureLosses(lit([1, 1]), cells([0, 0]), new Float64Array(2));
    expect([dark.taperDb, dark.cellLossDb]).toEqual([0, { kind: 'nothing-reflected', reason: expect.any(String) }]);
    const cancelled = apertureLosses(lit([1, 1]), cells([1, 1]), Float64Array.of(0, Math.PI));
    expect(typeof cancelled.phaseLossDb === 'number' && cancelled.phaseLossDb > -300).toBe(false);
  });

  it('leave a cell that returns nothing out of the phase error', () => {
    const losses = apertureLosses(lit([1, 1]), cells([1, 0]), Float64Array.of(0, 2));
    expect([losses.phaseErrorRmsDeg, losses.phaseLossDb]).toEqual([0, 0]);
  });
});

describe('phase errors', () => {
  it('are wrapped, achieved less needed', () => {
    const errors = phaseErrorsRad(Float64Array.of(radFromDeg(1), radFromDeg(359)), Float64Array.of(radFromDeg(359), radFromDeg(1)));
    expect(Array.from(errors)).toEqual([expect.closeTo(radFromDeg(2), 12), expect.closeTo(radFromDeg(-2), 12)]);
  });

  it('have a part that all cells share, over the wrap too; what is left of it is 0', () => {
    const [achieved, needed] = [Float64Array.of(3.1, 3.3), Float64Array.of(0, 2 * Math.PI)];
    expect(commonPhaseRad(achieved, needed)).toBeCloseTo(3.2 - 2 * Math.PI, 12);
    const errors = phaseErrorsRad(achieved, needed.map((rad) => rad + commonPhaseRad(achieved, needed)));
    expect(Array.from(errors)).toEqual([expect.closeTo(-0.1, 12), expect.closeTo(0.1, 12)]);
    expect(commonPhaseRad(errors, new Float64Array(2))).toBeCloseTo(0, 12);
  });
});

describe('the edge taper', () => {
  it('is the horn field at the edge over that at the strongest point: -11.1855 dB for q = 6.81058 at f/D = 0.8', () => {
    const design = {
      ...EXAMPLE_DESIGN,
      panel: { ...EXAMPLE_DESIGN.panel, outline: { kind: 'ellipse' as const, widthMm: 315, heightMm: 315 } },
      illumination: { kind: 'horn' as const, positionMm: [0, 0, 252] as [number, number, number], aimMm: [0, 0, 0] as [number, number, number], exponentE: 6.81058, exponentH: 6.81058, polarisation: 'x' as const },
    };
    const si = siDesign(design);
    expect(edgeTaperDb(si.illumination, si.panel, panelLattice(si.panel))).toBeCloseTo(-11.1855, 3);
  });

  it('is 0 for a plane wave', () => {
    const si = siDesign(planeWaveDesign());
    expect(edgeTaperDb(si.illumination, si.panel, panelLattice(si.panel))).toBe(0);
  });
});
