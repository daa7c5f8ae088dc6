import { join } from 'node:path';
import { exampleEdition } from '../../shared/antenna/example-edition';
import { STARTING_DESIGN } from '../../shared/model/starting-design';
import { PredictionEngine, limitsFor } from './prediction-engine';
import { createInlineRunner, createPooledRunner } from './prediction-runner';
import { shareEdition } from './share-edition';

/** Made by `npm run build` and before this stage by `npm test`. */
const workerFile = join(__dirname, '../../dist/server/server/engine/prediction-worker.js');

describe('the pool of threads', () => {
  const pool = new PredictionEngine(createPooledRunner(workerFile, 2), limitsFor(2));
  const inline = new PredictionEngine(createInlineRunner(), limitsFor(1));
  afterAll(() => pool.close());

  it('gives bit for bit what the caller’s own thread gives, arrays included', async () => {
    const question = { design: STARTING_DESIGN, cells: true, uvSize: 32, cuts: [{ plane: 'along' as const, angleDeg: [-30, 30, 0.5] as [number, number, number] }] };
    const [threaded, own] = await Promise.all([pool.predict({ teamId: 'a', question }), inline.predict({ teamId: 'a', question })]);
    expect(threaded).toEqual(own);
    expect(threaded.cells?.xMm.buffer).toBeInstanceOf(ArrayBuffer);
  }, 30_000);

  it('uses an edition on shared memory, and the same again', async () => {
    const edition = { key: 'example', edition: shareEdition(exampleEdition()) };
    const design = { ...STARTING_DESIGN, cells: { kind: 'edition', editionId: '00000000-0000-4000-8000-000000000001', rule: 'nearest-phase', excludedCells: [] } } as const;
    const request = { teamId: 'a', question: { design: { ...design, cells: { ...design.cells, excludedCells: [] } } }, edition: async () => edition };
    const own = await inline.predict(request);
    for (let i = 0; i < 2; i++) expect(await pool.predict(request)).toEqual(own);
  }, 30_000);

  it('names faults with their class lost between threads', async () => {
    const design = { ...STARTING_DESIGN, illumination: { ...STARTING_DESIGN.illumination, positionMm: [0, 0, 0] as [number, number, number] } };
    const question = { design: design as typeof STARTING_DESIGN };
    await expect(pool.predict({ teamId: 'a', question })).rejects.toMatchObject({ name: 'InvalidDesign', faults: expect.arrayContaining([expect.objectContaining({ pointer: '#/illumination/positionMm/2' })]) });
  });
});
