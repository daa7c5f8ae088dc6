import { derivedValues } from '../../../../shared/antenna/derived-values';
import type { EditionHeader, FamilySummary } from '../../../../shared/contracts/library';
import type { DesignDocument } from '../../../../shared/model/design-document';
import { replacedAt } from '../../../../shared/model/design-pointer';
import { STARTING_DESIGN } from '../../../../shared/model/starting-design';
import { editionMatches } from './edition-match';

const person = { id: '6f9619ff-8b86-4d01-b42d-00cf4fc964fd', name: 'Cell lab' };
const edition = (more: Partial<EditionHeader> = {}): EditionHeader => ({
  id: '6f9619ff-8b86-4d01-b42d-00cf4fc96401',
  familyId: '6f9619ff-8b86-4d01-b42d-00cf4fc96400',
  familyName: 'Ring and patch 5 mm',
  number: 1,
  state: 'published',
  hash: 'a'.repeat(64),
  cellCount: 33,
  fileCount: 33,
  fromGHz: 26,
  toGHz: 30,
  thetasDeg: [0, 30, 50],
  phisDeg: [0],
  verdict: 'pass',
  note: 'First edition',
  acceptedBy: person,
  acceptedAt: '2026-12-01T14:02:31Z',
  publishedBy: person,
  publishedAt: '2026-12-01T14:02:31Z',
  ...more,
});
const family = (more: Partial<FamilySummary> = {}): FamilySummary => ({
  id: '6f9619ff-8b86-4d01-b42d-00cf4fc96400',
  name: 'Ring and patch 5 mm',
  kind: 'ring and patch',
  operation: 'reflect',
  periodXMm: 5,
  periodYMm: 5,
  designFrequencyGHz: 28,
  provenance: 'measured',
  editions: [edition()],
  useCount: 0,
  ...more,
});
const remarks = (one: FamilySummary, design: DesignDocument = STARTING_DESIGN) =>
  editionMatches([one], design, derivedValues(design))[0].remarks.map(({ subject, weight }) => [subject, weight]);

describe('editionMatches', () => {
  it('has nothing to say against an edition that fits', () => {
    expect(remarks(family())).toEqual([]);
  });

  it('warns of another period with both lattices', () => {
    const [match] = editionMatches([family({ periodXMm: 4.5 })], STARTING_DESIGN, derivedValues(STARTING_DESIGN));
    expect(match.remarks).toEqual([{ subject: 'period', weight: 'warn', text: 'Described at 4.5 × 5 mm; this lattice is 5 × 5 mm' }]);
  });

  it('warns when the panel is lit more steeply than the data go', () => {
    expect(remarks(family({ editions: [edition({ thetasDeg: [0] })] }))).toEqual([['incidence', 'warn']]);
  });

  it('refuses an edition without the design frequency, and warns of one that ends inside the band', () => {
    expect(remarks(family({ editions: [edition({ fromGHz: 9, toGHz: 11 })] }))).toEqual([['band', 'refuses']]);
    const wide = replacedAt(STARTING_DESIGN, '/requirement/bandGHz', [27, 31]);
    expect(remarks(family(), wide)).toEqual([['band', 'warn']]);
  });

  it('refuses transmitting cells for a reflecting panel', () => {
    expect(remarks(family({ operation: 'transmit' }))).toEqual([['operation', 'refuses']]);
  });

  it('says that simulated cells are not measured', () => {
    expect(remarks(family({ provenance: 'simulated' }))).toEqual([['quality', 'note']]);
  });

  it('puts the best suited first and leaves unpublished editions out', () => {
    const families = [family({ name: 'far', operation: 'transmit' }), family({ name: 'near', periodXMm: 4 }), family({ name: 'fit', editions: [edition({ state: 'accepted', number: null }), edition()] })];
    expect(editionMatches(families, STARTING_DESIGN, derivedValues(STARTING_DESIGN)).map((match) => match.family.name)).toEqual(['fit', 'near', 'far']);
  });
});
