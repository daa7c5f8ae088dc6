import { predictDesign, type Prediction } from '../../shared/antenna/predict-design';
import type { Verdict } from '../../shared/model/figures';
import { STARTING_DESIGN } from '../../shared/model/starting-design';
import type { TransactionRunner } from '../database/transaction-runner';
import { InvalidInput } from '../http/problems';
import { FigureService, overallVerdict, type HashedDesign } from './figure-service';

const verdict = (word: Verdict['verdict']): Verdict => ({ line: 'gain', sense: 'at-least', limit: 30, unit: 'dBi', value: 31, margin: 1, verdict: word });

describe('overallVerdict', () => {
  it.each([
    [['meets', 'meets'], 'meets'],
    [['meets', 'not-evaluated'], 'not-evaluated'],
    [['not-evaluated', 'falls-short', 'meets'], 'falls-short'],
    [[], 'not-evaluated'],
  ] as const)('of %j is %s', (words, overall) => {
    expect(overallVerdict(words.map(verdict))).toBe(overall);
  });
});

/** A database that remembers nothing. */
const forgetful = { run: () => Promise.resolve(undefined), read: () => Promise.resolve(null) } as unknown as TransactionRunner;
const design = (name: string): HashedDesign => ({ design: STARTING_DESIGN, hash: name });
const prediction = predictDesign(STARTING_DESIGN, { include: {} });

describe('headlinesOf', () => {
  const serviceOn = (predict: () => Promise<Prediction>): FigureService => new FigureService({ transactions: forgetful, now: () => new Date() }, { predict }, 50);

  it('gives the figures that are there and says which are pending, without waiting for them', async () => {
    let asked = 0;
    const service = serviceOn(() => (++asked === 2 ? new Promise(() => undefined) : Promise.resolve(prediction)));
    const headlines = await service.headlinesOf('team', [design('a'), design('slow'), design('c')]);
    expect(headlines.map(({ summary, summaryPending }) => [summary?.cellCount, summaryPending])).toEqual([[1600, undefined], [undefined, true], [1600, undefined]]);
  });

  it('computes once for all who ask meanwhile', async () => {
    let asked = 0;
    let finish: (value: Prediction) => void = () => undefined;
    const service = serviceOn(() => {
      asked += 1;
      return new Promise((resolve) => (finish = resolve));
    });
    const first = await service.headlinesOf('team', [design('a'), design('a')]);
    const second = service.headlinesOf('team', [design('a')]);
    finish(prediction);
    expect([first[0].summaryPending, (await second)[0].summary?.cellCount, asked]).toEqual([true, 1600, 1]);
  });

  it('tells the remarks that are more than notes, where and why', async () => {
    const remark = { code: 'grating-lobe', pointer: '/panel/lattice', message: 'a second beam', numbers: { thetaDeg: 40 } } as const;
    const warnings = [{ ...remark, severity: 'note' as const }, { ...remark, severity: 'warn' as const }];
    const [{ summary }] = await serviceOn(() => Promise.resolve({ ...prediction, warnings })).headlinesOf('team', [design('a')]);
    expect(summary?.remarks).toEqual([{ pointer: '/panel/lattice', severity: 'warn', message: 'a second beam' }]);
  });

  it('has no summary for a design that cannot be predicted, and passes other errors on', async () => {
    const unfit = serviceOn(() => Promise.reject(new InvalidInput([{ pointer: '#/design', detail: 'no' }])));
    expect(await unfit.headlinesOf('team', [design('a')])).toEqual([{ summary: null }]);
    await expect(serviceOn(() => Promise.reject(new Error('broken'))).headlinesOf('team', [design('a')])).rejects.toThrow('broken');
  });
});
