import * as z from 'zod';
import { parseBody, parseParameters } from './schema-faults';

const schema = z.strictObject({
  periodXMm: z.number().gt(0).max(100),
  name: z.string().min(1).max(5),
  kind: z.enum(['rectangle', 'ellipse']),
  points: z.array(z.number()).min(2).optional(),
  note: z.string('must say why').optional(),
  shape: z.union([z.strictObject({ widthMm: z.number(), heightMm: z.number() }), z.strictObject({ radiusMm: z.number() })]).optional(),
});
const fine = { periodXMm: 5, name: 'a', kind: 'ellipse' };

const faultsOf = (change: Record<string, unknown>) => {
  const result = parseBody(schema, { ...fine, ...change });
  return result.success ? [] : result.faults.map(({ pointer, detail }) => `${pointer} ${detail}`);
};

describe('parseBody', () => {
  it('gives the data of a valid body', () => {
    expect(parseBody(schema, fine)).toEqual({ success: true, data: fine });
  });

  it.each([
    [{ periodXMm: -4 }, '#/periodXMm must be greater than 0; got -4'],
    [{ periodXMm: 101 }, '#/periodXMm must be at most 100; got 101'],
    [{ periodXMm: '5' }, '#/periodXMm must be a finite number; got "5"'],
    [{ periodXMm: undefined }, '#/periodXMm is missing'],
    [{ name: '' }, '#/name must have at least 1 characters'],
    [{ name: 'abcdef' }, '#/name must have at most 5 characters'],
    [{ kind: 'star' }, '#/kind must be one of rectangle, ellipse; got "star"'],
    [{ points: [1] }, '#/points must have at least 2 entries'],
    [{ points: [1, null] }, '#/points/1 must be a finite number; got null'],
    [{ note: 3 }, '#/note must say why'],
    [{ 'a/b~c': 1 }, '#/a~1b~0c is not a known field'],
    [{ kind: 'x'.repeat(100) }, `#/kind must be one of rectangle, ellipse; got "${'x'.repeat(39)}...`],
  ])('says of %j: %s', (change, fault) => {
    expect(faultsOf(change)).toEqual([fault]);
  });

  it('names the faults of the nearest branch of a union', () => {
    expect(faultsOf({ shape: { widthMm: 1, heightMm: 'x' } })).toEqual(['#/shape/heightMm must be a finite number; got "x"']);
  });

  it('names every fault at once', () => {
    expect(faultsOf({ periodXMm: 0, name: 7, colour: 'red' })).toEqual([
      '#/periodXMm must be greater than 0; got 0',
      '#/name must be text; got 7',
      '#/colour is not a known field',
    ]);
  });
});

describe('parseParameters', () => {
  it('names the parameter instead of pointing at it', () => {
    const result = parseParameters(z.strictObject({ limit: z.coerce.number().int().max(5) }), { limit: '7', page: '1' });
    expect(result).toEqual({
      success: false,
      faults: [
        { pointer: 'limit', detail: 'must be at most 5; got 7' },
        { pointer: 'page', detail: 'is not a known field' },
      ],
    });
  });
});
