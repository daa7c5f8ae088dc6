import { delayAfterFailuresS } from './sign-in-delay';

describe('delayAfterFailuresS', () => {
  it('lets nine failures pass, then doubles from 2 s', () => {
    expect([0, 1, 9, 10, 11, 12].map(delayAfterFailuresS)).toEqual([0, 0, 0, 2, 4, 8]);
  });

  it('grows to an hour, and to a day from the hundredth failure on', () => {
    expect([20, 21, 99, 100, 5000].map(delayAfterFailuresS)).toEqual([2048, 3600, 3600, 86_400, 86_400]);
  });

  it('never shrinks', () => {
    const delays = Array.from({ length: 200 }, (_unused, failures) => delayAfterFailuresS(failures));
    expect(delays).toEqual([...delays].sort((left, right) => left - right));
  });
});
