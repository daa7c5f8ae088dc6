import { canonicalJson } from './canonical-json';

describe('canonical JSON', () => {
  it('writes the number and string example of RFC 8785, section 3.2.2, as the RFC does', () => {
    const value = {
      numbers: [333333333.33333329, 1e30, 4.5, 2e-3, 0.000000000000000000000000001],
      string: '\u20ac$\u000F\u000aA\'\u0042\u0022\u005c\\"/',
      literals: [null, true, false],
    };
    expect(canonicalJson(value)).toBe(
      '{"literals":[null,true,false],"numbers":[333333333.3333333,1e+30,4.5,0.002,1e-27],"string":"€$\\u000f\\nA\'B\\"\\\\\\\\\\"/"}',
    );
  });

  it('sorts keys by UTF-16 code units, as the example of section 3.2.3', () => {
    const value = { '\u20ac': 'Euro Sign', '\r': 'Carriage Return', '\ufb33': 'Hebrew Letter Dalet With Dagesh', '1': 'One', '\ud83d\ude00': 'Emoji: Grinning Face', '\u0080': 'Control', '\u00f6': 'Latin Small Letter O With Diaeresis' };
    const order = [...canonicalJson(value).matchAll(/:"([^"]+)"/g)].map((match) => match[1]);
    expect(order).toEqual(['Carriage Return', 'One', 'Control', 'Latin Small Letter O With Diaeresis', 'Euro Sign', 'Emoji: Grinning Face', 'Hebrew Letter Dalet With Dagesh']);
  });

  it('gives equal text for equal values whatever the order of their keys, and drops what is undefined', () => {
    expect(canonicalJson({ b: 1, a: { d: [1, undefined], c: undefined } })).toBe(canonicalJson({ a: { d: [1, null] }, b: 1 }));
  });

  it.each([NaN, Infinity])('refuses %d, which JSON cannot say', (value) => {
    expect(() => canonicalJson({ value })).toThrow('canonical JSON has no');
  });
});
