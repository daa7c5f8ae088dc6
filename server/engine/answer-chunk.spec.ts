import { exampleDesign } from '../../shared/antenna/example-design';
import type { BandPoint } from '../../shared/model/band-run';
import { createChunkAnswerer } from './answer-chunk';
import type { ChunkTask } from './chunk-task';

const design = exampleDesign({ requirement: { designFrequencyGHz: 10, bandGHz: [9.5, 10.5], beams: [{ thetaDeg: 20, phiDeg: 0 }], polarisation: 'x' } });
const task = (more: Partial<ChunkTask> = {}): ChunkTask => ({ kind: 'band', contentHash: 'a', design, edition: null, parameters: { frequencyCount: 3 }, chunk: { from: 1, to: 2 }, stop: new Int32Array(1), ...more });

describe('chunk answerer', () => {
  it('computes the items of its chunk alone', () => {
    const outcome = createChunkAnswerer()(task());
    if (outcome.kind !== 'computed') throw new Error(outcome.kind);
    expect((outcome.part as BandPoint[]).map(({ frequencyGHz }) => frequencyGHz)).toEqual([10]);
  });

  it('heeds the stop flag before its first step', () => {
    expect(createChunkAnswerer()(task({ stop: Int32Array.of(1) }))).toEqual({ kind: 'stopped' });
  });

  it('gives the faults of a design as a value', () => {
    const broken = { ...design, panel: { ...design.panel, outline: { kind: 'rectangle', widthMm: 1, heightMm: 1 } } } as const;
    expect(createChunkAnswerer()(task({ contentHash: 'b', design: broken }))).toMatchObject({ kind: 'invalid', faults: [{ pointer: '#/panel' }] });
  });
});
