/**
 * Runs the work while no other tab of this browser runs its own. A refresh token counts once: two tabs that spend the
 * same one look like a thief, and the server ends the session. Pages without secure context have no locks.
 */
export function oneTabAtATime<T>(work: () => Promise<T>): Promise<T> {
  const { locks } = navigator as { readonly locks?: LockManager };
  if (locks === undefined) return work();
  // The lock waits for the promise of the work, which its type does not say.
  return locks.request('slantwise-session', work) as Promise<unknown> as Promise<T>;
}
