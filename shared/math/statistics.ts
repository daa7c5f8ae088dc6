/** Arithmetic mean. Throws on an empty list: no answer is not zero. */
export function mean(values: ArrayLike<number>): number {
  requireSome(values, 'mean');
  let sum = 0;
  for (let i = 0; i < values.length; i++) sum += values[i];
  return sum / values.length;
}

/** Root of the mean square. Throws on an empty list. */
export function rootMeanSquare(values: ArrayLike<number>): number {
  requireSome(values, 'root mean square');
  let sum = 0;
  for (let i = 0; i < values.length; i++) sum += values[i] * values[i];
  return Math.sqrt(sum / values.length);
}

/** Standard deviation of a sample (divided by n - 1). Throws below two values. */
export function sampleDeviation(values: ArrayLike<number>): number {
  if (values.length < 2) throw new RangeError(`A sample deviation takes two values or more; got ${values.length}`);
  const centre = mean(values);
  let sum = 0;
  for (let i = 0; i < values.length; i++) sum += (values[i] - centre) ** 2;
  return Math.sqrt(sum / (values.length - 1));
}

/** The middle value, or the mean of the two middle ones. Throws on an empty list. */
export function median(values: ArrayLike<number>): number {
  return quantile(values, 0.5);
}

/**
 * The value below which a fraction of the list lies, linear between order statistics
 * (R. J. Hyndman, Y. Fan, Am. Stat. 50(4), 1996, definition 7; from memory). Throws on an empty list or a fraction outside 0 to 1.
 */
export function quantile(values: ArrayLike<number>, fraction: number): number {
  requireSome(values, 'quantile');
  if (!(fraction >= 0 && fraction <= 1)) throw new RangeError(`A quantile takes a fraction from 0 to 1; got ${fraction}`);
  const sorted = Float64Array.from(values).sort();
  const place = fraction * (sorted.length - 1);
  const below = Math.floor(place);
  const above = Math.min(below + 1, sorted.length - 1);
  return sorted[below] + (place - below) * (sorted[above] - sorted[below]);
}

function requireSome(values: ArrayLike<number>, name: string): void {
  if (values.length === 0) throw new RangeError(`The ${name} of no values does not exist`);
}
