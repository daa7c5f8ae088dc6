import { readBinaryBlock, writeBinaryBlock } from './binary-block';

describe('binary block', () => {
  const arrays = { a: new Float64Array([1, -2.5]), b: new Uint8Array([7, 8, 9]), c: new Int32Array([-1]), d: new Float32Array([0.5]) };

  it('reads back the head and every array it wrote', () => {
    const bytes = writeBinaryBlock({ name: 'θ ring', count: 3 }, arrays);
    const read = readBinaryBlock(bytes.buffer as ArrayBuffer);
    expect(read.head).toEqual({ name: 'θ ring', count: 3 });
    expect(read.arrays).toEqual(arrays);
  });

  it('starts every array at a multiple of eight bytes', () => {
    const read = readBinaryBlock(writeBinaryBlock({}, arrays).buffer as ArrayBuffer);
    for (const array of Object.values(read.arrays)) expect(array.byteOffset % 8).toBe(0);
  });

  it.each([0, 3, 20])('refuses a block cut off after %d bytes', (length) => {
    const bytes = writeBinaryBlock({}, arrays);
    expect(() => readBinaryBlock(bytes.slice(0, length).buffer as ArrayBuffer)).toThrow('cut off');
  });
});
