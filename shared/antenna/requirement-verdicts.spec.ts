import type { Figures } from '../model/figures';
import { EXAMPLE_DESIGN, exampleDesign } from './example-design';
import { predictDesign } from './predict-design';
import { requirementVerdicts } from './requirement-verdicts';

const { figures } = predictDesign(EXAMPLE_DESIGN, { include: {} });
const requirement = EXAMPLE_DESIGN.requirement;

describe('verdicts', () => {
  it('judge only the lines that the requirement has', () => {
    expect(requirementVerdicts(requirement, figures)).toEqual([]);
  });

  it('say by how much each line is met or missed', () => {
    const [gain, sidelobe, pointing] = requirementVerdicts({ ...requirement, minGainDbi: 29, maxSidelobeDb: -25, pointingToleranceDeg: 0.3 }, figures);
    expect(gain).toEqual({ line: 'gain', sense: 'at-least', limit: 29, unit: 'dBi', value: figures.gainAtBeamDbi, margin: expect.closeTo(0.4216, 3), verdict: 'meets' });
    expect(sidelobe).toMatchObject({ line: 'sidelobe', sense: 'at-most', margin: expect.closeTo(-2.923, 2), verdict: 'falls-short' });
    expect(pointing).toMatchObject({ line: 'pointing', value: expect.closeTo(0.04976, 4), verdict: 'meets' });
  });

  it('take the worst of several beams', () => {
    const [first] = figures.beams;
    const beams = [first, { ...first, gainDbi: 21, pointingErrorDeg: 2 }];
    const [gain, pointing] = requirementVerdicts({ ...requirement, minGainDbi: 25, pointingToleranceDeg: 1 }, { ...figures, beams });
    expect([gain.value, gain.verdict, pointing.value, pointing.verdict]).toEqual([21, 'falls-short', 2, 'falls-short']);
  });

  it('hold a mask by its least margin', () => {
    const maskMargin: Figures['maskMargin'] = { marginDb: -1.5, thetaDeg: 3, phiDeg: 0 };
    const [mask] = requirementVerdicts({ ...requirement, mask: { kind: 'published', id: 'x' } }, { ...figures, maskMargin });
    expect(mask).toEqual({ line: 'mask', sense: 'at-least', limit: 0, unit: 'dB', value: -1.5, margin: -1.5, verdict: 'falls-short' });
  });

  it.each(['reflect', 'transmit'] as const)('judge nothing of a panel to %s whose horn stands on the wrong side', (operation) => {
    const { illumination, panel } = EXAMPLE_DESIGN;
    if (illumination.kind !== 'horn') throw new Error('the example has a horn');
    const [x, y, z] = illumination.positionMm;
    const design = exampleDesign({
      requirement: { ...requirement, minGainDbi: 0, maxSidelobeDb: 0, pointingToleranceDeg: 90 },
      panel: { ...panel, operation },
      illumination: { ...illumination, positionMm: [x, y, operation === 'reflect' ? -z : z] },
    });
    const { verdicts } = predictDesign(design, { include: {} });
    const reason = operation === 'reflect' ? 'the horn stands behind a reflecting panel' : 'the horn stands in front of a transmitting panel';
    expect(verdicts.map(({ verdict }) => verdict)).toEqual(['not-evaluated', 'not-evaluated', 'not-evaluated']);
    expect(verdicts[0]).toMatchObject({ value: { kind: 'behind-panel' }, margin: { kind: 'behind-panel' }, reason });
  });

  it('never call "meets" what was not evaluated, and say why', () => {
    const dark: Figures = { ...figures, beams: [{ ...figures.beams[0], gainDbi: { kind: 'nothing-lit', reason: 'no cell is lit' } }] };
    const verdicts = requirementVerdicts({ ...requirement, minGainDbi: 0, minCrossPolarDiscriminationDb: 20, mask: { kind: 'published', id: 'S.465' } }, dark);
    expect(verdicts.map(({ line, verdict, reason }) => [line, verdict, reason])).toEqual([
      ['gain', 'not-evaluated', 'no cell is lit'],
      ['mask', 'not-evaluated', expect.stringContaining('no mask')],
      ['cross-polar', 'not-evaluated', 'the scalar prediction has no cross-polar field'],
    ]);
  });
});
