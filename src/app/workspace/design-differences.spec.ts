import type { DesignDocument } from '../../../shared/model/design-document';
import { replacedAt } from '../../../shared/model/design-pointer';
import { STARTING_DESIGN } from '../../../shared/model/starting-design';
import { conflictFields, mergedDesign, sameDesign } from './design-differences';

const base = STARTING_DESIGN;
const put = (design: DesignDocument, pointer: string, value: unknown): DesignDocument => replacedAt(design, pointer, value);

describe('conflictFields', () => {
  it('says who changed which field and proposes the only change', () => {
    const mine = put(put(base, '/requirement/minGainDbi', 35), '/requirement/beams/0/thetaDeg', 25);
    const theirs = put(put(base, '/requirement/beams/0/thetaDeg', 30), '/panel/lattice/periodXMm', 4.8);
    expect(conflictFields({ base, mine, theirs })).toEqual([
      expect.objectContaining({ label: 'Beam 1 θ', unit: '°', base: 20, mine: 25, theirs: 30, changedBy: 'both', proposed: 'mine' }),
      expect.objectContaining({ label: 'Least gain', unit: 'dBi', base: 34, mine: 35, theirs: 34, changedBy: 'me', proposed: 'mine' }),
      expect.objectContaining({ label: 'Period along x', unit: 'mm', base: 5, mine: 5, theirs: 4.8, changedBy: 'them', proposed: 'theirs' }),
    ]);
  });

  it('shows a limit that one side took away as absent', () => {
    const theirs = put(base, '/requirement/maxSidelobeDb', undefined);
    expect(conflictFields({ base, mine: base, theirs })).toEqual([
      expect.objectContaining({ label: 'Highest sidelobe', mine: -18, theirs: null, changedBy: 'them', proposed: 'theirs' }),
    ]);
  });

  it('finds none when both sides did the same', () => {
    const mine = put(base, '/requirement/minGainDbi', 35);
    expect(conflictFields({ base, mine, theirs: put(base, '/requirement/minGainDbi', 35) })).toEqual([]);
  });
});

describe('mergedDesign', () => {
  const mine = put(put(base, '/requirement/minGainDbi', 35), '/illumination', { kind: 'plane-wave', thetaDeg: 5, phiDeg: 0, polarisation: 'x' });
  const theirs = put(put(base, '/illumination/positionMm/2', 175), '/requirement/maxSidelobeDb', undefined);
  const designs = { base, mine, theirs };

  it('joins changes that do not touch each other and takes over a removed limit', () => {
    const merged = mergedDesign(designs, { '/illumination': 'theirs' });
    expect(merged.requirement.minGainDbi).toBe(35);
    expect(merged.requirement).not.toHaveProperty('maxSidelobeDb');
    expect(merged.illumination).toEqual(theirs.illumination);
  });

  it('takes a choice whose kind differs as a whole', () => {
    expect(mergedDesign(designs, { '/illumination': 'mine' }).illumination).toEqual(mine.illumination);
  });

  it('gives either side back when everything is chosen from it', () => {
    const all = (side: 'mine' | 'theirs') => Object.fromEntries(conflictFields(designs).map((field) => [field.pointer, side]));
    expect(sameDesign(mergedDesign(designs, all('mine')), mine)).toBe(true);
    expect(sameDesign(mergedDesign(designs, all('theirs')), theirs)).toBe(true);
  });
});
