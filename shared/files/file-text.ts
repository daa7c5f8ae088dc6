/** How the bytes of a file were turned into text. */
export type TextEncoding = 'ascii' | 'utf-8' | 'utf-16le' | 'utf-16be' | 'latin-1';

export interface FileText {
  readonly text: string;
  readonly encoding: TextEncoding;
  readonly hadByteOrderMark: boolean;
}

/** Characters handed to `String.fromCharCode` at a time; longer argument lists overflow the stack in some engines. */
const CHUNK = 8192;
/** Bytes looked at to tell UTF-16 without a mark from eight-bit text. */
const PROBE = 512;

/**
 * Decodes the bytes of a text file: UTF-8 and UTF-16 with or without a byte order mark, otherwise one byte per character.
 * Never throws: every byte sequence is some Latin-1 text.
 */
export function decodeFileText(bytes: Uint8Array): FileText {
  if (bytes.length >= 2 && bytes[0] === 0xff && bytes[1] === 0xfe) return wide(bytes, 2, true);
  if (bytes.length >= 2 && bytes[0] === 0xfe && bytes[1] === 0xff) return wide(bytes, 2, false);
  const marked = bytes.length >= 3 && bytes[0] === 0xef && bytes[1] === 0xbb && bytes[2] === 0xbf;
  if (marked) return narrow(bytes.subarray(3), true);
  const byteOrder = unmarkedUtf16(bytes);
  return byteOrder === null ? narrow(bytes, false) : wide(bytes, 0, byteOrder === 'little');
}

function narrow(bytes: Uint8Array, hadByteOrderMark: boolean): FileText {
  if (bytes.every((byte) => byte < 0x80)) return { text: fromUnits(bytes), encoding: 'ascii', hadByteOrderMark };
  const codeUnits = utf8CodeUnits(bytes);
  if (codeUnits === null) return { text: fromUnits(bytes), encoding: 'latin-1', hadByteOrderMark };
  return { text: fromUnits(codeUnits), encoding: 'utf-8', hadByteOrderMark };
}

/** An odd last byte of a cut-off file is dropped: it is half a character. */
function wide(bytes: Uint8Array, start: number, littleEndian: boolean): FileText {
  const units = new Uint16Array((bytes.length - start) >> 1);
  for (let i = 0; i < units.length; i++) {
    const at = start + 2 * i;
    units[i] = littleEndian ? bytes[at] | (bytes[at + 1] << 8) : (bytes[at] << 8) | bytes[at + 1];
  }
  return { text: fromUnits(units), encoding: littleEndian ? 'utf-16le' : 'utf-16be', hadByteOrderMark: start > 0 };
}

/** Western text in UTF-16 has a zero in every other byte. */
function unmarkedUtf16(bytes: Uint8Array): 'little' | 'big' | null {
  const pairs = Math.min(bytes.length, PROBE) >> 1;
  if (pairs < 2) return null;
  let evenZeros = 0;
  let oddZeros = 0;
  for (let i = 0; i < pairs; i++) {
    if (bytes[2 * i] === 0) evenZeros += 1;
    if (bytes[2 * i + 1] === 0) oddZeros += 1;
  }
  if (oddZeros > 0.9 * pairs && evenZeros === 0) return 'little';
  if (evenZeros > 0.9 * pairs && oddZeros === 0) return 'big';
  return null;
}

function fromUnits(units: Uint8Array | Uint16Array): string {
  const parts: string[] = [];
  for (let at = 0; at < units.length; at += CHUNK) parts.push(String.fromCharCode(...units.subarray(at, at + CHUNK)));
  return parts.join('');
}

/** UTF-16 code units of valid UTF-8, or null: overlong forms, surrogates and cut sequences are not valid (RFC 3629). */
function utf8CodeUnits(bytes: Uint8Array): Uint16Array | null {
  const units = new Uint16Array(bytes.length);
  let length = 0;
  let at = 0;
  while (at < bytes.length) {
    const size = sequenceLength(bytes[at]);
    if (size === 0 || at + size > bytes.length) return null;
    const point = size === 1 ? bytes[at] : codePoint(bytes, at, size);
    if (point < 0) return null;
    if (point > 0xffff) units[length++] = 0xd7c0 + (point >> 10);
    units[length++] = point > 0xffff ? 0xdc00 + (point & 0x3ff) : point;
    at += size;
  }
  return units.subarray(0, length);
}

function sequenceLength(lead: number): number {
  if (lead < 0x80) return 1;
  if (lead >= 0xc2 && lead < 0xe0) return 2;
  if (lead >= 0xe0 && lead < 0xf0) return 3;
  return lead >= 0xf0 && lead < 0xf5 ? 4 : 0;
}

function codePoint(bytes: Uint8Array, at: number, size: number): number {
  let point = bytes[at] & (0x7f >> size);
  for (let i = 1; i < size; i++) {
    const byte = bytes[at + i];
    if ((byte & 0xc0) !== 0x80) return -1;
    point = (point << 6) | (byte & 0x3f);
  }
  const smallest = size === 4 ? 0x10000 : size === 3 ? 0x800 : 0x80;
  const isSurrogate = point >= 0xd800 && point < 0xe000;
  return point < smallest || point > 0x10ffff || isSurrogate ? -1 : point;
}

/** ASCII bytes of a text the program wrote itself. Throws where a character has no place in seven bits. */
export function encodeAscii(text: string): Uint8Array {
  const bytes = new Uint8Array(text.length);
  for (let i = 0; i < text.length; i++) {
    const unit = text.charCodeAt(i);
    if (unit > 0x7f) throw new RangeError(`Character U+${unit.toString(16).padStart(4, '0')} at ${i} is not ASCII`);
    bytes[i] = unit;
  }
  return bytes;
}

/** UTF-8 bytes of a text; a lone surrogate becomes U+FFFD. */
export function encodeUtf8(text: string): Uint8Array {
  const bytes: number[] = [];
  for (const character of text) {
    const point = character.codePointAt(0) ?? 0xfffd;
    pushUtf8(bytes, point >= 0xd800 && point < 0xe000 ? 0xfffd : point);
  }
  return Uint8Array.from(bytes);
}

function pushUtf8(bytes: number[], point: number): void {
  if (point < 0x80) bytes.push(point);
  else if (point < 0x800) bytes.push(0xc0 | (point >> 6), 0x80 | (point & 0x3f));
  else if (point < 0x10000) bytes.push(0xe0 | (point >> 12), 0x80 | ((point >> 6) & 0x3f), 0x80 | (point & 0x3f));
  else bytes.push(0xf0 | (point >> 18), 0x80 | ((point >> 12) & 0x3f), 0x80 | ((point >> 6) & 0x3f), 0x80 | (point & 0x3f));
}

/** A number as files write it: the whole text, no locale, no hexadecimal, no words. */
export const NUMBER_TEXT = /^[+-]?(?:\d+(?:\.\d*)?|\.\d+)(?:[eE][+-]?\d+)?$/;

/** A decimal text times a power of ten, rounded once: 28.1 GHz becomes 28100000000 Hz and not its neighbour. */
export function decimalTimesTen(text: string, exponent: number): number {
  const at = text.search(/[eE]/);
  if (at < 0) return Number(`${text}e${exponent}`);
  return Number(`${text.slice(0, at)}e${Number(text.slice(at + 1)) + exponent}`);
}
