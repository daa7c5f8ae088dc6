/** Steps a person counts in: 1, 2, 5 and their decimal multiples. */
export function niceStep(span: number, atMost: number): number {
  const rough = span / Math.max(1, atMost);
  const decade = 10 ** Math.floor(Math.log10(rough));
  for (const factor of [1, 2, 5]) if (factor * decade >= rough * (1 - 1e-9)) return factor * decade;
  return 10 * decade;
}

/** Steps that divide a turn, for angles: down to a degree 1, 2, 5, 10, 15, 30, 45, 90; below it decimal. */
export function angleStepDeg(spanDeg: number, atMost: number): number {
  const rough = spanDeg / Math.max(1, atMost);
  if (rough < 1) return niceStep(spanDeg, atMost);
  return [1, 2, 5, 10, 15, 30, 45, 90].find((step) => step >= rough * (1 - 1e-9)) ?? 180;
}

/** All multiples of a step from one end to the other, without the noise of adding up. */
export function ticksBetween(from: number, to: number, step: number): number[] {
  const first = Math.ceil(from / step - 1e-6);
  const last = Math.floor(to / step + 1e-6);
  return Array.from({ length: Math.max(0, last - first + 1) }, (_, i) => tidy((first + i) * step));
}

/** Twelve digits are more than any tick needs and fewer than binary noise shows. */
function tidy(value: number): number {
  return Number(value.toPrecision(12));
}
