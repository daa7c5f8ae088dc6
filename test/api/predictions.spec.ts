import { readBinaryBlock } from '../../shared/contracts/binary-block';
import { CELL_ARRAY_NAMES, CUT_ARRAY_NAMES, type PredictionHead, type PredictionReply } from '../../shared/contracts/predictions';
import type { DesignDocument } from '../../shared/model/design-document';
import { STARTING_DESIGN } from '../../shared/model/starting-design';
import { createInlineRunner, type PredictionRunner } from '../../server/engine/prediction-runner';
import type { PredictionOutcome, PredictionTask } from '../../server/engine/prediction-task';
import { Api, STRANGER } from '../support/api';
import type { Answer, ApiClient } from '../support/api-client';
import { expectInvalid, expectNotAllowed, expectNotSignedIn, expectProblem, problemOf } from '../support/problems';
import { acceptedEdition, onEdition, publishedEdition } from '../support/published-edition';

const NOBODY = 'b3f1c9a0-0000-4000-8000-000000000000';
const BLOCK = { accept: 'application/octet-stream' };
const sized = (widthMm: number, heightMm: number): DesignDocument => ({
  ...STARTING_DESIGN,
  panel: { ...STARTING_DESIGN.panel, outline: { kind: 'rectangle', widthMm, heightMm } },
});

/** A runner whose work waits until it is let go. */
class HeldRunner implements PredictionRunner {
  count = 0;
  private held = true;
  private readonly inner = createInlineRunner();

  async run(task: PredictionTask, signal: AbortSignal): Promise<PredictionOutcome> {
    this.count += 1;
    while (this.held) await pause();
    return this.inner.run(task, signal);
  }

  async begun(count: number): Promise<void> {
    while (this.count < count) await pause();
  }

  /** Long enough for a request on this machine to arrive. */
  async settled(): Promise<void> {
    for (let i = 0; i < 30; i++) await pause();
  }

  release(): void {
    this.held = false;
  }

  close(): Promise<void> {
    return this.inner.close();
  }
}

const pause = (): Promise<void> => new Promise((resolve) => setTimeout(resolve, 10));

/** Predictions run in the test's own thread here, several to a test. */
jest.setTimeout(30_000);

describe('predictions', () => {
  let api: Api;
  let designer: ApiClient;
  beforeAll(async () => {
    api = await Api.start();
    designer = await api.signedIn('designer');
  }, 60_000);
  afterAll(() => api.close());

  const predict = (body: unknown, headers: Record<string, string> = {}, client = designer): Promise<Answer> => client.post('/api/predictions', body, { headers });

  it('answers figures without storing anything, to a session and to a token with the scope', async () => {
    const answer = await predict({ design: STARTING_DESIGN });
    const reply = answer.json as PredictionReply;
    expect(Object.keys(reply)).toEqual(['engineVersion', 'figures', 'verdicts', 'warnings']);
    // 1600 cells of 25 mm2 at 28 GHz could give 36.4 dBi; taper, spillover and the oblique beam take 0.2 to 3 dB.
    expect(reply.figures).toMatchObject({ cellCount: 1600, peakThetaDeg: expect.closeTo(20, 0) as number });
    expect(reply.figures.directivityDbi).toBeGreaterThan(34);
    expect(reply.figures.directivityDbi).toBeLessThan(36.5);
    const script = await api.withToken('designer', ['predict']);
    expect((await predict({ design: STARTING_DESIGN }, {}, script)).json).toEqual(reply);
    expect(await api.query('SELECT 1 FROM result')).toEqual([]);
  });

  it('is refused without a session, and to a token without the scope', async () => {
    expectNotSignedIn(await predict({ design: STARTING_DESIGN }, {}, api.anonymous()));
    const script = await api.withToken('designer', ['read']);
    expectNotAllowed(await predict({ design: STARTING_DESIGN }, {}, script), 'The personal token lacks the scope "predict".');
  });

  it('gives the same numbers as JSON and as a binary block', async () => {
    const body = {
      design: STARTING_DESIGN,
      include: ['cells', 'cuts', 'uv'],
      cuts: [{ phiDeg: 0, thetaDeg: [-90, 90, 1] }, { plane: 'across', angleDeg: [-20, 20, 0.5] }],
      uvSize: 32,
      frequencyGHz: 28.2,
    };
    const json = (await predict(body)).json as PredictionReply;
    const answer = await predict(body, BLOCK);
    expect(answer.headers.get('content-type')).toBe('application/octet-stream');
    const block = readBinaryBlock(new Uint8Array(answer.bytes).buffer);
    const head = block.head as PredictionHead;
    expect({ figures: head.figures, verdicts: head.verdicts, warnings: head.warnings }).toEqual({ figures: json.figures, verdicts: json.verdicts, warnings: json.warnings });
    const numbers = (name: string): number[] => Array.from(block.arrays[name] ?? []);
    for (const name of CELL_ARRAY_NAMES) expect(numbers(`cells.${name}`)).toEqual(json.cells?.[name]);
    json.cuts?.forEach((cut, i) => CUT_ARRAY_NAMES.forEach((name) => expect(numbers(`cuts.${i}.${name}`)).toEqual(cut[name])));
    expect(json.cuts?.map(({ angleDeg }) => angleDeg.length)).toEqual([181, 81]);
    expect(numbers('uv.gainDbi')).toEqual(json.uv?.gainDbi);
    expect([head.cellCount, head.uv?.size, json.figures.frequencyGHz]).toEqual([1600, 32, 28.2]);
  });

  it('gives the same answer to the same question', async () => {
    const body = { design: STARTING_DESIGN, include: ['cells', 'uv'], uvSize: 16 };
    expect((await predict(body, BLOCK)).bytes.equals((await predict(body, BLOCK)).bytes)).toBe(true);
  });

  it('predicts with the cells of a published edition of the team, and of no other', async () => {
    const { id } = await publishedEdition(api);
    const ideal = (await predict({ design: STARTING_DESIGN })).json as PredictionReply;
    const real = (await predict({ design: onEdition(id) })).json as PredictionReply;
    // Four states 90 degrees apart leave an error that is even over +-45 degrees: 26 degrees RMS.
    expect(real.figures.phaseErrorRmsDeg).toBeGreaterThan(15);
    expect(ideal.figures.phaseErrorRmsDeg).toBe(0);
    const unknown = [{ pointer: '#/design/cells/editionId', detail: 'there is no such published edition' }];
    expectInvalid(await predict({ design: onEdition(NOBODY) }), unknown);
    expectInvalid(await predict({ design: onEdition(id) }, {}, await api.signedIn(STRANGER)), unknown);
    expectInvalid(await predict({ design: onEdition((await acceptedEdition(api)).id) }), unknown);
  });

  it('names every fault of a design that does not hold together', async () => {
    const design = {
      ...STARTING_DESIGN,
      requirement: { ...STARTING_DESIGN.requirement, bandGHz: [30, 29] },
      illumination: { ...STARTING_DESIGN.illumination, positionMm: [-60, 0, 0] },
    };
    const answer = await predict({ design });
    expect(answer.status).toBe(422);
    const { errors } = answer.json as { errors: { pointer: string }[] };
    expect(errors.map(({ pointer }) => pointer).sort()).toEqual(['#/design/illumination/positionMm/2', '#/design/requirement/bandGHz']);
  });

  it('refuses unknown fields and numbers out of range, each by its pointer', async () => {
    const answer = await predict({ design: { ...STARTING_DESIGN, more: 1, referencePhaseDeg: 400 }, include: ['cells', 'soup'] });
    const { errors } = answer.json as { errors: { pointer: string }[] };
    expect([answer.status, errors.map(({ pointer }) => pointer).sort()]).toEqual([422, ['#/design/more', '#/design/referencePhaseDeg', '#/include/1']]);
  });

  it('refuses ten million cells before any memory is taken', async () => {
    const before = process.memoryUsage().rss;
    const answer = await predict({ design: sized(5 * 5000, 5 * 2000) });
    expectInvalid(answer, [{ pointer: '#/design/panel', detail: 'the panel would have 10000000 cells; the limit is 1000000' }]);
    expect(process.memoryUsage().rss - before).toBeLessThan(50e6);
  });

  it('refuses what would take too long or fill too much', async () => {
    expectInvalid(await predict({ design: STARTING_DESIGN, include: ['cuts'], cuts: [{ phiDeg: 0, thetaDeg: [-180, 180, 0.001] }] }), [
      { pointer: '#/cuts', detail: 'would have 360001 samples; the limit is 200000' },
    ]);
    const answer = await predict({ design: sized(5 * 1000, 5 * 1000), include: ['cells'] });
    const detail = 'Up to 12000000 numbers are too many for JSON, the limit is 2500000: ask with Accept: application/octet-stream.';
    expectProblem(answer, problemOf('not-acceptable', 406, detail));
  });

  it('lets a newer preview of a session take the place of an older one of the same name', async () => {
    const held = new HeldRunner();
    const holding = await Api.start({ predictionRunner: held });
    try {
      const client = await holding.signedIn('designer');
      const preview = (name: string): Promise<Answer> => predict({ design: STARTING_DESIGN }, { 'slantwise-preview': name }, client);
      // One place in the house: the first runs, the others wait.
      const running = preview('first');
      await held.begun(1);
      const older = preview('steering');
      const other = preview('other');
      // A newer request counts only once the older one has arrived.
      await held.settled();
      const newer = preview('steering');
      expectProblem(await older, problemOf('superseded', 409, 'A newer preview of the same name took its place.'));
      held.release();
      expect((await Promise.all([running, other, newer])).map(({ status }) => status)).toEqual([200, 200, 200]);
      expect(held.count).toBe(3);
      expectInvalid(await preview(' '), [{ pointer: 'Slantwise-Preview', detail: 'must have 1 to 80 visible ASCII characters' }]);
    } finally {
      await holding.close();
    }
  }, 60_000);

  it('is limited in rate, and says when to come back', async () => {
    const few = { windowSeconds: 60, count: 2 };
    const plenty = { windowSeconds: 60, count: 1000 };
    const limited = await Api.start({ rateLimits: { general: plenty, 'sign-in': plenty, letter: plenty, upload: plenty, compute: few, export: plenty } });
    try {
      const client = await limited.signedIn('designer');
      const statuses = [];
      for (let i = 0; i < 3; i++) statuses.push((await predict({ design: STARTING_DESIGN }, {}, client)).status);
      expect(statuses).toEqual([200, 200, 429]);
    } finally {
      await limited.close();
    }
  }, 60_000);
});
