import { cutMarkers } from './cut-markers';
import { SAMPLE_PATTERN, sampleCut, ALONG } from './sample-pattern';

/** An evenly lit line: first sidelobe -13.2615 dB, first nulls where its argument is pi (closed form). */
function lineCut(lengthWavelengths: number, stepDeg: number): { label: string; angleDeg: Float64Array; levelDb: Float64Array } {
  const angleDeg = Float64Array.from({ length: Math.round(180 / stepDeg) + 1 }, (_, i) => -90 + i * stepDeg);
  const levelDb = angleDeg.map((angle) => {
    const x = Math.PI * lengthWavelengths * Math.sin((angle * Math.PI) / 180);
    return 20 * Math.log10(Math.max(1e-6, Math.abs(x) < 1e-9 ? 1 : Math.abs(Math.sin(x) / x)));
  });
  return { label: '', angleDeg, levelDb };
}

describe('markers of an evenly lit line', () => {
  const found = cutMarkers(lineCut(20, 0.1), 1);
  it('climb from a place beside the peak to the peak', () => {
    expect(found?.peak.angleDeg).toBeCloseTo(0, 6);
    expect(found?.peak.levelDb).toBeCloseTo(0, 6);
  });
  it('give both first sidelobes at -13.26 dB', () => {
    // The parabola through three samples a tenth of a degree apart is right to 0.01 dB.
    for (const side of found?.sidelobes ?? []) expect(side?.levelDb).toBeCloseTo(-13.2615, 2);
  });
  it('give the half-power width 0.8859 wavelengths over length', () => {
    const [low, high] = found?.halfPower ?? [];
    const width = (high?.angleDeg ?? 0) - (low?.angleDeg ?? 0);
    expect(width).toBeCloseTo((2 * Math.asin(0.44295 / 20) * 180) / Math.PI, 2);
  });
  it('put the first nulls a wavelength over the length away', () => {
    const null1 = (Math.asin(1 / 20) * 180) / Math.PI;
    expect(found?.firstNulls.map((place) => place?.angleDeg)).toEqual([expect.closeTo(-null1, 0), expect.closeTo(null1, 0)]);
  });
});

describe('markers agree with the figures of the engine', () => {
  const { figures } = SAMPLE_PATTERN.head;
  const cut = sampleCut();
  const found = cutMarkers({ label: '', angleDeg: cut.angleDeg, levelDb: cut.gainDbi }, cut.beamDeg);
  it('in gain and direction of the peak', () => {
    // Along lies the peak itself; samples are 0.1 degrees apart.
    expect(found?.peak.levelDb).toBeCloseTo(figures.gainDbi as number, 2);
    expect(found?.peak.angleDeg).toBeCloseTo(figures.peakThetaDeg as number, 2);
  });
  it('in half-power beamwidth', () => {
    const [low, high] = found?.halfPower ?? [];
    expect((high?.angleDeg ?? 0) - (low?.angleDeg ?? 0)).toBeCloseTo(figures.halfPowerBeamwidthDeg.along as number, 2);
  });
  it('in the highest sidelobe along the beam', () => {
    const highest = Math.max(...(found?.sidelobes ?? []).map((place) => place?.levelDb ?? -Infinity));
    expect(highest - (found?.peak.levelDb ?? 0)).toBeCloseTo(figures.sidelobeDb.along as number, 2);
  });
  it('across the beam too', () => {
    const across = sampleCut({ ...ALONG, choice: 'across' });
    const own = cutMarkers({ label: '', angleDeg: across.angleDeg, levelDb: across.gainDbi }, 0);
    const [low, high] = own?.halfPower ?? [];
    expect((high?.angleDeg ?? 0) - (low?.angleDeg ?? 0)).toBeCloseTo(figures.halfPowerBeamwidthDeg.across as number, 2);
  });
});

describe('what does not exist', () => {
  it('has no place: a cut that never falls to half power', () => {
    const flat = { label: '', angleDeg: [-2, -1, 0, 1, 2], levelDb: [-1, -0.5, 0, -0.5, -1] };
    expect(cutMarkers(flat, 0)).toMatchObject({ halfPower: [null, null], firstNulls: [null, null], sidelobes: [null, null] });
  });
  it('is nothing of a cut with fewer than three samples', () => {
    expect(cutMarkers({ label: '', angleDeg: [0, 1], levelDb: [0, -1] }, 0)).toBeNull();
  });
  it('calls a rise at the very end of a cut no sidelobe', () => {
    const ending = { label: '', angleDeg: [0, 1, 2, 3, 4], levelDb: [0, -2, -9, -30, -20] };
    expect(cutMarkers(ending, 0)?.sidelobes[1]).toBeNull();
  });
});
