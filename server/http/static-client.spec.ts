import { mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { once } from 'node:events';
import { createServer, type Server } from 'node:http';
import type { AddressInfo } from 'node:net';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import express from 'express';
import { pino } from 'pino';
import { problemReply } from './problem-reply';
import { securityHeaders } from './security-headers';
import { indexWithNonce, staticClient } from './static-client';

const page = '<html><head><style id="plotly.js-style-global" nonce=""></style></head><body><slant-root ngCspNonce="none"></slant-root></body></html>';

describe('indexWithNonce', () => {
  it('puts the nonce where Angular and plotly look for it', () => {
    expect(indexWithNonce(page, 'n+/1=')).toBe(page.replace('nonce=""', 'nonce="n+/1="').replace('"none"', '"n+/1="'));
  });

  it('keeps the lower-case attribute a build may write', () => {
    expect(indexWithNonce('<slant-root ngcspnonce="x">', 'n')).toBe('<slant-root ngCspNonce="n">');
  });
});

describe('staticClient', () => {
  const folder = mkdtempSync(join(tmpdir(), 'slantwise-client-'));
  let server: Server;
  let url = '';

  beforeAll(async () => {
    writeFileSync(join(folder, 'index.html'), page);
    writeFileSync(join(folder, 'main-ABCD1234.js'), 'export {}');
    writeFileSync(join(folder, 'icon.svg'), '<svg/>');
    const app = express();
    app.use(securityHeaders({ secure: false }), staticClient(folder), problemReply(pino({ level: 'silent' })));
    server = createServer(app).listen(0, '127.0.0.1');
    await once(server, 'listening');
    url = `http://127.0.0.1:${(server.address() as AddressInfo).port}`;
  });
  afterAll(() => {
    server.close();
    rmSync(folder, { recursive: true });
  });

  it('answers any address without a file by the page, with the nonce of its own policy', async () => {
    for (const path of ['/', '/projects/17/panel', '/index']) {
      const answer = await fetch(`${url}${path}`);
      const nonce = /'nonce-([^']+)'/.exec(answer.headers.get('content-security-policy') ?? '')?.[1];
      expect([answer.status, answer.headers.get('cache-control')]).toEqual([200, 'no-store']);
      expect(await answer.text()).toBe(indexWithNonce(page, nonce ?? 'missing'));
    }
  });

  it('gives every page another nonce', async () => {
    const [first, second] = [await (await fetch(url)).text(), await (await fetch(url)).text()];
    expect(first).not.toBe(second);
  });

  it('lets browsers keep what has its hash in the name, and ask again for the rest', async () => {
    expect((await fetch(`${url}/main-ABCD1234.js`)).headers.get('cache-control')).toBe('public, max-age=31536000, immutable');
    expect((await fetch(`${url}/icon.svg`)).headers.get('cache-control')).toBe('no-cache');
  });

  it('says 404 for a missing file and for anything but reading', async () => {
    expect((await fetch(`${url}/main-EFGH5678.js`)).status).toBe(404);
    expect((await fetch(`${url}/projects`, { method: 'POST' })).status).toBe(404);
  });
});
