import type { DesignDocument } from '../../model/design-document';
import { STARTING_DESIGN } from '../../model/starting-design';
import { predictDesign } from '../predict-design';

const design: DesignDocument = {
  ...STARTING_DESIGN,
  cells: { kind: 'ideal', levels: null },
  panel: { ...STARTING_DESIGN.panel, outline: { kind: 'rectangle', widthMm: 90, heightMm: 80 } },
  requirement: { ...STARTING_DESIGN.requirement, crossPolarMask: { kind: 'custom', points: [[0, 90], [180, 90]] } },
  prediction: { ...STARTING_DESIGN.prediction, model: 'vector' },
};

describe('a cross-polar mask in the vector model', () => {
  it('is held against the cross-polar gain', () => {
    const { figures, verdicts } = predictDesign(design, { include: {} });
    const margin = (figures.crossPolarMaskMargin as { marginDb: number }).marginDb;
    expect(verdicts.find(({ line }) => line === 'cross-polar-mask')).toMatchObject({ verdict: 'meets' });
    // The highest cross-polar gain lies below the co-polar peak.
    expect(90 - margin).toBeLessThan(Number(figures.gainDbi));
    expect(90 - margin).toBeGreaterThan(-100);
  });
});
