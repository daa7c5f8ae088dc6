import { predictDesign } from '../../shared/antenna/predict-design';
import { readBinaryBlock } from '../../shared/contracts/binary-block';
import { CELL_ARRAY_NAMES, CUT_ARRAY_NAMES, predictionHead, predictionReply } from '../../shared/contracts/predictions';
import { NEW_PANEL_DESIGN, STARTING_DESIGN } from '../../shared/model/starting-design';
import { predictionBlockOf, predictionReplyOf } from './prediction-reply';

describe('the two forms of a prediction', () => {
  const cuts = [{ phiDeg: 30, thetaDeg: [-20, 20, 2] }, { plane: 'across', angleDeg: [-5, 5, 1] }] as const;
  const prediction = predictDesign(STARTING_DESIGN, { include: { cells: true, cuts, uv: { size: 16 } } });
  const reply = predictionReplyOf(prediction);
  const block = readBinaryBlock(new Uint8Array(predictionBlockOf(prediction)).buffer);

  it('fit their contracts', () => {
    expect(predictionReply.parse(reply)).toEqual(reply);
    expect(predictionHead.parse(block.head)).toEqual(block.head);
  });

  it('hold the same numbers, bit for bit', () => {
    for (const name of CELL_ARRAY_NAMES) expect(Array.from(block.arrays[`cells.${name}`])).toEqual(reply.cells?.[name]);
    reply.cuts?.forEach((cut, i) => {
      for (const name of CUT_ARRAY_NAMES) expect(Array.from(block.arrays[`cuts.${i}.${name}`])).toEqual(cut[name]);
    });
    expect(Array.from(block.arrays['uv.gainDbi'])).toEqual(reply.uv?.gainDbi);
    expect(Object.keys(block.arrays)).toHaveLength(CELL_ARRAY_NAMES.length + 2 * CUT_ARRAY_NAMES.length + 1);
  });

  it('hold the cross-polar field in the vector model', () => {
    const both = predictDesign(NEW_PANEL_DESIGN, { include: { cuts, uv: { size: 16 } } });
    const plain = predictionReplyOf(both);
    expect(predictionReply.parse(plain)).toEqual(plain);
    const { arrays } = readBinaryBlock(new Uint8Array(predictionBlockOf(both)).buffer);
    expect(Array.from(arrays['cuts.1.crossGainDbi'])).toEqual(plain.cuts?.[1].crossGainDbi);
    expect(Array.from(arrays['uv.crossGainDbi'])).toEqual(plain.uv?.crossGainDbi);
    expect(reply.uv?.crossGainDbi).toBeUndefined();
  });

  it('leave out what was not asked for', () => {
    const bare = predictDesign(STARTING_DESIGN, { include: {} });
    expect(Object.keys(predictionReplyOf(bare))).toEqual(['engineVersion', 'figures', 'verdicts', 'warnings']);
    expect(readBinaryBlock(new Uint8Array(predictionBlockOf(bare)).buffer).arrays).toEqual({});
  });
});
