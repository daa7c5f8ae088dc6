import { predictDesign } from '../../../../shared/antenna/predict-design';
import { STARTING_DESIGN } from '../../../../shared/model/starting-design';
import type { DesignDocument } from '../../../../shared/model/design-document';
import { SAMPLE_HEAD } from '../sample-prediction';
import { sheetRig } from '../fields/sheet-rig';
import { ExposureSection } from './exposure-section';

const sending: DesignDocument = {
  ...STARTING_DESIGN,
  cells: { kind: 'ideal', levels: null },
  panel: { ...STARTING_DESIGN.panel, outline: { kind: 'rectangle', widthMm: 60, heightMm: 60 } },
  requirement: { ...STARTING_DESIGN.requirement, transmitter: { powerW: 1 } },
};

async function shown(design: DesignDocument) {
  const rig = await sheetRig(ExposureSection, design);
  const { figures, verdicts, warnings } = predictDesign(design, { include: {} });
  rig.workspace.prediction.set({ head: { ...SAMPLE_HEAD, figures, verdicts, warnings }, cells: {} as never, cuts: [], uv: null, of: design });
  await rig.fixture.whenStable();
  return rig;
}

describe('ExposureSection', () => {
  it('shows distances to published limits with the cautions beside them', async () => {
    const { element, text } = await shown(sending);
    const rows = [...element.querySelectorAll('[aria-label="Distances to published exposure limits"] tbody tr')];
    expect(rows).toHaveLength(6);
    expect(rows[0].textContent).toMatch(/FCC 47 CFR 1\.1310.*public.*10\.0\sW\/m².*30\smin/s);
    const caution = element.querySelector('.caution')?.textContent ?? '';
    for (const words of ['Not a substitute for measurement by a competent person', 'Observe the', 'Do not enter the beam', 'covers the main beam alone', 'Implant wearers']) expect(caution).toContain(words);
    expect(text()).not.toMatch(/\bsafe\b|compliant/i);
  });

  it('says why nothing is estimated, with the cautions all the same', async () => {
    const { element, text } = await shown({ ...sending, illumination: { kind: 'plane-wave', thetaDeg: 0, phiDeg: 0, polarisation: 'x' } });
    expect(text()).toContain('Not estimated: the panel is lit by a plane wave');
    expect(element.querySelector('.caution')).not.toBeNull();
  });

  it('is not there without a transmitter', async () => {
    const { element } = await shown({ ...sending, requirement: STARTING_DESIGN.requirement });
    expect(element.querySelector('section')).toBeNull();
  });
});
