/** Limit of one test or hook: a guard against what never ends, not a measure of speed. */
const TEST_LIMIT_MS = 180_000;

jest.setTimeout(TEST_LIMIT_MS);
