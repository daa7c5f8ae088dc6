const MINUS = '\u2212';
/** Figures stand in the mono face, which lacks the thin space; this one never breaks. */
const GROUP_SPACE = '\u00a0';

/** A number with fixed decimals, a true minus sign and a space every three digits. Zero has no sign. */
export function numberText(value: number, digits: number): string {
  const fixed = Math.abs(value).toFixed(digits);
  const [whole, part] = fixed.split('.');
  const grouped = whole.length > 3 ? whole.replace(/\B(?=(\d{3})+$)/g, GROUP_SPACE) : whole;
  const negative = value < 0 && Number(fixed) !== 0;
  return `${negative ? MINUS : ''}${grouped}${part === undefined ? '' : `.${part}`}`;
}

/** The same with its sign always shown; zero has none. */
export function signedNumberText(value: number, digits: number): string {
  const positive = value > 0 && Number(value.toFixed(digits)) !== 0;
  return `${positive ? '+' : ''}${numberText(value, digits)}`;
}

/** As many decimals as tell the ticks of a step apart: 0 for 5, 1 for 0.5, 2 for 0.25. */
export function digitsOfStep(step: number): number {
  let digits = 0;
  while (digits < 9 && Math.abs(step * 10 ** digits - Math.round(step * 10 ** digits)) > 1e-6) digits++;
  return digits;
}

/** The full value as the computer holds it, for read-outs, copies and tables: reading it back gives the same number. */
export function fullNumberText(value: number): string {
  return Object.is(value, -0) ? '0' : String(value);
}
