/** What is compared: the quantity by name, its unit, and how far off it may be. */
export interface Comparison {
  readonly quantity: string;
  readonly unit: string;
  readonly got: number | readonly number[];
  readonly expected: number | readonly number[];
  readonly tolerance: number;
}

/** Printed values are rounded: half a unit of the last printed digit cannot count as a difference. */
function printedResolution(value: number): number {
  const [mantissa, exponent] = String(value).split('e');
  const decimals = mantissa.includes('.') ? mantissa.length - mantissa.indexOf('.') - 1 : 0;
  // A whole number may be exact, so nothing is granted to it.
  return decimals === 0 && exponent === undefined ? 0 : 0.5 * 10 ** (Number(exponent ?? 0) - decimals);
}

/** Fails with quantity, unit, got, expected, error, tolerance and the worst sample. */
export function expectWithin({ quantity, unit, got, expected, tolerance }: Comparison): void {
  const gotList = typeof got === 'number' ? [got] : got;
  const expectedList = typeof expected === 'number' ? [expected] : expected;
  if (gotList.length !== expectedList.length) {
    throw new Error(`${quantity}: got ${gotList.length} values, expected ${expectedList.length}`);
  }
  let worst = { excess: -Infinity, text: '' };
  expectedList.forEach((value, i) => {
    const error = gotList[i] - value;
    const allowed = tolerance + printedResolution(value);
    const excess = Number.isFinite(error) ? Math.abs(error) - allowed : Infinity;
    if (excess > worst.excess) {
      worst = { excess, text: `sample ${i}: got ${gotList[i]} ${unit}, expected ${value} ${unit}, error ${error}, tolerance ${allowed}` };
    }
  });
  if (worst.excess > 0) throw new Error(`${quantity}, ${worst.text}`);
  expect(worst.excess).toBeLessThanOrEqual(0);
}
