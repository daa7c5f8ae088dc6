import { createHash } from 'node:crypto';
import { STARTING_DESIGN } from '../../shared/model/starting-design';
import { DesignContentService, contentFrom, hashedJson, type EditionNames } from './design-content-service';

const EDITION = '00000000-0000-4000-8000-000000000001';
const reference = { id: EDITION, familyName: 'Rings', number: 2, hash: 'b'.repeat(64) };
const onEdition = { ...STARTING_DESIGN, cells: { kind: 'edition', editionId: EDITION, rule: 'least-error' as const, excludedCells: [] } } as const;
const known = (number: number | null): EditionNames => ({ editionNames: async () => new Map([[EDITION, { familyName: 'Rings', number, hash: 'b'.repeat(64) }]]) });

describe('the content of a design', () => {
  it('has the hash of its canonical JSON, as anybody can compute it', () => {
    const { body, hash } = hashedJson({ b: 1, a: ['ä', 0.1] });
    expect(body.toString('utf8')).toBe('{"a":["ä",0.1],"b":1}');
    // sha256sum of these very bytes.
    expect(hash).toBe(createHash('sha256').update('{"a":["ä",0.1],"b":1}', 'utf8').digest('hex'));
  });

  it('has one hash whatever the order of the fields, and another for any change', () => {
    const { requirement, ...others } = STARTING_DESIGN;
    expect(contentFrom({ ...others, requirement } as typeof STARTING_DESIGN, null).hash).toBe(contentFrom(STARTING_DESIGN, null).hash);
    expect(contentFrom({ ...STARTING_DESIGN, referencePhaseDeg: 1e-9 }, null).hash).not.toBe(contentFrom(STARTING_DESIGN, null).hash);
  });

  it('covers the cells of the edition too', () => {
    const before = contentFrom(onEdition as never, reference);
    const after = contentFrom(onEdition as never, { ...reference, hash: 'c'.repeat(64) });
    expect(before.parts.map(({ role }) => role)).toEqual(['design', 'edition']);
    expect(before.parts[0].hash).toBe(after.parts[0].hash);
    expect(before.hash).not.toBe(after.hash);
  });

  it('names the edition that the team has published', async () => {
    const content = await new DesignContentService(known(2)).contentOf('team', onEdition as never);
    expect(content.edition).toEqual(reference);
  });

  it('refuses an edition that is unknown or only accepted', async () => {
    const errors = { faults: [{ pointer: '#/body/cells/editionId', detail: 'there is no such published edition' }] };
    for (const names of [known(null), { editionNames: async () => new Map() }]) {
      await expect(new DesignContentService(names).contentOf('team', onEdition as never, '#/body')).rejects.toMatchObject(errors);
    }
  });
});
