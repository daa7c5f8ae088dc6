/** Lanczos approximation of the gamma function, g = 7, n = 9 (coefficients as published by P. Godfrey, from memory; checked against factorials). */
const LANCZOS = [
  0.99999999999980993, 676.5203681218851, -1259.1392167224028, 771.32342877765313, -176.61502916214059, 12.507343278686905,
  -0.13857109526572012, 9.9843695780195716e-6, 1.5056327351493116e-7,
];

/** Gamma function of x > 0, relative error below 1e-13. */
export function gamma(x: number): number {
  if (x < 0.5) return Math.PI / (Math.sin(Math.PI * x) * gamma(1 - x));
  const t = x + 6.5;
  let sum = LANCZOS[0];
  for (let i = 1; i < LANCZOS.length; i++) sum += LANCZOS[i] / (x - 1 + i);
  return Math.sqrt(2 * Math.PI) * Math.pow(t, x - 0.5) * Math.exp(-t) * sum;
}

let lastOrder = 0;
let lastGamma = 1;

/** gamma(order + 1), kept for the order last asked for: a table of Bessel functions asks for the same one at every z. */
function gammaAfter(order: number): number {
  if (order !== lastOrder) [lastOrder, lastGamma] = [order, gamma(order + 1)];
  return lastGamma;
}

/**
 * gamma(order + 1) (2/z)^order J_order(z): the Bessel function of the first kind divided by its first series term,
 * so it is 1 at z = 0 and even in z.
 *
 * Three ranges: ascending series; backward recurrence normalised by Neumann's expansion of (z/2)^order;
 * Hankel's expansion (G. N. Watson, Theory of Bessel Functions, 1944, chapters 2, 5 and 7; equation numbers not checked).
 * Valid for order >= 0 (not necessarily integer) up to about 40 and z >= 0; relative to the envelope, error below 1e-12.
 */
export function besselRatio(order: number, z: number): number {
  const x = Math.abs(z);
  if (x * x < 12 * (order + 1)) return ascendingSeries(order, x);
  const scale = gammaAfter(order) * Math.pow(2 / x, order);
  return scale * (x > Math.max(25, order * order * 0.75) ? hankelExpansion(order, x) : backwardRecurrence(order, x));
}

/** Bessel function of the first kind, J_order(z), for z >= 0. */
export function besselJ(order: number, z: number): number {
  if (z === 0) return order === 0 ? 1 : 0;
  return (besselRatio(order, z) * Math.pow(z / 2, order)) / gamma(order + 1);
}

function ascendingSeries(order: number, x: number): number {
  const quarter = (-x * x) / 4;
  let term = 1;
  let sum = 1;
  for (let n = 1; n < 80; n++) {
    term *= quarter / (n * (n + order));
    sum += term;
    if (Math.abs(term) < 1e-17 * Math.abs(sum)) break;
  }
  return sum;
}

function hankelExpansion(order: number, x: number): number {
  const mu = 4 * order * order;
  let term = 1;
  let even = 1;
  let odd = 0;
  for (let n = 1; n < 60; n++) {
    const next = (term * (mu - (2 * n - 1) ** 2)) / (8 * n * x);
    // The expansion is asymptotic: once terms grow, adding more makes it worse.
    if (Math.abs(next) > Math.abs(term) && n > order) break;
    term = next;
    if (n % 2) odd += n % 4 === 1 ? term : -term;
    else even += n % 4 === 0 ? term : -term;
    if (Math.abs(term) < 1e-16) break;
  }
  const angle = x - (order / 2 + 0.25) * Math.PI;
  return Math.sqrt(2 / (Math.PI * x)) * (even * Math.cos(angle) - odd * Math.sin(angle));
}

function backwardRecurrence(order: number, x: number): number {
  const base = order - Math.floor(order);
  const wanted = Math.floor(order);
  const top = 2 * Math.ceil((Math.max(x, order) + 15 + 3 * Math.cbrt(x) * 2) / 2);
  const values = new Float64Array(top + 2);
  values[top] = 1e-290;
  for (let n = top; n > 0; n--) {
    values[n - 1] = ((2 * (base + n)) / x) * values[n] - values[n + 1];
    if (Math.abs(values[n - 1]) > 1e250) for (let i = n - 1; i <= top; i++) values[i] *= 1e-250;
  }
  // (z/2)^base = sum of (base + 2k) gamma(base + k) / k! J_{base+2k}(z); the k = 0 coefficient is gamma(base + 1).
  let coefficient = gamma(base + 1);
  let norm = coefficient * values[0];
  for (let k = 1; 2 * k <= top; k++) {
    coefficient *= k === 1 ? 1 : (base + k - 1) / k;
    norm += (base + 2 * k) * coefficient * values[2 * k];
  }
  return (values[wanted] * Math.pow(x / 2, base)) / norm;
}
