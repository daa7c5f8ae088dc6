/** Four decimals in degrees and dB: far below what the model says, and above the noise of single precision. */
const DECIMALS = 10_000;

/** ".5" for 5000, "" for 0: the four decimals without zeros at their end. */
const FRACTIONS: readonly string[] = Array.from({ length: DECIMALS }, (_, part) => (part === 0 ? '' : `.${String(part).padStart(4, '0').replace(/0+$/, '')}`));

/** Six significant digits in shortest decimals. */
export function significantText(value: number): string {
  if (!Number.isFinite(value)) throw notFinite(value);
  return String(Number(value.toPrecision(6)));
}

const notFinite = (value: number): RangeError => new RangeError(`A table holds finite numbers; got ${value}`);

/** A number rounded to four decimals. Above this its text would have an exponent, or fewer digits than that. */
const LARGEST = 1e11;

/**
 * What `String(Math.round(value * 1e4) / 1e4)` gives, without a negative zero, put together from whole numbers: a table of
 * 10^5 cells holds 10^6 of them, and the shortest decimals of a fraction take far longer to find.
 */
export function decimalText(value: number): string {
  if (!Number.isFinite(value)) throw notFinite(value);
  const count = Math.round(value * DECIMALS);
  if (Math.abs(value) >= LARGEST) return String(count / DECIMALS);
  const size = Math.abs(count);
  const whole = Math.floor(size / DECIMALS);
  return `${count < 0 ? '-' : ''}${whole}${FRACTIONS[size - whole * DECIMALS]}`;
}
