/**
 * Arrays behind a JSON head, `application/octet-stream`, little endian:
 * 4 bytes head length in bytes (uint32), the head as UTF-8 JSON padded with spaces so that the arrays start at a
 * multiple of 8, then the arrays one after another, each starting at a multiple of 8.
 * The head is `{ head: T, arrays: [{ name, type, length }] }` in the order of the bytes.
 */
export type BlockArray = Float64Array | Float32Array | Int32Array | Uint8Array;
export type BlockArrays = Readonly<Record<string, BlockArray>>;

type BlockType = 'float64' | 'float32' | 'int32' | 'uint8';
interface BlockEntry {
  readonly name: string;
  readonly type: BlockType;
  readonly length: number;
}

const BYTES: Record<BlockType, number> = { float64: 8, float32: 4, int32: 4, uint8: 1 };
const alignTo8 = (bytes: number): number => Math.ceil(bytes / 8) * 8;

function blockType(array: BlockArray): BlockType {
  if (array instanceof Float64Array) return 'float64';
  if (array instanceof Float32Array) return 'float32';
  return array instanceof Int32Array ? 'int32' : 'uint8';
}

/** UTF-8 bytes of a string of ASCII: JSON with everything above 0x7e escaped. */
function asciiJson(value: unknown): string {
  return JSON.stringify(value).replace(/[\u007f-\uffff]/g, (c) => `\\u${c.charCodeAt(0).toString(16).padStart(4, '0')}`);
}

/** Packs a head and its arrays. Inverse: {@link readBinaryBlock}. */
export function writeBinaryBlock(head: unknown, arrays: BlockArrays): Uint8Array {
  const entries = Object.entries(arrays).map(([name, array]) => ({ name, type: blockType(array), length: array.length }));
  const json = asciiJson({ head, arrays: entries });
  const headLength = alignTo8(json.length + 4) - 4;
  let total = headLength + 4;
  for (const entry of entries) total += alignTo8(entry.length * BYTES[entry.type]);
  const bytes = new Uint8Array(total);
  new DataView(bytes.buffer).setUint32(0, headLength, true);
  bytes.fill(0x20, 4, 4 + headLength);
  for (let i = 0; i < json.length; i += 1) bytes[4 + i] = json.charCodeAt(i);
  let at = headLength + 4;
  for (const array of Object.values(arrays)) {
    bytes.set(new Uint8Array(array.buffer, array.byteOffset, array.byteLength), at);
    at += alignTo8(array.byteLength);
  }
  return bytes;
}

/** Unpacks what {@link writeBinaryBlock} made. Throws when the block is cut off or its head is not JSON. */
export function readBinaryBlock(buffer: ArrayBuffer): { head: unknown; arrays: Record<string, BlockArray> } {
  if (buffer.byteLength < 4) throw new Error('binary block is cut off before its head');
  const headLength = new DataView(buffer).getUint32(0, true);
  if (4 + headLength > buffer.byteLength) throw new Error('binary block is cut off within its head');
  let json = '';
  const headBytes = new Uint8Array(buffer, 4, headLength);
  for (let i = 0; i < headLength; i += 8192) json += String.fromCharCode(...headBytes.subarray(i, i + 8192));
  const parsed = JSON.parse(json) as { head: unknown; arrays: BlockEntry[] };
  const arrays: Record<string, BlockArray> = {};
  let at = 4 + headLength;
  for (const { name, type, length } of parsed.arrays) {
    const bytes = length * BYTES[type];
    if (at + bytes > buffer.byteLength) throw new Error(`binary block is cut off within the array ${name}`);
    arrays[name] = viewOf(type, buffer, at, length);
    at += alignTo8(bytes);
  }
  return { head: parsed.head, arrays };
}

function viewOf(type: BlockType, buffer: ArrayBuffer, offset: number, length: number): BlockArray {
  if (type === 'float64') return new Float64Array(buffer, offset, length);
  if (type === 'float32') return new Float32Array(buffer, offset, length);
  if (type === 'int32') return new Int32Array(buffer, offset, length);
  return new Uint8Array(buffer, offset, length);
}
