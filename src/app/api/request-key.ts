/**
 * A random key by which the server knows a repeated request. `crypto.randomUUID` exists only on https and on this
 * machine itself; a panel may be opened over plain http within a lab's network.
 */
export function requestKey(): string {
  const bytes = crypto.getRandomValues(new Uint8Array(16));
  return Array.from(bytes, (byte) => byte.toString(16).padStart(2, '0')).join('');
}
