/** Slips of a person who knows the password, and of several windows at once. */
const FREE_FAILURES = 10;
const LONGEST_DELAY_S = 3600;
/** NIST SP 800-63B: no more than 100 consecutive failures. From there a reset letter is the quick way in. */
const MANY_FAILURES = 100;
const DAY_S = 24 * 3600;

/** How long an address waits after so many consecutive failures, in seconds: doubling from 2 s up to an hour. */
export function delayAfterFailuresS(failures: number): number {
  if (failures < FREE_FAILURES) return 0;
  if (failures >= MANY_FAILURES) return DAY_S;
  return Math.min(2 ** (failures - FREE_FAILURES + 1), LONGEST_DELAY_S);
}
