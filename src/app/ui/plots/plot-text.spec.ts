import { digitsOfStep, fullNumberText, numberText, signedNumberText } from './plot-text';

it('writes a true minus, groups from five digits on and gives zero no sign', () => {
  expect(numberText(-3.014, 2)).toBe('\u22123.01');
  expect(numberText(-0.001, 2)).toBe('0.00');
  expect([numberText(1600, 0), numberText(1000000, 0)]).toEqual(['1\u00a0600', '1\u00a0000\u00a0000']);
});

it('always shows the sign of a difference but none of zero', () => {
  expect([0.61, -0.42, 0, 0.001].map((value) => signedNumberText(value, 2))).toEqual(['+0.61', '\u22120.42', '0.00', '0.00']);
});

it('takes the decimals of a tick from its step', () => {
  expect([10, 1, 0.5, 0.25, 0.002].map(digitsOfStep)).toEqual([0, 0, 1, 2, 3]);
});

it('gives the full value for copying, which reads back exactly', () => {
  const value = 34.760000000000005;
  expect(Number(fullNumberText(value))).toBe(value);
  expect(fullNumberText(-0)).toBe('0');
});
