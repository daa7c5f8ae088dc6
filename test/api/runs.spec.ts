import type { RunDetail, RunSummary } from '../../shared/contracts/runs';
import type { BandResult } from '../../shared/model/band-run';
import type { DesignDocument } from '../../shared/model/design-document';
import { STARTING_DESIGN } from '../../shared/model/starting-design';
import { Api, STRANGER } from '../support/api';
import type { ApiClient } from '../support/api-client';
import { bodyOf, draw, freeze, newPanel } from '../support/panels';
import { expectInvalid, expectNotAllowed, expectNotFound, expectProblem, problemOf } from '../support/problems';
import { PacedRunner, isOver, runThat, startWorker } from '../support/run-worker';

const NOBODY = 'b3f1c9a0-0000-4000-8000-000000000000';
/** Sixteen cells: a frequency takes a millisecond. */
const small: DesignDocument = {
  ...STARTING_DESIGN,
  requirement: { ...STARTING_DESIGN.requirement, bandGHz: [27, 29] },
  panel: { ...STARTING_DESIGN.panel, outline: { kind: 'rectangle', widthMm: 20, heightMm: 20 } },
};
const band = (frequencyCount: number): object => ({ kind: 'band', parameters: { frequencyCount } });
/** Some thirty frequencies go into a chunk of so small a panel. */
const THREE_CHUNKS = band(95);

const start = async (client: ApiClient, panelId: string, request: object): Promise<RunDetail> => bodyOf<RunDetail>(await client.post(`/api/panels/${panelId}/runs`, request), 202);

describe('runs', () => {
  let api: Api;
  let designer: ApiClient;
  beforeAll(async () => {
    api = await Api.start({ environment: { SLANTWISE_RUN_EXPIRY: '2' } });
    designer = await api.signedIn('designer');
  }, 60_000);
  afterAll(() => api.close());

  it('accepts with 202 and an address, computes in a worker, keeps who, when, of what', async () => {
    const panel = await newPanel(designer, small);
    const answer = await designer.post(`/api/panels/${panel.id}/runs`, band(5));
    const accepted = bodyOf<RunDetail>(answer, 202);
    expect(answer.headers.get('location')).toBe(`/api/runs/${accepted.id}`);
    expect(accepted.progress).toEqual({ state: 'queued', stage: 'waiting: no worker is running', fraction: 0, secondsLeft: null, queuePosition: 1, restarts: 0 });
    const worker = await startWorker(api);
    const done = await runThat(designer, accepted.id, isOver);
    await worker.stop();
    expect(done).toMatchObject({ kind: 'band', panelId: panel.id, panelName: 'Panel', source: { kind: 'draft', version: 1 }, reused: false, failure: null });
    expect(done.progress).toEqual({ state: 'done', stage: 'done', fraction: 1, secondsLeft: 0, queuePosition: null, restarts: 0 });
    const result = done.answer.result as BandResult;
    expect(result.points.map(({ frequencyGHz }) => frequencyGHz)).toEqual([27, 27.5, 28, 28.5, 29]);
    expect(await api.query('SELECT count(*)::int AS chunks FROM run_chunk')).toEqual([{ chunks: 0 }]);
  });

  it('answers a repetition at once, as a run of its own, without computing', async () => {
    const panel = await newPanel(designer, small);
    const again = await start(designer, panel.id, band(5));
    expect(again).toMatchObject({ reused: true, progress: { state: 'done' } });
    expect((again.answer.result as BandResult).points).toHaveLength(5);
  });

  it('lists newest first, by kind and revision, in pages', async () => {
    const panel = await newPanel(designer, small);
    const revision = await freeze(designer, panel.id);
    const [first, second] = [await start(designer, panel.id, band(5)), await start(designer, panel.id, { ...band(5), revisionId: revision.id })];
    expect(second.source).toEqual({ kind: 'revision', revisionId: revision.id, number: 1 });
    expect(second.contentHash).toBe(revision.hash);
    const page = bodyOf<{ items: RunSummary[]; next: string }>(await designer.get(`/api/panels/${panel.id}/runs?limit=1`), 200);
    expect(page.items.map(({ id }) => id)).toEqual([second.id]);
    const rest = bodyOf<{ items: RunSummary[]; next: null }>(await designer.get(`/api/panels/${panel.id}/runs?limit=1&after=${page.next}`), 200);
    expect(rest).toMatchObject({ items: [{ id: first.id }], next: null });
    const ofRevision = bodyOf<{ items: RunSummary[] }>(await designer.get(`/api/panels/${panel.id}/runs?kind=band&revisionId=${revision.id}`), 200);
    expect(ofRevision.items.map(({ id }) => id)).toEqual([second.id]);
    expect(bodyOf<{ items: RunSummary[] }>(await designer.get('/api/runs?limit=1'), 200).items[0].id).toBe(second.id);
  });

  it('names every fault before anything is stored', async () => {
    const count = (await api.query('SELECT count(*)::int AS n FROM run'))[0];
    const panel = await newPanel(designer, { ...small, requirement: { ...STARTING_DESIGN.requirement, bandGHz: undefined } });
    const path = `/api/panels/${panel.id}/runs`;
    expectInvalid(await designer.post(path, { kind: 'band', parameters: { frequencyCount: 5, phaseCentre: [[28, 0], [27, 0]] } }), [
      { pointer: '#/parameters/bandGHz', detail: 'say the band: the requirement names none' },
      { pointer: '#/parameters/phaseCentre/1/0', detail: 'frequencies must rise; got 27 after 28 GHz' },
    ]);
    expect((await designer.post(path, { kind: 'band', parameters: { frequencyCount: 2 } })).status).toBe(422);
    expectInvalid(await designer.post(path, { ...band(5), revisionId: (await freeze(designer, (await newPanel(designer, small)).id)).id }), [{ pointer: '#/revisionId', detail: 'is a revision of another panel' }]);
    expectNotFound(await designer.post(`/api/panels/${NOBODY}/runs`, band(5)), 'panel');
    expect((await api.query('SELECT count(*)::int AS n FROM run'))[0]).toEqual(count);
  });

  it('refuses what would take more than an hour of computing', async () => {
    const huge: DesignDocument = { ...small, panel: { ...small.panel, outline: { kind: 'rectangle', widthMm: 5000, heightMm: 5000 } } };
    const panel = await newPanel(designer, huge);
    const answer = await designer.post(`/api/panels/${panel.id}/runs`, { kind: 'band', parameters: { frequencyCount: 401, spatialPart: true } });
    expectInvalid(answer, [{ pointer: '#/parameters', detail: expect.stringMatching(/^would take about \d+ s of computing; the limit is 3600 s$/) as string }]);
  });

  it('gives the run under way to whoever asks for the same, and one reply to one Idempotency-Key', async () => {
    const panel = await newPanel(designer, small);
    const headers = { 'idempotency-key': 'a key of this test' };
    expectInvalid(await designer.post(`/api/panels/${panel.id}/runs`, band(31), { headers }), [{ pointer: 'Idempotency-Key', detail: 'must have 8 to 200 visible ASCII characters, best a random id' }]);
    const key = { 'idempotency-key': 'key-of-this-test' };
    const first = bodyOf<RunDetail>(await designer.post(`/api/panels/${panel.id}/runs`, band(31), { headers: key }), 202);
    const again = await designer.post(`/api/panels/${panel.id}/runs`, band(31), { headers: key });
    expect(again.headers.get('idempotency-replayed')).toBe('true');
    expect([bodyOf<RunDetail>(again, 202).id, (await start(await api.signedIn('reviewer'), panel.id, band(31))).id]).toEqual([first.id, first.id]);
    await designer.post(`/api/runs/${first.id}/cancellation`);
  });

  it('gives the same bits with 1, 2 and 4 workers', async () => {
    const results: string[] = [];
    for (const workers of [1, 2, 4]) {
      const panel = await newPanel(designer, small);
      await api.query('DELETE FROM result');
      const runner = new PacedRunner(30);
      const all = await Promise.all(Array.from({ length: workers }, () => startWorker(api, runner)));
      const done = await runThat(designer, (await start(designer, panel.id, THREE_CHUNKS)).id, isOver);
      await Promise.all(all.map((worker) => worker.stop()));
      expect(runner.tasks.length).toBeGreaterThanOrEqual(3);
      results.push(JSON.stringify(done.answer.result));
    }
    expect(results[1]).toBe(results[0]);
    expect(results[2]).toBe(results[0]);
  }, 60_000);

  it('tells of progress in events and ends the stream with the run', async () => {
    const panel = await newPanel(designer, small);
    await api.query('DELETE FROM result');
    const run = await start(designer, panel.id, THREE_CHUNKS);
    const events = designer.get(`/api/runs/${run.id}/events`);
    const worker = await startWorker(api, new PacedRunner(500));
    const answer = await events;
    await worker.stop();
    expect(answer.headers.get('content-type')).toBe('text/event-stream');
    const told = [...answer.bytes.toString('utf8').matchAll(/^event: progress\ndata: (.*)$/gm)].map(([, data]) => JSON.parse(data) as RunDetail['progress']);
    expect(told[0]).toMatchObject({ state: 'queued', queuePosition: 1 });
    const fractions = told.map(({ fraction }) => fraction);
    expect(fractions).toEqual([...fractions].sort((a, b) => a - b));
    expect(told.some(({ stage, secondsLeft }) => /^computing: [12] of 3 parts done$/.test(stage) && secondsLeft !== null)).toBe(true);
    expect(told.at(-1)).toMatchObject({ state: 'done', fraction: 1 });
  }, 30_000);

  it('frees the worker within two seconds of a cancellation', async () => {
    const panel = await newPanel(designer, small);
    await api.query('DELETE FROM result');
    const runner = new PacedRunner(60_000);
    const worker = await startWorker(api, runner);
    const run = await start(designer, panel.id, THREE_CHUNKS);
    while (runner.tasks.length === 0) await new Promise((resolve) => setTimeout(resolve, 20));
    const asked = Date.now();
    expect(bodyOf<RunDetail>(await designer.post(`/api/runs/${run.id}/cancellation`), 200).progress).toMatchObject({ state: 'cancelled', stage: 'cancelled' });
    expectProblem(await designer.post(`/api/runs/${run.id}/cancellation`), problemOf('conflict', 409, 'The run is over: it is cancelled.'));
    await worker.stop();
    expect(Date.now() - asked).toBeLessThan(2000);
    expect(await api.query(`SELECT count(*)::int AS active FROM pgboss.job WHERE state = 'active'`)).toEqual([{ active: 0 }]);
  });

  it('lets only who started it, a designer or an administrator cancel', async () => {
    const panel = await newPanel(designer, small);
    const run = await start(designer, panel.id, band(33));
    expectNotAllowed(await (await api.signedIn('reviewer')).post(`/api/runs/${run.id}/cancellation`), 'Only who started a run, a designer or an administrator may cancel it.');
    expectNotFound(await (await api.signedIn(STRANGER)).post(`/api/runs/${run.id}/cancellation`), 'run');
    await designer.post(`/api/runs/${run.id}/cancellation`);
  });

  it('drops the late part of a worker that was taken for dead', async () => {
    const panel = await newPanel(designer, small);
    const run = await start(designer, panel.id, band(34));
    const { runQueue, runChunks } = api.house;
    let job = await runQueue.take();
    // Messages of runs that were cancelled stand before it.
    while (job !== null && job.data.runId !== run.id) job = await runQueue.take();
    if (job === null || job.data.step !== 'chunk') throw new Error('there is no chunk to take');
    const first = await runChunks.begin(job, job.data.number, 'first');
    const second = await runChunks.begin(job, job.data.number, 'second');
    if (first === null || second === null) throw new Error('the chunk was not given');
    expect([first.attempt, second.attempt]).toEqual([1, 2]);
    await runChunks.finish(job, first, ['late']);
    expect(bodyOf<RunDetail>(await designer.get(`/api/runs/${run.id}`), 200).progress).toMatchObject({ fraction: 0, restarts: 1 });
    await designer.post(`/api/runs/${run.id}/cancellation`);
  });

  it('fails a run whose arithmetic breaks off, with an id that the log knows', async () => {
    const panel = await newPanel(designer, small);
    const worker = await startWorker(api, { run: () => Promise.reject(new Error('thread died')), close: () => Promise.resolve() });
    const failed = await runThat(designer, (await start(designer, panel.id, band(35))).id, isOver);
    await worker.stop();
    expect(failed).toMatchObject({ progress: { state: 'failed' }, failure: { message: 'The computation broke off. Start the run again; if it fails again, report the id.', id: expect.stringMatching(/^[0-9a-f-]{36}$/) as string } });
  });

  it('starts a small run of another team within 5 s of a flood, and refuses the flood beyond its cap', async () => {
    await api.query('DELETE FROM result');
    const stranger = await api.signedIn(STRANGER);
    const [mine, theirs] = [await newPanel(designer, small), await newPanel(stranger, small)];
    const ids: string[] = [];
    for (let i = 0; i < 20; i++) ids.push((await start(designer, mine.id, band(3 + i))).id);
    expectProblem(await designer.post(`/api/panels/${mine.id}/runs`, band(200)), problemOf('too-many', 429, 'Your team has 20 runs waiting or under way already. Try again in 10 s.'));
    const worker = await startWorker(api, new PacedRunner(400));
    const asked = Date.now();
    const run = await runThat(stranger, (await start(stranger, theirs.id, band(4))).id, ({ startedAt }) => startedAt !== null);
    expect(Date.now() - asked).toBeLessThan(5000);
    await runThat(stranger, run.id, isOver);
    for (const id of ids) await designer.post(`/api/runs/${id}/cancellation`);
    await worker.stop();
  }, 60_000);

  it('keeps what was computed when the draft moves on', async () => {
    const panel = await newPanel(designer, small);
    const run = await start(designer, panel.id, band(36));
    await draw(designer, panel.id, { ...small, referencePhaseDeg: 90 });
    const later = await start(designer, panel.id, band(36));
    expect(later.contentHash).not.toBe(run.contentHash);
    for (const { id } of [run, later]) await designer.post(`/api/runs/${id}/cancellation`);
  });
});
