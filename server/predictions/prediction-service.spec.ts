import { exampleEdition } from '../../shared/antenna/example-edition';
import type { DesignDocument } from '../../shared/model/design-document';
import { STARTING_DESIGN } from '../../shared/model/starting-design';
import { PredictionEngine, limitsFor } from '../engine/prediction-engine';
import type { PredictionRunner } from '../engine/prediction-runner';
import type { PredictionOutcome, PredictionTask } from '../engine/prediction-task';
import { createTaskAnswerer } from '../engine/answer-task';
import { InvalidInput, Superseded, TooMany } from '../http/problems';
import { InMemoryEditionSource } from './in-memory-edition-source';
import { PredictionService } from './prediction-service';

const EDITION = '00000000-0000-4000-8000-000000000001';
const onEdition: DesignDocument = { ...STARTING_DESIGN, cells: { kind: 'edition', editionId: EDITION, rule: 'nearest-phase', excludedCells: [] } };

/** Keeps what it was asked, and answers at once, or when `release` is called. */
class WatchedRunner implements PredictionRunner {
  readonly tasks: PredictionTask[] = [];
  private readonly answer = createTaskAnswerer();
  private readonly waiting: (() => void)[] = [];

  constructor(private readonly holds = false) {}

  run(task: PredictionTask): Promise<PredictionOutcome> {
    this.tasks.push(task);
    if (!this.holds) return Promise.resolve(this.answer(task));
    return new Promise((resolve) => this.waiting.push(() => resolve(this.answer(task))));
  }

  release(): void {
    for (const go of this.waiting.splice(0)) go();
  }

  close(): Promise<void> {
    return Promise.resolve();
  }
}

function serviceWith(runner: PredictionRunner): PredictionService {
  const editions = new InMemoryEditionSource();
  editions.add('team', EDITION, exampleEdition(), 'a'.repeat(64));
  return new PredictionService(new PredictionEngine(runner, limitsFor(1)), editions);
}

/** Sixteen cells: computed in a millisecond. */
const small: DesignDocument = { ...STARTING_DESIGN, panel: { ...STARTING_DESIGN.panel, outline: { kind: 'rectangle', widthMm: 20, heightMm: 20 } } };

const settle = (): Promise<void> => new Promise((resolve) => setImmediate(resolve));

/** Whole predictions, on a machine that may be busy. */
jest.setTimeout(30_000);

describe('PredictionService', () => {
  it('reads an edition once and hands the same shared memory to every task', async () => {
    const runner = new WatchedRunner();
    const service = serviceWith(runner);
    await service.predict('team', { design: onEdition });
    await service.predict('team', { design: onEdition });
    const [first, second] = runner.tasks.map(({ edition }) => edition);
    expect(first?.key).toBe(`${EDITION} ${'a'.repeat(64)}`);
    expect(first?.edition.responses.values.buffer).toBeInstanceOf(SharedArrayBuffer);
    expect(second).toBe(first);
  });

  it('names all faults of a design at once with the edition that it does not know', async () => {
    const { requirement, panel } = STARTING_DESIGN;
    const faulty: DesignDocument = {
      ...onEdition,
      requirement: { ...requirement, bandGHz: [29, 27] },
      panel: { ...panel, keepOuts: [{ kind: 'polygon', centreMm: [0, 0], pointsMm: [[0, 0], [9, 9], [9, 0], [0, 9]] }] },
    };
    await expect(serviceWith(new WatchedRunner()).predict('another team', { design: faulty })).rejects.toMatchObject({
      faults: [
        { pointer: '#/design/requirement/bandGHz', detail: 'must rise; got 29 to 27 GHz' },
        { pointer: '#/design/panel/keepOuts/0/pointsMm', detail: expect.stringContaining('crosses itself') },
        { pointer: '#/design/cells/editionId', detail: 'there is no such published edition' },
      ],
    });
  });

  it('knows no edition of another team', async () => {
    const runner = new WatchedRunner();
    await expect(serviceWith(runner).predict('other team', { design: onEdition })).rejects.toMatchObject({
      faults: [{ pointer: '#/design/cells/editionId', detail: 'there is no such published edition' }],
    });
    expect(runner.tasks).toEqual([]);
  });

  it('points faults of the design into the request', async () => {
    const design = { ...STARTING_DESIGN, panel: { ...STARTING_DESIGN.panel, outline: { kind: 'rectangle', widthMm: 1, heightMm: 1 } } } as const;
    const refusal = serviceWith(new WatchedRunner()).predict('team', { design });
    await expect(refusal).rejects.toBeInstanceOf(InvalidInput);
    await expect(refusal).rejects.toMatchObject({ faults: [{ pointer: '#/design/panel', detail: 'the outline is smaller than one period, so the panel has no cells' }] });
  });

  it('tells a replaced preview so', async () => {
    const runner = new WatchedRunner(true);
    const service = serviceWith(runner);
    const older = service.predict('team', { design: STARTING_DESIGN, preview: 'main' });
    await settle();
    const newer = service.predict('team', { design: STARTING_DESIGN, preview: 'main' });
    await settle();
    runner.release();
    await expect(older).rejects.toBeInstanceOf(Superseded);
    await settle();
    runner.release();
    expect((await newer).figures.cellCount).toBe(1600);
  });

  it('tells a team with a long line when to come back', async () => {
    const runner = new WatchedRunner(true);
    const service = serviceWith(runner);
    const running = Array.from({ length: 65 }, () => service.predict('team', { design: small }));
    await settle();
    const refusal = service.predict('team', { design: small });
    await expect(refusal).rejects.toBeInstanceOf(TooMany);
    await expect(refusal).rejects.toMatchObject({ message: 'Your team has 64 computations waiting already. Try again in 2 s.' });
    for (let i = 0; i < 65; i++) {
      runner.release();
      await settle();
    }
    expect(await Promise.all(running)).toHaveLength(65);
  });

  it('passes an unforeseen error on as it is', async () => {
    const broken: PredictionRunner = { run: () => Promise.reject(new Error('thread died')), close: () => Promise.resolve() };
    await expect(serviceWith(broken).predict('team', { design: STARTING_DESIGN })).rejects.toThrow('thread died');
  });
});
