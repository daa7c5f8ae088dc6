import { exampleDesign } from '../../../../shared/antenna/example-design';
import { lobeRows, markedDirections, specularDirection } from './lobe-rows';
import { MASKED_DESIGN, SAMPLE_PATTERN } from './sample-pattern';

const { figures } = SAMPLE_PATTERN.head;

describe('highest lobes', () => {
  const rows = lobeRows(figures, MASKED_DESIGN, figures.gainDbi as number);
  it('are lettered in the order of their strength', () => {
    expect(rows.map(({ letter }) => letter).join('')).toBe('abcdef'.slice(0, rows.length));
    expect(rows[0].relative).toBe((figures.highestLobes[0].levelDb).toFixed(2).replace('-', '\u2212'));
  });
  it('give gain and margin to the mask', () => {
    const gain = (figures.gainDbi as number) + figures.highestLobes[0].levelDb;
    expect(rows[0].gain).toBe(gain.toFixed(2).replace('-', '\u2212'));
    expect(rows.some(({ margin }) => /^[+\u2212]\d/.test(margin))).toBe(true);
  });
  it('write an azimuth of half a turn in one way, from whichever side it was found', () => {
    const opposite = [180, -180, -179.96, -179.9].map((phiDeg) => ({ levelDb: -20, thetaDeg: 30, phiDeg }));
    expect(lobeRows({ ...figures, highestLobes: opposite }, MASKED_DESIGN, 30).map(({ phi }) => phi)).toEqual(['180.0', '180.0', '180.0', '\u2212179.9']);
  });
});

describe('marked directions', () => {
  it('hold grating lobes and the found peak, and the specular direction on demand', () => {
    const grating = { ...figures, gratingLobes: [{ thetaDeg: 70, phiDeg: 180, orderX: -1, orderY: 0 }] };
    const kinds = (specular: boolean) => markedDirections(grating, MASKED_DESIGN, { specular, beam: 0 }).map(({ kind }) => kind);
    expect(kinds(false)).toEqual(['grating-lobe', 'found-peak']);
    expect(kinds(true)).toEqual(['grating-lobe', 'specular', 'found-peak']);
  });
  it('ring the beams that have no handle', () => {
    const two = exampleDesign({ requirement: { ...exampleDesign().requirement, beams: [{ thetaDeg: 20, phiDeg: 0 }, { thetaDeg: 20, phiDeg: 180 }] } });
    expect(markedDirections(figures, two, { specular: false, beam: 1 })[0]).toMatchObject({ kind: 'other-beam', phiDeg: 0, label: 'beam 1: θ 20.0°, φ 0.0°' });
  });
  it('send the light of an offset horn to the other side, by the law of reflection', () => {
    const specular = specularDirection(MASKED_DESIGN);
    expect(specular).toEqual({ thetaDeg: expect.closeTo((Math.atan2(82.084, 225.526) * 180) / Math.PI, 9) as number, phiDeg: 0 });
    const wave = exampleDesign({ illumination: { kind: 'plane-wave', thetaDeg: 30, phiDeg: 10, polarisation: 'x' } });
    expect(specularDirection(wave)).toEqual({ thetaDeg: 30, phiDeg: -170 });
    const guided = exampleDesign({ illumination: { kind: 'guided-wave', launch: { kind: 'plane', directionDeg: 0 }, effectiveIndex: 1.6, leakageNpPerM: 4, polarisation: 'x' } });
    expect(specularDirection(guided)).toBeNull();
  });
});
