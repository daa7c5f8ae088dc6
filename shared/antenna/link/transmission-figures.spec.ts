import type { DesignDocument } from '../../model/design-document';
import { STARTING_DESIGN } from '../../model/starting-design';
import { predictDesign } from '../predict-design';

type Requirement = Partial<DesignDocument['requirement']>;

const base: DesignDocument = {
  ...STARTING_DESIGN,
  cells: { kind: 'ideal', levels: null },
  panel: { ...STARTING_DESIGN.panel, outline: { kind: 'rectangle', widthMm: 90, heightMm: 80 } },
};

function predicted(requirement: Requirement, change: Partial<DesignDocument> = {}) {
  return predictDesign({ ...base, ...change, requirement: { ...base.requirement, ...requirement } }, { include: {} });
}

const planeWave: DesignDocument['illumination'] = { kind: 'plane-wave', thetaDeg: 0, phiDeg: 0, polarisation: 'x' };

describe('what follows from a transmitter', () => {
  const transmitter = { powerW: 2, lossDb: 1.5, occupiedBandwidthGHz: 0.036, referenceBandwidthGHz: 4e-6 };

  it('is absent without one', () => {
    const { figures } = predicted({});
    for (const name of ['eirpDbw', 'eirpDensityDbw', 'exposure', 'link', 'gainOverTemperatureDbPerK', 'crossPolarMaskMargin']) expect(figures).not.toHaveProperty(name);
  });

  it('is an EIRP of power less loss plus gain in the beam, and its density at the peak', () => {
    const { figures } = predicted({ transmitter });
    expect(figures.eirpDbw).toBeCloseTo(10 * Math.log10(2) - 1.5 + Number(figures.gainAtBeamDbi), 9);
    expect(figures.eirpDensityDbw).toBeCloseTo(10 * Math.log10(2) - 1.5 + Number(figures.gainDbi) - 10 * Math.log10(9000), 9);
  });

  it('is held against a density mask as gain is against a mask of levels shifted by the same', () => {
    const points: [number, number][] = [[5, 0], [180, -10]];
    const shiftDb = 10 * Math.log10(2) - 1.5 - 10 * Math.log10(9000);
    const density = predicted({ transmitter: { ...transmitter, densityMask: { kind: 'custom', points: points.map(([angle, level]) => [angle, level + shiftDb]) } } });
    const gain = predicted({ mask: { kind: 'custom', points } });
    const margin = (gain.figures.maskMargin as { marginDb: number }).marginDb;
    expect((density.figures.eirpDensityMargin as { marginDb: number }).marginDb).toBeCloseTo(margin, 9);
    expect(density.verdicts.find(({ line }) => line === 'eirp-density')).toMatchObject({ limit: 0, unit: 'dB', verdict: margin >= 0 ? 'meets' : 'falls-short' });
  });

  it('is not evaluated against a density mask without a bandwidth, and never as met', () => {
    const { verdicts } = predicted({ transmitter: { powerW: 2, densityMask: { kind: 'custom', points: [[5, 90], [180, 90]] } } });
    expect(verdicts.find(({ line }) => line === 'eirp-density')).toMatchObject({ verdict: 'not-evaluated', reason: 'an EIRP density needs the occupied bandwidth' });
  });

  it('is nothing for a panel lit by a plane wave, and says so', () => {
    const { figures } = predicted({ transmitter }, { illumination: planeWave });
    expect(figures.eirpDbw).toMatchObject({ kind: 'plane-wave' });
    expect(figures.exposure).toMatchObject({ kind: 'plane-wave' });
  });
});

describe('exposure in front of a panel', () => {
  it('uses the time average after the line, the area of the cells and the predicted gain', () => {
    const { figures } = predicted({ transmitter: { powerW: 20, lossDb: 3, dutyPercent: 50 } });
    const { exposure } = figures;
    if (exposure === undefined || !('surfaceWPerM2' in exposure)) throw new Error('no exposure');
    expect(exposure.averagePowerW).toBeCloseTo(10 / 10 ** 0.3, 9);
    // eta = surface over near field; it is the aperture efficiency at the peak.
    expect(Number(exposure.nearFieldWPerM2) / Number(exposure.surfaceWPerM2)).toBeCloseTo(Number(figures.apertureEfficiency), 9);
    expect(Number(exposure.farFieldFromM) / Number(exposure.nearFieldEndM)).toBeCloseTo(2.4, 9);
    expect(exposure.feedSpaceWPerM2).toBeGreaterThan(0);
  });

  it('is told at the focus of a panel that focuses, where no distance is given', () => {
    const pointMm: [number, number, number] = [0, 0, 200];
    const { figures } = predicted({ transmitter: { powerW: 1 }, beams: [{ thetaDeg: 0, phiDeg: 0 }] }, { synthesis: { kind: 'focus', pointMm } });
    const { exposure } = figures;
    if (exposure === undefined || !('surfaceWPerM2' in exposure)) throw new Error('no exposure');
    expect(exposure.fccPublic).toMatchObject({ limitWPerM2: 10, distanceM: { kind: 'focused' } });
    // Far out the same sum gives P G / 4 pi R^2; at 200 mm the focus gathers more than the surface of a plain aperture has.
    expect(Number(exposure.focusWPerM2)).toBeGreaterThan(0.5 * Number(exposure.surfaceWPerM2));
    expect(Number(exposure.focusWPerM2)).toBeLessThan(20 * Number(exposure.surfaceWPerM2));
  });
});

describe('a link', () => {
  const transmitter = { powerW: 0.1 };

  it('from the panel is Friis with the gain in the beam', () => {
    const { figures, verdicts } = predicted({ transmitter, link: { kind: 'hop', distanceM: 2000, farGainDbi: 20, excessLossDb: 3, minReceivedDbm: -60 } });
    const loss = 20 * Math.log10((4 * Math.PI * 2000 * 28e9) / 299792458);
    const received = 20 + Number(figures.gainAtBeamDbi) + 20 - loss - 3;
    expect((figures.link as { receivedDbm: number }).receivedDbm).toBeCloseTo(received, 9);
    expect(verdicts.find(({ line }) => line === 'received-power')).toMatchObject({ limit: -60, unit: 'dBm', sense: 'at-least', margin: expect.closeTo(received + 60, 6) });
  });

  it('from the panel has no value within the far-field distance, nor without a transmitter', () => {
    const near = predicted({ transmitter, link: { kind: 'hop', distanceM: 1, farGainDbi: 20, minReceivedDbm: -60 } });
    expect(near.figures.link).toMatchObject({ receivedDbm: { kind: 'near-field' } });
    expect(near.verdicts.find(({ line }) => line === 'received-power')).toMatchObject({ verdict: 'not-evaluated', reason: expect.stringContaining('far-field distance') });
    expect(predicted({ link: { kind: 'hop', distanceM: 100, farGainDbi: 20 } }).figures.link).toMatchObject({ receivedDbm: { kind: 'no-transmitter' } });
  });

  it('over a panel needs a plane wave, and from a panel a feed', () => {
    const relay = { kind: 'relay', incomingDistanceM: 100, outgoingDistanceM: 50, sourceGainDbi: 20, farGainDbi: 20 } as const;
    expect(predicted({ transmitter, link: relay }).figures.link).toMatchObject({ kind: 'own-feed' });
    expect(predicted({ transmitter, link: { kind: 'hop', distanceM: 100, farGainDbi: 0 } }, { illumination: planeWave }).figures.link).toMatchObject({ kind: 'plane-wave' });
    const { link } = predicted({ transmitter, link: relay }, { illumination: planeWave }).figures;
    expect(link).toMatchObject({ receivedDbm: expect.any(Number), crossSectionDbsm: expect.any(Number), freeSpaceLossDb: [expect.any(Number), expect.any(Number)] });
  });

  it('over a panel is the same both ways', () => {
    const there = predicted({ transmitter, beams: [{ thetaDeg: 40, phiDeg: 10 }], link: { kind: 'relay', incomingDistanceM: 60, outgoingDistanceM: 25, sourceGainDbi: 20, farGainDbi: 5 } }, { illumination: { ...planeWave, thetaDeg: 15, phiDeg: 200 } });
    const back = predicted({ transmitter, beams: [{ thetaDeg: 15, phiDeg: 200 }], link: { kind: 'relay', incomingDistanceM: 25, outgoingDistanceM: 60, sourceGainDbi: 5, farGainDbi: 20 } }, { illumination: { ...planeWave, thetaDeg: 40, phiDeg: 10 } });
    expect((there.figures.link as { receivedDbm: number }).receivedDbm).toBeCloseTo((back.figures.link as { receivedDbm: number }).receivedDbm, 9);
  });
});

describe('a receiver', () => {
  it('has a G/T from the gain in the beam less the line, over the temperature of the chain', () => {
    const receiver = { antennaTemperatureK: 40, lineLossDb: 0.5, noiseFigureDb: 0.8, minGainOverTemperatureDbPerK: 10 };
    const { figures, verdicts } = predicted({ receiver });
    expect(figures.systemTemperatureK).toBeCloseTo(125.844, 3);
    expect(figures.gainOverTemperatureDbPerK).toBeCloseTo(Number(figures.gainAtBeamDbi) - 0.5 - 10 * Math.log10(125.844), 3);
    expect(verdicts.find(({ line }) => line === 'gain-over-temperature')).toMatchObject({ limit: 10, unit: 'dB/K' });
  });
});

describe('a cross-polar mask', () => {
  it('is not evaluated by the scalar model, however high it lies', () => {
    const { verdicts } = predicted({ crossPolarMask: { kind: 'custom', points: [[0, 90], [180, 90]] } });
    expect(verdicts.find(({ line }) => line === 'cross-polar-mask')).toMatchObject({ verdict: 'not-evaluated', reason: 'the scalar prediction has no cross-polar field' });
  });
});
