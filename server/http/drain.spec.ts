import { once } from 'node:events';
import { createServer, type Server } from 'node:http';
import type { AddressInfo } from 'node:net';
import { drain } from './drain';

describe('drain', () => {
  let server: Server;
  let url = '';
  beforeEach(async () => {
    server = createServer((request, response) => {
      setTimeout(() => response.end('done'), request.url === '/slow' ? 300 : 60_000).unref();
      response.writeHead(200).flushHeaders();
    }).listen(0, '127.0.0.1');
    await once(server, 'listening');
    url = `http://127.0.0.1:${(server.address() as AddressInfo).port}`;
  });

  it('lets a running request finish and takes no new one', async () => {
    const running = await fetch(`${url}/slow`);
    const started = Date.now();
    const drained = drain(server, 5000);
    await expect(fetch(`${url}/slow`)).rejects.toThrow('fetch failed');
    expect(await running.text()).toBe('done');
    await drained;
    expect(server.listening).toBe(false);
    expect(Date.now() - started).toBeLessThan(2000);
  });

  it('cuts what takes longer than allowed', async () => {
    const running = await fetch(`${url}/endless`);
    const started = Date.now();
    const body = running.text();
    await Promise.all([drain(server, 200), expect(body).rejects.toThrow('terminated')]);
    expect(Date.now() - started).toBeLessThan(2000);
  });
});
