import type { DesignDocument } from '../model/design-document';
import type { Warning } from '../model/figures';
import { EXAMPLE_DESIGN, exampleDesign, planeWaveDesign } from './example-design';
import { predictDesign } from './predict-design';

const { requirement, panel } = EXAMPLE_DESIGN;
const horn = EXAMPLE_DESIGN.illumination.kind === 'horn' ? EXAMPLE_DESIGN.illumination : undefined;

function warnings(design: DesignDocument, frequencyGHz?: number): Warning[] {
  return predictDesign(design, { frequencyGHz, include: {} }).warnings;
}
const find = (list: Warning[], code: Warning['code']): Warning | undefined => list.find((warning) => warning.code === code);
const withHorn = (changes: Partial<NonNullable<typeof horn>>): DesignDocument => {
  if (!horn) throw new Error('the example has a horn');
  return exampleDesign({ illumination: { ...horn, ...changes } });
};

describe('warnings', () => {
  it('tell of the grating lobe, with the lattice and its limit λ / (1 + sin θ)', () => {
    const design = planeWaveDesign({ panel: { ...panel, lattice: { kind: 'rectangular', periodXMm: 25, periodYMm: 15 } } });
    const warning = find(warnings(design), 'grating-lobe');
    expect(warning).toMatchObject({ pointer: '#/panel/lattice', severity: 'warn', numbers: { count: 1, spacingMm: expect.closeTo(25, 6), limitMm: expect.closeTo(29.9792458 / (1 + Math.sin(Math.PI / 9)), 6) } });
    expect(warning?.message).toContain('25.000 mm');
    expect(warning?.message).toContain('a beam at θ 20.0° has no grating lobe only below λ / (1 + sin θ) = 22.339 mm');
    expect(find(warnings(planeWaveDesign()), 'grating-lobe')).toBeUndefined();
  });

  it('tell when the cell itself has a second order at the steepest incidence', () => {
    const steep = planeWaveDesign({ illumination: { kind: 'plane-wave', thetaDeg: 89, phiDeg: 0, polarisation: 'x' } });
    expect(find(warnings(steep), 'cell-period')).toMatchObject({ numbers: { spacingMm: expect.closeTo(15, 6), limitMm: expect.closeTo(14.9907, 3), maxIncidenceDeg: expect.closeTo(89, 6) } });
    expect(find(warnings(EXAMPLE_DESIGN), 'cell-period')).toBeUndefined();
  });

  it('tell when a lower frequency leaves no travelling beam', () => {
    const steep = planeWaveDesign({ requirement: { ...requirement, beams: [{ thetaDeg: 75, phiDeg: 0 }] } });
    expect(find(warnings(steep), 'evanescent-beam')).toBeUndefined();
    expect(find(warnings(steep, 9.5), 'evanescent-beam')).toMatchObject({ severity: 'serious', numbers: { count: 400, cellCount: 400 } });
  });

  it('tell of an image lobe as strong as the beam: one bit, 40 degrees, a plane wave from straight above', () => {
    const design = planeWaveDesign({
      requirement: { ...requirement, beams: [{ thetaDeg: 40, phiDeg: 0 }] },
      cells: { kind: 'ideal', levels: 2 },
      panel: { ...panel, outline: { kind: 'rectangle', widthMm: 240, heightMm: 150 } },
    });
    const warning = find(warnings(design), 'image-lobe');
    expect(warning?.severity).toBe('serious');
    expect(warning?.numbers['levelDb']).toBeCloseTo(0, 6);
    expect(warning?.message).toContain('is as strong as the wanted beam');
  });

  it('tell by how much another lobe is stronger than the beam', () => {
    // 0.8 wavelengths at 48.59 degrees: the grating lobe stands at 30 degrees, where the element gives more.
    const design = planeWaveDesign({
      requirement: { ...requirement, beams: [{ thetaDeg: 48.59, phiDeg: 0 }] },
      panel: { ...panel, lattice: { kind: 'rectangular', periodXMm: 23.983, periodYMm: 15 } },
    });
    const warning = find(warnings(design), 'image-lobe');
    expect(warning?.numbers).toMatchObject({ levelDb: expect.closeTo(1.1644, 1), thetaDeg: expect.closeTo(30, 0) });
    expect(warning?.message).toMatch(/is 1\.\d\d dB stronger than the wanted beam/);
  });

  it('say nothing of image lobes where the panel is focused in its near field', () => {
    const focused = planeWaveDesign({ synthesis: { kind: 'focus', pointMm: [0, 0, 200] } });
    expect(warnings(focused).map(({ code }) => code)).not.toContain('image-lobe');
  });

  it('tell of a horn on the wrong side, either way', () => {
    expect(find(warnings(withHorn({ positionMm: [0, 0, -200] })), 'behind-panel')?.message).toContain('reflecting panel is lit from in front');
    const transmitting = exampleDesign({ panel: { ...panel, operation: 'transmit' } });
    expect(find(warnings(transmitting), 'behind-panel')?.message).toContain('transmitting panel is lit from behind');
    expect(find(warnings(EXAMPLE_DESIGN), 'behind-panel')).toBeUndefined();
  });

  it('tell of a horn whose axis misses, and of one that looks away', () => {
    const beside = find(warnings(withHorn({ aimMm: [400, 0, 0] })), 'illumination-misses');
    expect(beside).toMatchObject({ severity: 'warn', numbers: { xMm: expect.closeTo(400, 6), yMm: 0, litCells: 400 } });
    const away = warnings(withHorn({ positionMm: [0, 0, 200], aimMm: [0, 0, 400] }));
    expect(find(away, 'illumination-misses')).toMatchObject({ severity: 'serious', numbers: { litCells: 0 } });
    expect(away[0].severity).toBe('serious');
  });

  it('tell that a what-if table is no measurement', () => {
    const design = exampleDesign({ cells: { kind: 'inline', cells: [{ phaseDeg: 0, magnitude: 1 }, { phaseDeg: 180, magnitude: 1 }] } });
    expect(find(warnings(design), 'provenance')).toMatchObject({ severity: 'note', numbers: { cells: 2 } });
  });

  it('are none for the example', () => {
    expect(warnings(EXAMPLE_DESIGN)).toEqual([]);
  });
});
