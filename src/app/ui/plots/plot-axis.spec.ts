import { axisPx, axisTicks, axisValue, linePath } from './plot-axis';

const axis = { from: -20, to: 40, startPx: 300, endPx: 0 };

it('places values on an axis and reads them back', () => {
  expect([axisPx(axis, -20), axisPx(axis, 40), axisPx(axis, 10)]).toEqual([300, 0, 150]);
  expect(axisValue(axis, axisPx(axis, 3.7))).toBeCloseTo(3.7, 12);
});

it('writes ticks with the decimals of their step', () => {
  expect(axisTicks(axis, 20).map(({ text, px }) => [text, px])).toEqual([['\u221220', 300], ['0', 200], ['20', 100], ['40', 0]]);
  expect(axisTicks({ from: 2, to: 1, startPx: 0, endPx: 1 }, 0.5).map(({ text }) => text)).toEqual(['1.0', '1.5', '2.0']);
});

it('lifts the pen where there is no value', () => {
  expect(linePath([0, 1, 2, 3], [5, Number.NaN, 7, 8.04])).toBe('M0 5M2 7L3 8');
});
