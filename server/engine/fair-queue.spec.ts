import { FairQueue } from './fair-queue';

/** A work that ends when told to. */
function heldWork(started: string[], name: string): { work: () => Promise<string>; release: () => void } {
  let resolve: (name: string) => void = () => undefined;
  const promise = new Promise<string>((settle) => {
    resolve = settle;
  });
  return {
    work: () => {
      started.push(name);
      return promise;
    },
    release: () => resolve(name),
  };
}

const settle = (): Promise<void> => new Promise((resolve) => setImmediate(resolve));

describe('FairQueue', () => {
  it('lets a small team start before the rest of a flood of another', async () => {
    const queue = new FairQueue({ concurrency: 1, perTeam: 1, waitingPerTeam: 2000 });
    const started: string[] = [];
    const flood = Array.from({ length: 1000 }, (_, i) => queue.run('flood', async () => void started.push(`flood ${i}`)));
    const small = queue.run('small', async () => void started.push('small'));
    await small;
    expect(started.indexOf('small')).toBeLessThanOrEqual(1);
    await Promise.all(flood);
    expect(started).toHaveLength(1001);
  });

  it('leaves one place of two to other teams', async () => {
    const queue = new FairQueue({ concurrency: 2, perTeam: 1, waitingPerTeam: 10 });
    const started: string[] = [];
    const held = ['a1', 'a2', 'b1'].map((name) => ({ name, ...heldWork(started, name) }));
    const runs = held.map(({ name, work }) => queue.run(name[0], work));
    await settle();
    expect(started).toEqual(['a1', 'b1']);
    for (const { release } of held) release();
    expect(await Promise.all(runs)).toEqual(['a1', 'a2', 'b1']);
  });

  it('turns away what is beyond the waiting line, except the patient', async () => {
    const queue = new FairQueue({ concurrency: 1, perTeam: 1, waitingPerTeam: 1 });
    const first = heldWork([], 'first');
    const runs = [queue.run('a', first.work), queue.run('a', async () => 'second')];
    await expect(queue.run('a', async () => 'third')).rejects.toMatchObject({ kind: 'busy', message: 'Your team has 1 computations waiting already.' });
    runs.push(queue.run('a', async () => 'patient', { patient: true }));
    first.release();
    expect(await Promise.all(runs)).toEqual(['first', 'second', 'patient']);
  });

  it('takes the higher priority first, and lets one leave the line', async () => {
    const queue = new FairQueue({ concurrency: 1, perTeam: 1, waitingPerTeam: 10 });
    const started: string[] = [];
    const first = heldWork(started, 'first');
    const leaving = new AbortController();
    const runs = [
      queue.run('a', first.work),
      queue.run('a', async () => void started.push('low')),
      queue.run('a', async () => void started.push('high'), { priority: 1 }),
    ];
    const left = queue.run('a', async () => void started.push('left'), { signal: leaving.signal });
    leaving.abort(new Error('gone'));
    await expect(left).rejects.toThrow('gone');
    first.release();
    await Promise.all(runs);
    expect(started).toEqual(['first', 'high', 'low']);
  });
});
