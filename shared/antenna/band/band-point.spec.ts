import type { BandParameters, BandPoint } from '../../model/band-run';
import type { DesignDocument } from '../../model/design-document';
import { degFromRad, radFromDeg } from '../../units/angles';
import { exampleDesign, planeWaveDesign } from '../example-design';
import { isNumber } from '../no-figure';
import { placeCells } from '../place-cells';
import { bandFrequenciesGHz } from './band-frequencies';
import { bandPoint } from './band-point';
import { mergeBand } from './merge-band';
import { frozenPhaseLossDb } from './spatial-delay';
import { squintedCosine } from './squint';

const requirement = { designFrequencyGHz: 10, bandGHz: [9.5, 10.5] as [number, number], beams: [{ thetaDeg: 30, phiDeg: 0 }], polarisation: 'x' as const };
/** No element factor, which would pull the peak towards broadside. */
const isotropic = { receiveExponent: 0, radiateExponent: 0 };

function pointsOf(design: DesignDocument, parameters: BandParameters): BandPoint[] {
  const placed = placeCells(design);
  return bandFrequenciesGHz({ design, parameters }).map((frequencyGHz) => bandPoint(placed, parameters, frequencyGHz));
}

const numberOf = (figure: BandPoint['gainDbi']): number => {
  if (!isNumber(figure)) throw new Error(figure.reason);
  return figure;
};

describe('bandPoint', () => {
  it('squints by the law of a gradient that does not change: 31.757 degrees at 0.95 f0, 28.437 at 1.05 f0', () => {
    const design = planeWaveDesign({ requirement, prediction: isotropic });
    const points = pointsOf(design, { frequencyCount: 3 });
    const expected = [0.95, 1, 1.05].map((ratio) => degFromRad(Math.asin(squintedCosine(0, Math.sin(radFromDeg(30)), ratio))));
    expect(expected[0]).toBeCloseTo(31.7569, 4);
    expect(expected[2]).toBeCloseTo(28.4369, 4);
    points.forEach((point, i) => {
      expect(30 + numberOf(point.squintAlongDeg)).toBeCloseTo(expected[i], 3);
      expect(numberOf(point.squintAcrossDeg)).toBeCloseTo(0, 6);
      expect(numberOf(point.pointingErrorDeg)).toBeCloseTo(Math.abs(expected[i] - 30), 3);
    });
  });

  it('does not squint at the specular angle', () => {
    const illumination = { kind: 'plane-wave', thetaDeg: 30, phiDeg: 180, polarisation: 'x' } as const;
    const [low] = pointsOf(planeWaveDesign({ requirement, prediction: isotropic, illumination }), { frequencyCount: 3 });
    expect(numberOf(low.squintAlongDeg)).toBeCloseTo(0, 5);
  });

  it('gives the spatial part the loss of the differential spatial phase delay of a uniform centre-fed disc', () => {
    const aperture = { diameterM: 0.6, focalLengthM: 0.42 };
    const design = exampleDesign({
      requirement: { ...requirement, beams: [{ thetaDeg: 0, phiDeg: 0 }] },
      panel: { operation: 'reflect', outline: { kind: 'ellipse', widthMm: 600, heightMm: 600 }, lattice: { kind: 'rectangular', periodXMm: 15, periodYMm: 15 }, keepOuts: [] },
      illumination: { kind: 'horn', positionMm: [0, 0, 420], aimMm: [0, 0, 0], exponentE: 0, exponentH: 0, polarisation: 'x' },
      prediction: isotropic,
    });
    const placed = placeCells(design);
    const uniform = { ...placed, light: { ...placed.light, amplitude: placed.light.amplitude.map(() => 1) } };
    const gainAt = (frequencyGHz: number): number => numberOf(bandPoint(uniform, { spatialPart: true }, frequencyGHz).spatial?.gainAtBeamDbi ?? { kind: 'none', reason: 'no spatial part' });
    // The aperture grows electrically as f^2 while phases spoil it; both ends of the band share the loss.
    const loss = gainAt(10.5) - gainAt(10) - 20 * Math.log10(1.05);
    expect(loss).toBeCloseTo(frozenPhaseLossDb(aperture, 0.5e9), 1);
  });

  it('loses nothing to the paths at the design frequency, and the ideal cells lose nothing else away from it', () => {
    const [low, centre] = pointsOf(exampleDesign({ requirement }), { frequencyCount: 3, spatialPart: true });
    expect(centre.spatial?.gainAtBeamDbi).toBe(centre.gainAtBeamDbi);
    expect(low.spatial?.gainAtBeamDbi).toBe(low.gainAtBeamDbi);
  });

  it('follows a phase centre that moves: a metre-scale offset defocuses, one of zero changes no bit', () => {
    const design = exampleDesign({ requirement });
    const [still] = pointsOf(design, { frequencyCount: 3, phaseCentre: [[9, 0], [11, 0]] });
    expect(still).toEqual(pointsOf(design, { frequencyCount: 3 })[0]);
    const [moved] = pointsOf(design, { frequencyCount: 3, phaseCentre: [[9, 30], [11, -30]] });
    expect(numberOf(moved.gainAtBeamDbi)).not.toBeCloseTo(numberOf(still.gainAtBeamDbi), 2);
  });
});

describe('mergeBand', () => {
  const design = exampleDesign({ requirement: { ...requirement, beams: [{ thetaDeg: 20, phiDeg: 0 }], minGainDbi: 20, pointingToleranceDeg: 0.2, minCrossPolarDiscriminationDb: 25 } });
  const parameters = { frequencyCount: 4 };
  const points = pointsOf(design, parameters);

  it('adds the design frequency to an even grid that misses it', () => {
    expect(points.map(({ frequencyGHz }) => frequencyGHz)).toEqual([9.5, 9.833333333, 10, 10.166666667, 10.5]);
  });

  it('gives the same bits whatever the order of the points', () => {
    const forth = mergeBand({ design, parameters }, points);
    expect(JSON.stringify(mergeBand({ design, parameters }, [...points].reverse()))).toBe(JSON.stringify(forth));
  });

  it('names the worst frequency of each line, and never calls met what was not evaluated', () => {
    const { lines, extremes } = mergeBand({ design, parameters }, points);
    const lowest = [...points].sort((a, b) => numberOf(a.gainAtBeamDbi) - numberOf(b.gainAtBeamDbi))[0];
    expect(lines.map(({ line }) => line)).toEqual(['gain', 'pointing', 'cross-polar']);
    expect(lines[0]).toMatchObject({ value: lowest.gainAtBeamDbi, frequencyGHz: lowest.frequencyGHz, verdict: 'meets' });
    expect(lines[2].verdict).toBe('not-evaluated');
    expect(extremes.lowestGainAtBeamDbi).toEqual({ value: lowest.gainAtBeamDbi, frequencyGHz: lowest.frequencyGHz });
  });
});
