import { STARTING_DESIGN } from '../../shared/model/starting-design';
import { createTaskAnswerer } from './answer-task';
import { PredictionEngine, limitsFor } from './prediction-engine';
import { createInlineRunner, type PredictionRunner } from './prediction-runner';
import type { PredictionOutcome, PredictionTask } from './prediction-task';

/** A runner whose tasks end when told to. */
class HeldRunner implements PredictionRunner {
  readonly tasks: { task: PredictionTask; finish: () => void }[] = [];
  private readonly answer = createTaskAnswerer();

  run(task: PredictionTask): Promise<PredictionOutcome> {
    return new Promise((resolve) => {
      this.tasks.push({ task, finish: () => resolve(this.answer(task)) });
    });
  }

  close(): Promise<void> {
    return Promise.resolve();
  }
}

const question = { design: STARTING_DESIGN } as const;
const settle = (): Promise<void> => new Promise((resolve) => setImmediate(resolve));
const engineWith = (runner: PredictionRunner): PredictionEngine => new PredictionEngine(runner, limitsFor(1));

/** Whole predictions, on a machine that may be busy. */
jest.setTimeout(30_000);

describe('PredictionEngine', () => {
  it('gives the figures, and arrays only where asked for', async () => {
    const engine = engineWith(createInlineRunner());
    const bare = await engine.predict({ teamId: 'a', question });
    expect(bare.figures.cellCount).toBe(1600);
    expect(Object.keys(bare)).toEqual(['figures', 'verdicts', 'warnings']);
    const full = await engine.predict({ teamId: 'a', question: { ...question, cells: true, uvSize: 16, cuts: [{ plane: 'across', angleDeg: [-10, 10, 1] }] } });
    expect([full.cells?.xMm.length, full.cuts?.[0]?.gainDbi.length, full.uv?.gainDbi.length]).toEqual([1600, 21, 256]);
  });

  it('replaces a preview that has not started by the newest of its name, and leaves other names alone', async () => {
    const runner = new HeldRunner();
    const engine = engineWith(runner);
    const running = engine.predict({ teamId: 'a', question });
    const older = engine.predict({ teamId: 'a', question, preview: 'session main' });
    const other = engine.predict({ teamId: 'a', question, preview: 'session detail' });
    const newer = engine.predict({ teamId: 'a', question, preview: 'session main' });
    await expect(older).rejects.toMatchObject({ kind: 'superseded' });
    for (let i = 0; i < 3; i++) {
      await settle();
      runner.tasks[i].finish();
    }
    const answers = await Promise.all([running, other, newer]);
    expect(answers.map(({ figures }) => figures.cellCount)).toEqual([1600, 1600, 1600]);
    expect(runner.tasks).toHaveLength(3);
  });

  it('asks a running preview to stop when a newer one arrives', async () => {
    const runner = new HeldRunner();
    const engine = engineWith(runner);
    const older = engine.predict({ teamId: 'a', question, preview: 'main' });
    await settle();
    const newer = engine.predict({ teamId: 'a', question, preview: 'main' });
    expect(Atomics.load(runner.tasks[0].task.stop, 0)).toBe(1);
    runner.tasks[0].finish();
    await expect(older).rejects.toMatchObject({ kind: 'superseded' });
    await settle();
    runner.tasks[1].finish();
    expect((await newer).figures.cellCount).toBe(1600);
  });

  it('keeps the order of previews even when the older one waits for its edition', async () => {
    const runner = new HeldRunner();
    const engine = engineWith(runner);
    const edition = async (): Promise<never> => {
      await settle();
      await settle();
      throw new Error('fetched too late to matter');
    };
    const older = engine.predict({ teamId: 'a', question, edition, preview: 'main' });
    const newer = engine.predict({ teamId: 'a', question, preview: 'main' });
    await expect(older).rejects.toThrow();
    runner.tasks[0].finish();
    expect((await newer).figures.cellCount).toBe(1600);
  });

  it('lets a running preview answer that is past its last step, so that steady steering shows something', async () => {
    const answer = createTaskAnswerer();
    const answers: (() => void)[] = [];
    const runner: PredictionRunner = {
      run: (task) => {
        const outcome = answer(task);
        return new Promise((resolve) => answers.push(() => resolve(outcome)));
      },
      close: () => Promise.resolve(),
    };
    const engine = engineWith(runner);
    const older = engine.predict({ teamId: 'a', question, preview: 'main' });
    await settle();
    const newer = engine.predict({ teamId: 'a', question, preview: 'main' });
    answers[0]();
    expect((await older).figures.cellCount).toBe(1600);
    await settle();
    answers[1]();
    expect((await newer).figures.cellCount).toBe(1600);
  });

  it('stops at the flag before it takes memory', () => {
    expect(createTaskAnswerer()({ ...question, edition: null, stop: Int32Array.of(1) })).toEqual({ kind: 'stopped' });
  });

  it('drops what nobody waits for any more', async () => {
    const runner = new HeldRunner();
    const engine = engineWith(runner);
    const gone = new AbortController();
    const running = engine.predict({ teamId: 'a', question });
    const left = engine.predict({ teamId: 'a', question, signal: gone.signal });
    gone.abort();
    await expect(left).rejects.toMatchObject({ kind: 'abandoned' });
    await settle();
    runner.tasks[0].finish();
    await running;
    expect(runner.tasks).toHaveLength(1);
  });

  it('names the faults of an invalid design', async () => {
    const design = { ...STARTING_DESIGN, panel: { ...STARTING_DESIGN.panel, outline: { kind: 'rectangle', widthMm: 1, heightMm: 1 } } } as const;
    await expect(engineWith(createInlineRunner()).predict({ teamId: 'a', question: { design } })).rejects.toMatchObject({
      faults: [{ pointer: '#/panel', detail: 'the outline is smaller than one period, so the panel has no cells' }],
    });
  });

  it('refuses ten million cells with the count and the limit, without asking a thread', async () => {
    const runner = new HeldRunner();
    const outline = { kind: 'rectangle', widthMm: 16_000, heightMm: 16_000 } as const;
    const design = { ...STARTING_DESIGN, panel: { ...STARTING_DESIGN.panel, outline } };
    await expect(engineWith(runner).predict({ teamId: 'a', question: { design } })).rejects.toMatchObject({
      faults: [{ pointer: '#/panel', detail: 'the panel would have 10240000 cells; the limit is 1000000' }],
    });
    expect(runner.tasks).toEqual([]);
  });

  it('refuses an outline whose testing alone would take minutes, by its cost', async () => {
    const runner = new HeldRunner();
    const pointsMm = Array.from({ length: 1000 }, (_, i): [number, number] => [50 * Math.cos((i * Math.PI) / 500), 50_000 * Math.sin((i * Math.PI) / 500)]);
    const lattice = { kind: 'rectangular', periodXMm: 100, periodYMm: 0.03 } as const;
    const keepOuts = Array.from({ length: 200 }, () => ({ kind: 'polygon', pointsMm, centreMm: [0, 0] as [number, number] }) as const);
    const design = { ...STARTING_DESIGN, panel: { ...STARTING_DESIGN.panel, outline: { kind: 'polygon', pointsMm } as const, lattice, keepOuts } };
    await expect(engineWith(runner).predict({ teamId: 'a', question: { design } })).rejects.toMatchObject({ kind: 'too-costly' });
    expect(runner.tasks).toEqual([]);
  });

  it('passes an unforeseen error on', async () => {
    const runner: PredictionRunner = { run: () => Promise.reject(new Error('thread died')), close: () => Promise.resolve() };
    await expect(engineWith(runner).predict({ teamId: 'a', question })).rejects.toThrow('thread died');
  });
});
