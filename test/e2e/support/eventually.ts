/** Longer than any answer of a busy machine, shorter than the limit of a test. */
export const PATIENCE_MS = 30_000;
const PAUSE_MS = 50;

/** Repeats a check until it holds: the screen follows a deed a moment later. What failed last is what the test reports. */
export async function eventually(check: () => Promise<void>): Promise<void> {
  const end = Date.now() + PATIENCE_MS;
  for (;;) {
    try {
      return await check();
    } catch (fault) {
      if (Date.now() > end) throw fault;
    }
    await new Promise((resolve) => setTimeout(resolve, PAUSE_MS));
  }
}
