import { readBinaryBlock, writeBinaryBlock } from '../../../shared/contracts/binary-block';
import type { BlockArrays } from '../../../shared/contracts/binary-block';
import { CELL_ARRAY_NAMES, CUT_ARRAY_NAMES, predictionHead } from '../../../shared/contracts/predictions';
import { STARTING_DESIGN } from '../../../shared/model/starting-design';
import { SAMPLE_HEAD } from './sample-prediction';
import { unpackPrediction } from './unpack-prediction';

const along = { plane: 'along' as const, angleDeg: [-90, 90, 90] as [number, number, number] };
const head = { ...SAMPLE_HEAD, cellCount: 2, cuts: [{ request: along }], uv: { size: 2, floorDbi: -30 } };
const arrays: BlockArrays = {
  ...Object.fromEntries(CELL_ARRAY_NAMES.map((name, place) => [`cells.${name}`, Float64Array.of(place, place + 0.5)])),
  ...Object.fromEntries(CUT_ARRAY_NAMES.map((name, place) => [`cuts.0.${name}`, Float64Array.of(place, 1, 2)])),
  'uv.gainDbi': Float64Array.of(1, 2, 3, 4),
};

/** Through the bytes, as they come from the server. */
const received = (parts: BlockArrays) => {
  const bytes = writeBinaryBlock(head, parts);
  const block = readBinaryBlock(bytes.buffer.slice(bytes.byteOffset, bytes.byteOffset + bytes.byteLength) as ArrayBuffer);
  return { head: predictionHead.parse(block.head), arrays: block.arrays };
};

describe('unpackPrediction', () => {
  it('sorts cells, cuts and map out of one block', () => {
    const prediction = unpackPrediction(received(arrays), STARTING_DESIGN);
    expect([...prediction.cells.xMm]).toEqual([0, 0.5]);
    expect([...prediction.cells.incidenceAzimuthDeg]).toEqual([11, 11.5]);
    expect(prediction.cuts).toHaveLength(1);
    expect(prediction.cuts[0].request).toEqual(along);
    expect([...prediction.cuts[0].gainDbi]).toEqual([4, 1, 2]);
    expect(prediction.uv).toEqual({ size: 2, floorDbi: -30, gainDbi: Float32Array.of(1, 2, 3, 4) });
    expect(prediction.of).toBe(STARTING_DESIGN);
  });

  it('keeps the cross-polar field of the vector model', () => {
    const both = { ...arrays, 'cuts.0.crossGainDbi': Float64Array.of(-20, -21, -22), 'uv.crossGainDbi': Float64Array.of(-1, -2, -3, -4) };
    const prediction = unpackPrediction(received(both), STARTING_DESIGN);
    expect(prediction.cuts[0].crossGainDbi?.[1]).toBe(-21);
    expect(prediction.uv?.crossGainDbi).toEqual(Float32Array.of(-1, -2, -3, -4));
    expect(unpackPrediction(received(arrays), STARTING_DESIGN).cuts[0].crossGainDbi).toBeUndefined();
  });

  it('has no map where none was asked for', () => {
    const { uv: _uv, ...plain } = head;
    expect(unpackPrediction({ head: plain, arrays }, STARTING_DESIGN).uv).toBeNull();
  });

  it('refuses a block without an array that its head announces', () => {
    const { 'cells.errorDeg': _missing, ...cut } = arrays;
    expect(() => unpackPrediction(received(cut), STARTING_DESIGN)).toThrow('the prediction lacks its array cells.errorDeg');
  });
});
