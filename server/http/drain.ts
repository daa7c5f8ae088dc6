import { once } from 'node:events';
import type { Server } from 'node:http';

const IDLE_CHECK_MS = 100;

/** Stops accepting, lets what runs finish for so long, then cuts the rest. */
export async function drain(server: Server, longestMs: number): Promise<void> {
  const closed = once(server, 'close');
  server.close();
  // A connection that a browser keeps open for later is idle only once its request is through.
  const idle = setInterval(() => server.closeIdleConnections(), IDLE_CHECK_MS);
  server.closeIdleConnections();
  const cut = setTimeout(() => server.closeAllConnections(), longestMs);
  await closed;
  clearTimeout(cut);
  clearInterval(idle);
}
