import { radFromDeg } from '../../units/angles';
import { designDocument, type DesignDocument } from '../../model/design-document';
import { STARTING_DESIGN } from '../../model/starting-design';
import { designFaults } from '../design-faults';
import { predictDesign } from '../predict-design';
import { bestFeedExponent, feedEfficiency, feedExponentOfEdgeTaper, subtendedHalfAngleRad } from './feed-efficiency';
import { sizedDesign, sizingAdvice } from './sized-design';

const wish = { gainDbi: 31, allowanceDb: 0, edgeTaperDb: -11, focalRatio: 0.8 };

/** Continuous ideal cells under the scalar model: what remains are illumination and projection. */
function ideal(change: Partial<DesignDocument['requirement']> = {}, panel: Partial<DesignDocument['panel']> = {}): DesignDocument {
  return {
    ...STARTING_DESIGN,
    cells: { kind: 'ideal', levels: null },
    requirement: { ...STARTING_DESIGN.requirement, ...change },
    panel: { ...STARTING_DESIGN.panel, ...panel },
  };
}

describe('feed of a flat panel', () => {
  it('is less efficient than that of a paraboloid at the same focal ratio, whose half angle is larger', () => {
    const [flat, dish] = (['flat', 'paraboloid'] as const).map((kind) => {
      const angle = subtendedHalfAngleRad(0.5, kind);
      return { angle, best: feedEfficiency(bestFeedExponent(angle, kind), angle, kind) };
    });
    expect([flat.angle, dish.angle]).toEqual([expect.closeTo(radFromDeg(45), 12), expect.closeTo(radFromDeg(53.1301), 6)]);
    // 0.753 against 0.820, computed independently.
    expect([flat.best, dish.best]).toEqual([expect.closeTo(0.753, 3), expect.closeTo(0.8196, 3)]);
  });

  it('has the exponent that its edge taper asks for', () => {
    const angle = subtendedHalfAngleRad(0.8, 'flat');
    const exponent = feedExponentOfEdgeTaper(-11, angle);
    expect(20 * (exponent + 1) * Math.log10(Math.cos(angle))).toBeCloseTo(-11, 12);
  });

  it('refuses an angle that no flat panel subtends', () => {
    expect(() => feedEfficiency(5, Math.PI / 2, 'flat')).toThrow('must lie between 0 and 90 degrees');
  });
});

describe('sizing advice', () => {
  it('is a design that holds together, whose prediction has the gain that was asked for', () => {
    for (const [requirement, panel] of [
      [{ beams: [{ thetaDeg: 25, phiDeg: 30 }] }, {}],
      [{ beams: [{ thetaDeg: 0, phiDeg: 0 }] }, { outline: { kind: 'ellipse', widthMm: 100, heightMm: 100 } }],
      [{ beams: [{ thetaDeg: 10, phiDeg: 0 }] }, { lattice: { kind: 'triangular', periodXMm: 5, rowSpacingMm: 4 } }],
    ] as [Partial<DesignDocument['requirement']>, Partial<DesignDocument['panel']>][]) {
      const design = ideal(requirement, panel);
      const sized = sizedDesign(design, sizingAdvice(design, wish));
      expect(designDocument.safeParse(sized).success).toBe(true);
      expect(designFaults(sized)).toEqual([]);
      const { figures } = predictDesign(sized, { include: {} });
      // Whole cells fill the outline in steps, so the area falls short of it by up to a row and a column.
      expect(Math.abs(Number(figures.gainAtBeamDbi) - wish.gainDbi)).toBeLessThan(0.45);
      expect(figures.gratingLobes).toEqual([]);
    }
  });

  it('stands the horn at the specular angle of the first beam, and a transmitting panel along its normal', () => {
    const beams = [{ thetaDeg: 20, phiDeg: 90 }];
    const reflecting = sizingAdvice(ideal({ beams }), wish);
    const [x, y, z] = reflecting.hornPositionM;
    expect(x).toBeCloseTo(0, 12);
    expect(Math.atan2(-y, z)).toBeCloseTo(radFromDeg(20), 9);
    const through = sizingAdvice(ideal({ beams }, { operation: 'transmit' }), wish);
    expect(through.hornPositionM).toEqual([0, 0, -through.focalDistanceM]);
  });

  it('keeps the period below a wavelength over one plus the sine of scan or incidence at the upper band edge', () => {
    const advice = sizingAdvice(ideal({ bandGHz: [27, 29], beams: [{ thetaDeg: 60, phiDeg: 0 }] }), wish);
    const wavelengthM = 299792458 / 29e9;
    const steepest = Math.max(advice.largestIncidenceRad, advice.steepestScanRad);
    expect(advice.periodM).toBeLessThanOrEqual(wavelengthM / (1 + Math.sin(steepest)));
    expect(advice.periodM).toBeGreaterThan(wavelengthM / (1 + Math.sin(steepest)) - 1.1e-5);
  });

  it('grows by 10 log of the area with the gain, and with what the cells are expected to cost', () => {
    const [small, large] = [wish, { ...wish, gainDbi: 33, allowanceDb: 1 }].map((each) => sizingAdvice(ideal(), each));
    expect(10 * Math.log10((large.widthM * large.heightM) / (small.widthM * small.heightM))).toBeCloseTo(3, 9);
  });
});
