import * as fc from 'fast-check';
import { countParameters, designDifferences, differingParts } from './design-diff';
import { designDocument } from './design-document';
import type { DesignDocument } from './design-document';
import { fieldLabel } from './design-labels';
import { replacedAt, valueAt } from './design-pointer';
import { STARTING_DESIGN } from './starting-design';

const withRequirement = (change: Partial<DesignDocument['requirement']>): DesignDocument => ({
  ...STARTING_DESIGN,
  requirement: { ...STARTING_DESIGN.requirement, ...change },
});

describe('the starting design', () => {
  it('is a valid design document', () => {
    expect(designDocument.parse(STARTING_DESIGN)).toEqual(STARTING_DESIGN);
  });
});

describe('designDifferences', () => {
  it('finds nothing between equal designs', () => {
    expect(designDifferences(STARTING_DESIGN, structuredClone(STARTING_DESIGN))).toEqual([]);
  });

  it('names a steered beam with its unit', () => {
    const steered = withRequirement({ beams: [{ thetaDeg: 25.5, phiDeg: 0 }] });
    expect(designDifferences(STARTING_DESIGN, steered)).toEqual([
      { pointer: '/requirement/beams/0/thetaDeg', label: 'Beam 1 θ', unit: '°', before: 20, after: 25.5 },
    ]);
  });

  it('writes null where a limit is not set', () => {
    expect(designDifferences(STARTING_DESIGN, withRequirement({ minCrossPolarDiscriminationDb: 25 }))).toEqual([
      {
        pointer: '/requirement/minCrossPolarDiscriminationDb',
        label: 'Least cross-polar discrimination',
        unit: 'dB',
        before: null,
        after: 25,
      },
    ]);
  });

  it('keeps a list whose length changed in one part', () => {
    const two = withRequirement({
      beams: [
        { thetaDeg: 20, phiDeg: 0 },
        { thetaDeg: 30, phiDeg: 180, levelDb: -3 },
      ],
    });
    expect(designDifferences(STARTING_DESIGN, two)).toEqual([
      { pointer: '/requirement/beams', label: 'Beams', unit: '', before: 'θ 20° φ 0°', after: 'θ 20° φ 0°; θ 30° φ 180°, -3 dB' },
    ]);
  });

  it('keeps a choice whose kind changed in one part', () => {
    const ellipse: DesignDocument = {
      ...STARTING_DESIGN,
      panel: { ...STARTING_DESIGN.panel, outline: { kind: 'ellipse', widthMm: 200, heightMm: 150 } },
      illumination: { kind: 'plane-wave', thetaDeg: 10, phiDeg: 0, polarisation: 'x' },
    };
    expect(designDifferences(STARTING_DESIGN, ellipse)).toEqual([
      { pointer: '/panel/outline', label: 'Outline', unit: '', before: 'rectangle 200 × 200 mm', after: 'ellipse 200 × 150 mm' },
      {
        pointer: '/illumination',
        label: 'Illumination',
        unit: '',
        before: 'horn at -60, 0, 180 mm',
        after: 'plane wave from θ 10° φ 0°',
      },
    ]);
  });

  it('names one coordinate of the horn', () => {
    const moved = replacedAt(STARTING_DESIGN, '/illumination/positionMm/2', 175);
    expect(designDifferences(STARTING_DESIGN, moved)).toEqual([
      { pointer: '/illumination/positionMm/2', label: 'Horn z', unit: 'mm', before: 180, after: 175 },
    ]);
  });

  it('turns one side into the other when each part is taken over', () => {
    const numberAt = fc.record({
      '/requirement/beams/0/thetaDeg': fc.integer({ min: 0, max: 89 }),
      '/panel/outline': fc.constantFrom<unknown>({ kind: 'ellipse', widthMm: 100, heightMm: 90 }, { kind: 'rectangle', widthMm: 10, heightMm: 20 }),
      '/requirement/mask': fc.constantFrom<unknown>(undefined, { kind: 'published', id: 's-465' }),
      '/panel/keepOuts': fc.constantFrom<unknown>([], [{ kind: 'ellipse', widthMm: 9, heightMm: 9, centreMm: [0, 0] }]),
    });
    const build = (values: Readonly<Record<string, unknown>>): DesignDocument =>
      Object.entries(values).reduce((design, [pointer, value]) => replacedAt(design, pointer, value), STARTING_DESIGN);
    fc.assert(
      fc.property(numberAt, numberAt, (one, other) => {
        const before = build(one);
        const after = build(other);
        const walked = differingParts(before, after).reduce((design, part) => replacedAt(design, part.pointer, part.after), before);
        expect(walked).toEqual(after);
      }),
      { seed: 7 },
    );
  });
});

describe('countParameters', () => {
  it('counts every single value of the starting design', () => {
    // 1 version, 7 requirement, 7 panel (keep-outs are empty), 10 illumination, 1 synthesis, 2 cells, 1 reference, 2 prediction
    expect(countParameters(STARTING_DESIGN)).toBe(31);
  });
});

describe('pointers', () => {
  it('read and take away a field', () => {
    expect(valueAt(STARTING_DESIGN, '#/panel/lattice/periodXMm')).toBe(5);
    expect(valueAt(STARTING_DESIGN, '/panel/lattice/rowSpacingMm')).toBeUndefined();
    expect(replacedAt(STARTING_DESIGN, '/requirement/minGainDbi', undefined).requirement).not.toHaveProperty('minGainDbi');
  });

  it('refuse to replace below a single value', () => {
    expect(() => replacedAt(STARTING_DESIGN, '/schemaVersion/deep', 1)).toThrow('Nothing stands where "deep" is to be replaced');
  });

  it('name every single value of a full document', () => {
    const full: DesignDocument = {
      ...withRequirement({
        bandGHz: [27, 29],
        beams: [{ thetaDeg: 1, phiDeg: 2, levelDb: 0, phaseDeg: 0 }],
        minCrossPolarDiscriminationDb: 20,
        mask: { kind: 'custom', points: [[0, 1], [2, 3]] },
      }),
      panel: {
        operation: 'reflect',
        outline: { kind: 'polygon', pointsMm: [[0, 0], [1, 0], [0, 1]] },
        lattice: { kind: 'triangular', periodXMm: 5, rowSpacingMm: 4 },
        keepOuts: [{ kind: 'polygon', centreMm: [0, 0], pointsMm: [[0, 0], [1, 0], [0, 1]] }],
      },
      cells: { kind: 'inline', cells: [{ phaseDeg: 1, magnitude: 1 }] },
      synthesis: { kind: 'focus', pointMm: [0, 0, 100] },
    };
    const pointers: string[] = [];
    const visit = (value: unknown, pointer: string): void => {
      if (typeof value === 'object' && value !== null) Object.entries(value).forEach(([name, inner]) => visit(inner, `${pointer}/${name}`));
      else if (!pointer.endsWith('/kind')) pointers.push(pointer);
    };
    visit(full, '');
    expect(pointers.filter((pointer) => fieldLabel(pointer).label === pointer)).toEqual([]);
  });
});
