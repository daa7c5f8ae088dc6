import { Subject, of, timer } from 'rxjs';
import { map } from 'rxjs';
import type { Problem } from '../../../shared/contracts/common';
import { predictionRequest } from '../../../shared/contracts/predictions';
import type { PredictionRequest } from '../../../shared/contracts/predictions';
import { replacedAt } from '../../../shared/model/design-pointer';
import { STARTING_DESIGN } from '../../../shared/model/starting-design';
import type { PredictionAnswer } from '../api/prediction-client';
import { livePredictions, requestOf } from './live-prediction';
import type { LiveOutcome, PredictionAsk } from './live-prediction';
import { SAMPLE_HEAD } from './sample-prediction';

const { cellCount: _count, ...headWithoutCells } = SAMPLE_HEAD;
const predicted: PredictionAnswer = { kind: 'predicted', block: { head: headWithoutCells, arrays: {} } };
const ask = (thetaDeg: number): PredictionAsk => ({ design: replacedAt(STARTING_DESIGN, '/requirement/beams/0/thetaDeg', thetaDeg), cuts: [], uvSize: 0 });
const unprocessable: Problem = { type: 'about:blank', title: 'Not valid', status: 422, detail: 'Too many cells' };

function follow(predict: (request: PredictionRequest) => ReturnType<Parameters<typeof livePredictions>[1]>) {
  const asks = new Subject<PredictionAsk>();
  const outcomes: LiveOutcome[] = [];
  livePredictions(asks, predict).subscribe((outcome) => outcomes.push(outcome));
  return { asks, outcomes };
}

describe('requestOf', () => {
  it('asks for the cuts of the beam before the wanted ones, within what the contract allows', () => {
    const wanted = Array.from({ length: 9 }, (_, i) => ({ phiDeg: i * 10, thetaDeg: [-90, 90, 1] as [number, number, number] }));
    const request = requestOf({ ...ask(20), cuts: wanted, uvSize: 257 });
    expect(predictionRequest.safeParse(request).success).toBe(true);
    expect(request.cuts?.slice(0, 3)).toEqual([expect.objectContaining({ plane: 'along' }), expect.objectContaining({ plane: 'across' }), wanted[0]]);
    expect(request.include).toContain('uv');
    expect(requestOf(ask(20)).include).not.toContain('uv');
  });
});

describe('livePredictions', () => {
  beforeEach(() => jest.useFakeTimers({ now: 0 }));
  afterEach(() => jest.useRealTimers());

  it('answers within 150 ms of the last move of a drag when the server takes 60 ms', () => {
    const { asks, outcomes } = follow(() => timer(60).pipe(map(() => predicted)));
    for (let i = 0; i < 30; i += 1) {
      asks.next(ask(20 + i / 10));
      jest.advanceTimersByTime(16);
    }
    jest.advanceTimersByTime(150 - 16);
    const last = outcomes.at(-1);
    expect(last?.kind === 'predicted' && last.prediction.of.requirement.beams[0].thetaDeg).toBe(22.9);
    expect(outcomes.length).toBeGreaterThan(5);
  });

  it('says why a design has no prediction', () => {
    const { asks, outcomes } = follow(() => of<PredictionAnswer>({ kind: 'failed', problem: unprocessable }));
    asks.next(ask(20));
    expect(outcomes).toEqual([{ kind: 'failed', problem: unprocessable, of: ask(20).design }]);
  });

  it('says nothing of a request that another replaced at the server, and asks again for what is still wanted', () => {
    const thetas: number[] = [];
    const { asks, outcomes } = follow((request) => {
      thetas.push(request.design.requirement.beams[0].thetaDeg);
      return of<PredictionAnswer>(thetas.length === 1 ? { kind: 'superseded' } : predicted);
    });
    asks.next(ask(20));
    expect(outcomes).toEqual([]);
    jest.advanceTimersByTime(1000);
    expect(thetas).toEqual([20, 20]);
    expect(outcomes.map(({ kind }) => kind)).toEqual(['predicted']);
  });

  it('asks again while the server is out of reach, and for the newest design only', () => {
    const thetas: number[] = [];
    let reachable = false;
    const { asks, outcomes } = follow((request) => {
      thetas.push(request.design.requirement.beams[0].thetaDeg);
      return of<PredictionAnswer>(reachable ? predicted : { kind: 'unreachable' });
    });
    asks.next(ask(20));
    jest.advanceTimersByTime(1000);
    asks.next(ask(25));
    reachable = true;
    jest.advanceTimersByTime(10_000);
    expect(thetas).toEqual([20, 25]);
    expect(outcomes.map(({ kind }) => kind)).toEqual(['failed', 'predicted']);
  });
});
