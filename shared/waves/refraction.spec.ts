import { degFromRad, radFromDeg } from '../units/angles';
import { wavenumberRadPerM } from './conventions';
import { outgoingWave } from './refraction';

const wavenumber10 = wavenumberRadPerM(10e9);
const radPerM = (degPerMm: number): number => radFromDeg(degPerMm) * 1000;

describe('the generalised law of refraction', () => {
  it.each([
    [11, 46.6582],
    [13, 37.9799],
    [15, 32.231],
    [17, 28.0725],
  ])('bends 8 um light by a supercell of %d um to %d degrees', (supercellUm, expectedDeg) => {
    const wave = outgoingWave({
      incident: { u: 0, v: 0 },
      gradientXRadPerM: (-2 * Math.PI) / (supercellUm * 1e-6),
      gradientYRadPerM: 0,
      wavenumberRadPerM: (2 * Math.PI) / 8e-6,
      outgoingIndex: 1,
    });
    expect(wave.kind === 'propagating' && degFromRad(wave.thetaRad)).toBeCloseTo(expectedDeg, 3);
  });

  it('sends the beam where the phase falls: -90 degrees a half wave along x and y goes to (45, 45) degrees', () => {
    const gradient = radPerM(-6.004153713566738);
    const wave = outgoingWave({ incident: { u: 0, v: 0 }, gradientXRadPerM: gradient, gradientYRadPerM: gradient, wavenumberRadPerM: wavenumber10, outgoingIndex: 1 });
    expect(wave).toEqual({ kind: 'propagating', tangential: { u: expect.closeTo(0.5, 9), v: expect.closeTo(0.5, 9) }, thetaRad: expect.closeTo(Math.PI / 4, 9), phiRad: expect.closeTo(Math.PI / 4, 9) });
  });

  it('says evanescent, with its size, where no wave can leave', () => {
    const wave = outgoingWave({
      incident: { u: 0.5, v: 0 },
      gradientXRadPerM: radPerM(-8),
      gradientYRadPerM: radPerM(16 / 3),
      wavenumberRadPerM: wavenumber10,
      outgoingIndex: 1,
    });
    expect(wave).toEqual({ kind: 'evanescent', tangential: { u: expect.closeTo(1.16621, 5), v: expect.closeTo(-0.444137, 5) }, magnitude: expect.closeTo(1.24792, 5) });
  });

  it('refracts into a dielectric half space of permittivity 2.2', () => {
    const incident = Math.sin(radFromDeg(15)) * Math.SQRT1_2;
    const wave = outgoingWave({
      incident: { u: incident, v: incident },
      gradientXRadPerM: radPerM(-12.5),
      gradientYRadPerM: radPerM(5 / 3),
      wavenumberRadPerM: wavenumber10,
      outgoingIndex: Math.sqrt(2.2),
    });
    expect(wave.kind === 'propagating' && [degFromRad(wave.thetaRad), degFromRad(wave.phiRad)]).toEqual([expect.closeTo(55.6627, 3), expect.closeTo(2.06912, 3)]);
  });

  it('is the ordinary law without a gradient', () => {
    const wave = outgoingWave({ incident: { u: 0.3, v: -0.2 }, gradientXRadPerM: 0, gradientYRadPerM: 0, wavenumberRadPerM: 100, outgoingIndex: 1.5 });
    expect(wave.kind === 'propagating' && Math.sin(wave.thetaRad) * 1.5).toBeCloseTo(Math.hypot(0.3, 0.2), 12);
  });
});
