import fc from 'fast-check';
import { faultsOfJson, pointerTo } from './json-limits';

const nested = (depth: number): unknown => {
  let value: unknown = 1;
  for (let level = 0; level < depth; level += 1) value = level % 2 === 0 ? [value] : { a: value };
  return value;
};

describe('faultsOfJson', () => {
  it('takes 32 levels and refuses 33, and does not overflow on many more', () => {
    expect(faultsOfJson(nested(32))).toEqual([]);
    expect(faultsOfJson(nested(33))).toEqual([{ pointer: '#', detail: 'must not nest deeper than 32 levels' }]);
    expect(faultsOfJson(nested(200_000))).toEqual([{ pointer: '#', detail: 'must not nest deeper than 32 levels' }]);
  });

  it('refuses keys that reach prototypes, at any place', () => {
    const body: unknown = JSON.parse('{"a":[{"__proto__":1}],"constructor":{},"prototype":2}');
    expect(faultsOfJson(body).map(({ pointer }) => pointer).sort()).toEqual(['#/a/0/__proto__', '#/constructor', '#/prototype']);
  });

  it('refuses what PostgreSQL and JSON cannot keep', () => {
    expect(faultsOfJson({ text: 'a\0b', number: JSON.parse('1e400') as number })).toEqual(
      expect.arrayContaining([
        { pointer: '#/text', detail: 'must not contain the NUL character' },
        { pointer: '#/number', detail: 'must be a finite number' },
      ]),
    );
  });

  it('names no more than a hundred faults', () => {
    expect(faultsOfJson(Array.from({ length: 5000 }, () => '\0'))).toHaveLength(100);
  });

  it('finds nothing in ordinary JSON', () => {
    const harmless = fc.jsonValue({ maxDepth: 8 }).filter((value) => !/__proto__|constructor|prototype|\\u0000/.test(JSON.stringify(value)));
    fc.assert(fc.property(harmless, (value) => faultsOfJson(value).length === 0), { numRuns: 300 });
  });
});

describe('pointerTo', () => {
  it('escapes as the examples of RFC 6901 do, in the fragment form', () => {
    expect([pointerTo([]), pointerTo(['foo', 0]), pointerTo(['a/b']), pointerTo(['m~n'])]).toEqual(['#', '#/foo/0', '#/a~1b', '#/m~0n']);
  });
});
