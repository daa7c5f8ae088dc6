import { Subject, map, of, timer } from 'rxjs';
import { followLatest } from './follow-latest';

const answerAfter = (ms: number) => (value: number) => timer(ms).pipe(map(() => value));

describe('followLatest', () => {
  beforeEach(() => jest.useFakeTimers({ now: 0 }));
  afterEach(() => jest.useRealTimers());

  it('keeps answering during a drag whose moves come faster than the answers', () => {
    const moves = new Subject<number>();
    const answers: number[] = [];
    moves.pipe(followLatest(answerAfter(60), 400)).subscribe((value) => answers.push(value));
    for (let i = 0; i < 20; i += 1) {
      moves.next(i);
      jest.advanceTimersByTime(16);
    }
    jest.advanceTimersByTime(200);
    // One answer per 60 ms, each of the newest move, and the last move at the end.
    expect(answers.length).toBeGreaterThanOrEqual(5);
    expect(answers.at(-1)).toBe(19);
    expect([...answers].sort((a, b) => a - b)).toEqual(answers);
  });

  it('drops slow work once something newer has waited long enough', () => {
    const designs = new Subject<number>();
    const answers: [number, number][] = [];
    designs.pipe(followLatest((value) => answerAfter(value === 1 ? 10_000 : 50)(value), 400)).subscribe((value) => answers.push([value, Date.now()]));
    designs.next(1);
    jest.advanceTimersByTime(100);
    designs.next(2);
    jest.advanceTimersByTime(20_000);
    expect(answers).toEqual([[2, 450]]);
  });

  it('replaces old work at once when it is already past its time', () => {
    const designs = new Subject<number>();
    const answers: [number, number][] = [];
    designs.pipe(followLatest((value) => answerAfter(value === 1 ? 10_000 : 50)(value), 400)).subscribe((value) => answers.push([value, Date.now()]));
    designs.next(1);
    jest.advanceTimersByTime(1000);
    designs.next(2);
    jest.advanceTimersByTime(50);
    expect(answers).toEqual([[2, 1050]]);
  });

  it('passes answers that come at once, and ends with its source', () => {
    const values: number[] = [];
    let ended = false;
    of(1, 2, 3)
      .pipe(followLatest((value) => of(value * 10), 400))
      .subscribe({ next: (value) => values.push(value), complete: () => (ended = true) });
    expect(values).toEqual([10, 20, 30]);
    expect(ended).toBe(true);
  });

  it('stops its work when nobody listens any more', () => {
    const moves = new Subject<number>();
    const answers: number[] = [];
    const listening = moves.pipe(followLatest(answerAfter(60), 400)).subscribe((value) => answers.push(value));
    moves.next(1);
    listening.unsubscribe();
    jest.advanceTimersByTime(1000);
    expect(answers).toEqual([]);
  });
});
