import { STARTING_DESIGN } from '../../shared/model/starting-design';
import { contentFrom } from '../projects/design-content-service';
import { frozenContent } from './frozen-content';

describe('frozenContent', () => {
  const edition = { id: '00000000-0000-4000-8000-000000000001', familyName: 'Rings', number: 2, hash: 'b'.repeat(64) };

  it('reads back what was frozen', () => {
    for (const of of [null, edition]) {
      const content = contentFrom(STARTING_DESIGN, of);
      expect(frozenContent(content.parts, content.hash)).toEqual(content);
    }
  });

  it('refuses parts that have not the hash of the revision', () => {
    const { parts } = contentFrom({ ...STARTING_DESIGN, referencePhaseDeg: 10 }, null);
    expect(() => frozenContent(parts, contentFrom(STARTING_DESIGN, null).hash)).toThrow(/the content of a revision has the hash [0-9a-f]{64}, not [0-9a-f]{64}/);
  });

  it('refuses a part that is no design', () => {
    expect(() => frozenContent([{ role: 'design', body: Buffer.from('{"schemaVersion":2}') }], 'a'.repeat(64))).toThrow('schemaVersion');
  });
});
