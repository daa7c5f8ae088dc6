import * as fc from 'fast-check';
import { decimalTimesTen, decodeFileText, encodeAscii, encodeUtf8 } from './file-text';

describe('decodeFileText', () => {
  it.each([
    ['plain ASCII', [0x23, 0x20, 0x47], { text: '# G', encoding: 'ascii', hadByteOrderMark: false }],
    ['a UTF-8 mark', [0xef, 0xbb, 0xbf, 0x23], { text: '#', encoding: 'ascii', hadByteOrderMark: true }],
    ['UTF-8', [0xc2, 0xb0], { text: '°', encoding: 'utf-8', hadByteOrderMark: false }],
    ['Latin-1', [0x34, 0xb0], { text: '4°', encoding: 'latin-1', hadByteOrderMark: false }],
    ['UTF-16 little endian', [0xff, 0xfe, 0x23, 0, 0xb0, 0], { text: '#°', encoding: 'utf-16le', hadByteOrderMark: true }],
    ['UTF-16 big endian', [0xfe, 0xff, 0, 0x23], { text: '#', encoding: 'utf-16be', hadByteOrderMark: true }],
    ['UTF-16 without a mark', [0x23, 0, 0x20, 0, 0x31, 0], { text: '# 1', encoding: 'utf-16le', hadByteOrderMark: false }],
    ['an overlong form as Latin-1', [0xc0, 0xaf], { text: 'À¯', encoding: 'latin-1', hadByteOrderMark: false }],
    ['an encoded surrogate as Latin-1', [0xed, 0xa0, 0x80], { text: '\u00ed\u00a0\u0080', encoding: 'latin-1', hadByteOrderMark: false }],
    ['nothing', [], { text: '', encoding: 'ascii', hadByteOrderMark: false }],
  ])('decodes %s', (_name, bytes, expected) => {
    expect(decodeFileText(Uint8Array.from(bytes))).toEqual(expected);
  });

  it('undoes encodeUtf8', () => {
    fc.assert(
      fc.property(fc.string({ unit: 'binary' }), (text) => {
        fc.pre(!text.startsWith('\ufeff') && !text.includes('\0'));
        expect(decodeFileText(encodeUtf8(text)).text).toBe(text);
      }),
      { seed: 61 },
    );
  });

  it('agrees with the platform about what is valid UTF-8', () => {
    fc.assert(
      fc.property(fc.uint8Array({ maxLength: 12 }), (bytes) => {
        fc.pre(!bytes.includes(0) && !(bytes[0] === 0xff && bytes[1] === 0xfe) && !(bytes[0] === 0xfe && bytes[1] === 0xff));
        const own = decodeFileText(bytes);
        let platform: string | null = null;
        try {
          platform = new TextDecoder('utf-8', { fatal: true }).decode(bytes);
        } catch (error) {
          // Node's own TypeError is not the test realm's, so its name is compared.
          expect(String(error)).toMatch(/^TypeError/);
        }
        expect(own.encoding === 'latin-1' ? null : own.text).toBe(platform);
      }),
      { seed: 62, numRuns: 2000 },
    );
  });

  it('reads long files in pieces', () => {
    expect(decodeFileText(new Uint8Array(100_000).fill(0x41)).text).toBe('A'.repeat(100_000));
  });
});

describe('encodeAscii', () => {
  it('throws on a character beyond seven bits and says which', () => {
    expect(() => encodeAscii('a°')).toThrow('Character U+00b0 at 1 is not ASCII');
  });
});

describe('decimalTimesTen', () => {
  it('rounds once', () => {
    expect(decimalTimesTen('28.1', 9)).toBe(28_100_000_000);
    expect(decimalTimesTen('2.81e1', 9)).toBe(28_100_000_000);
    expect(decimalTimesTen('.5E+3', -3)).toBe(0.5);
  });
});
