import { angleStepDeg, niceStep, ticksBetween } from './axis-ticks';

it('counts in 1, 2 and 5', () => {
  expect([200, 7, 0.9, 1200].map((span) => niceStep(span, 5))).toEqual([50, 2, 0.2, 500]);
});

it('divides a turn evenly', () => {
  expect([180, 60, 14, 360, 0.8].map((span) => angleStepDeg(span, 12))).toEqual([15, 5, 2, 30, 0.1]);
});

it('gives round ticks within a range, ends included', () => {
  expect(ticksBetween(-100, 100, 50)).toEqual([-100, -50, 0, 50, 100]);
  expect(ticksBetween(0, 0.3, 0.1)).toEqual([0, 0.1, 0.2, 0.3]);
  expect(ticksBetween(0.2, 0.3, 1)).toEqual([]);
});
