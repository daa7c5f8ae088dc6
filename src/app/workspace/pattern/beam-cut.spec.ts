import { cutRequests, shownCut } from './beam-cut';
import { ALONG, SAMPLE_PATTERN, sampleCut } from './sample-pattern';

describe('cuts on show', () => {
  it('asks for the plane of the beam from horizon to horizon, and for nothing more across it', () => {
    expect(cutRequests(ALONG)).toEqual([{ phiDeg: 0, thetaDeg: [-90, 90, 0.1] }]);
    expect(cutRequests({ ...ALONG, choice: 'plane' })).toEqual([{ phiDeg: 45, thetaDeg: [-90, 90, 0.1] }]);
    expect(cutRequests({ ...ALONG, choice: 'across' })).toEqual([]);
  });
  it('runs along over signed theta with the beam in its place', () => {
    const cut = sampleCut();
    expect([cut.angleDeg[0], cut.angleDeg[cut.angleDeg.length - 1], cut.beamDeg, cut.angleTitle]).toEqual([-90, 90, 20, 'θ in the plane φ = 0°, °'].map((value) => (typeof value === 'number' ? expect.closeTo(value, 9) : value)));
  });
  it('runs across over the angle from the beam', () => {
    expect(sampleCut({ ...ALONG, choice: 'across' })).toMatchObject({ beamDeg: 0, angleTitle: 'angle across the beam, °' });
  });
  it('takes the projection of the beam into another plane as the place to look for a lobe', () => {
    const { beamDeg } = sampleCut({ ...ALONG, choice: 'plane' });
    expect(beamDeg).toBeCloseTo((Math.atan(Math.tan((20 * Math.PI) / 180) * Math.SQRT1_2) * 180) / Math.PI, 9);
  });
  it('is not there before it was predicted', () => {
    expect(shownCut(SAMPLE_PATTERN, { ...ALONG, choice: 'plane', planePhiDeg: 33 })).toBeNull();
  });
  it('lags in azimuth for a moment under its own name', () => {
    const cut = shownCut(SAMPLE_PATTERN, { ...ALONG, beam: { thetaDeg: 20, phiDeg: 3 } });
    expect(cut?.angleTitle).toBe('θ in the plane φ = 0°, °');
    expect(cut?.beamDeg).toBeCloseTo(20, 1);
  });
});
