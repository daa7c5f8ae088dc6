import { once } from 'node:events';
import { existsSync } from 'node:fs';
import { createServer } from 'node:http';
import type { Server } from 'node:http';
import type { AddressInfo } from 'node:net';
import { join } from 'node:path';
import { eventually } from './support/eventually';
import { sidewaysOverflow } from './support/screen-soundness';
import { TestBrowser, screenshotFolder, seriousAccessFaults, takePicture } from '../support/browser';

const pageOf = (body: string): string => `<!doctype html><html lang="en"><head><title>Planted</title></head><body><main><h1>Planted</h1>${body}</main></body></html>`;

const bodies: Record<string, string> = {
  '/sound': '<p>Nothing wrong here.</p>',
  '/console-error': "<script nonce='planted'>console.error('planted complaint')</script>",
  '/thrown': "<script nonce='planted'>throw new Error('planted fault')</script>",
  '/policy': '<script>document.title = "not reached"</script>',
  '/leaving': '<img alt="elsewhere" src="http://127.0.0.1:9/elsewhere.png">',
  '/missing-part': '<img alt="missing" src="/no-such-picture.png">',
  '/too-wide': '<hr width="3000">',
  '/unlabelled': '<input type="text">',
};

/** Serves each body under a policy that lets through only scripts with the nonce. */
function plantedServer(): Server {
  return createServer((request, response) => {
    const body = bodies[request.url ?? ''];
    response.writeHead(body === undefined && request.url !== '/favicon.ico' ? 404 : 200, {
      'content-type': 'text/html',
      'content-security-policy': "default-src 'self'; script-src 'nonce-planted'; img-src *",
    });
    response.end(body === undefined ? '' : pageOf(body));
  });
}

describe('a watched page', () => {
  const server = plantedServer();
  let browser: TestBrowser;

  beforeAll(async () => {
    server.listen(0, '127.0.0.1');
    await once(server, 'listening');
    browser = await TestBrowser.launch(`http://127.0.0.1:${(server.address() as AddressInfo).port}`);
  });

  afterEach(() => browser.closePages());

  afterAll(async () => {
    await browser.close();
    server.close();
  });

  async function problemsOn(path: string): Promise<readonly string[]> {
    const { page, problems } = await browser.openPage();
    await page.goto(path, { waitUntil: 'networkidle' });
    return problems;
  }

  it('has no problems when nothing is wrong', async () => {
    expect(await problemsOn('/sound')).toEqual([]);
  });

  it.each([
    ['a console error', '/console-error', /^console error: planted complaint$/],
    ['an error nobody caught', '/thrown', /^page error: planted fault$/],
    ['a violation of the content security policy', '/policy', /content security policy: script-src/i],
    ['a request to another origin', '/leaving', /^request leaves the origin: http:\/\/127\.0\.0\.1:9\/elsewhere\.png$/],
    ['a reply that failed', '/missing-part', /^reply 404 for \/no-such-picture\.png$/],
  ])('reports %s', async (_what, path, message) => {
    const problems = await problemsOn(path);
    await eventually(async () => expect(problems).toContainEqual(expect.stringMatching(message)));
  });

  it('lets a failing reply pass that the test has announced', async () => {
    const { page, problems, expectReply } = await browser.openPage();
    expectReply(404, /no-such-picture/);
    await page.goto('/missing-part', { waitUntil: 'networkidle' });
    expect(problems).toEqual([]);
  });

  it('finds a field without a label, and nothing on a sound page', async () => {
    const { page } = await browser.openPage();
    await page.goto('/unlabelled');
    expect(await seriousAccessFaults(page)).toEqual([expect.stringMatching(/^label: .*input/s)]);
    await page.goto('/sound');
    expect(await seriousAccessFaults(page)).toEqual([]);
  });

  it('is told when something makes it wider than its window', async () => {
    const { page } = await browser.openPage({ size: 'phone' });
    await page.goto('/too-wide');
    expect(await page.evaluate(sidewaysOverflow)).toEqual([expect.stringMatching(/^the page is 26\d\d px wider than its window of 390 px: hr\./)]);
    await page.goto('/sound');
    expect(await page.evaluate(sidewaysOverflow)).toEqual([]);
  });

  it('takes a picture at the size of a phone', async () => {
    const { page } = await browser.openPage({ size: 'phone', theme: 'dark' });
    await page.goto('/sound');
    await takePicture(page, 'watched-page-phone');
    expect(existsSync(join(screenshotFolder, 'watched-page-phone.png'))).toBe(true);
  });
});
