/** 97.5 % point of the normal distribution: an interval that holds the true share in 95 of 100 cases. */
export const Z_OF_95_PERCENT = 1.959964;

/**
 * Interval for a true share from `successes` out of `count` independent trials, by E. B. Wilson (J. Am. Stat. Assoc. 22, 1927;
 * from memory): centre (p + z^2/2n) / (1 + z^2/n), half width z sqrt(p (1 - p)/n + z^2/4n^2) / (1 + z^2/n).
 * It stays within 0 to 1 and does not shrink to nothing where all or none succeed. Throws where the counts cannot be.
 */
export function wilsonInterval(successes: number, count: number, z = Z_OF_95_PERCENT): readonly [low: number, high: number] {
  const whole = Number.isInteger(successes) && Number.isInteger(count);
  if (!whole || count < 1 || successes < 0 || successes > count) throw new RangeError(`A share needs whole counts with 0 <= successes <= count and count >= 1; got ${successes} of ${count}`);
  const share = successes / count;
  const z2 = (z * z) / count;
  const centre = (share + z2 / 2) / (1 + z2);
  const half = (z * Math.sqrt((share * (1 - share)) / count + z2 / (4 * count))) / (1 + z2);
  // Rounding must not leave a hair outside what a share can be.
  return [successes === 0 ? 0 : Math.max(0, centre - half), successes === count ? 1 : Math.min(1, centre + half)];
}
