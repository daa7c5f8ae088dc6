import { existsSync, readFileSync } from 'node:fs';
import { join } from 'node:path';
import express, { Router, type RequestHandler } from 'express';
import { NotFound, Unavailable } from './problems';
import { nonceOf } from './security-headers';

/** File names with a content hash never change their bytes. */
const hashed = /-[A-Z0-9]{8}\.\w+$/i;

/** Puts the nonce where Angular and plotly look for it. */
export function indexWithNonce(page: string, nonce: string): string {
  return page
    .replace(/ngCspNonce="[^"]*"/gi, `ngCspNonce="${nonce}"`)
    .replace(/(<style[^>]*id="plotly\.js-style-global"[^>]*nonce=")[^"]*"/i, `$1${nonce}"`);
}

/** The page of the client for every address without a file: its own router shows what belongs there. */
function indexPage(folder: string): RequestHandler {
  const path = join(folder, 'index.html');
  let page: string | null = null;
  return (request, response, next) => {
    if (request.method !== 'GET' && request.method !== 'HEAD') throw new NotFound('address');
    // A missing file must not answer with a page: scripts would fail to parse as HTML.
    if (/\.\w{1,8}$/.test(request.path)) throw new NotFound('file');
    if (page === null && !existsSync(path)) {
      next(new Unavailable('The client is not built; the API works.'));
      return;
    }
    page ??= readFileSync(path, 'utf8');
    response.setHeader('Cache-Control', 'no-store');
    response.type('html').send(indexWithNonce(page, nonceOf(response)));
  };
}

/** Files of the built client, and its index page for everything else. */
export function staticClient(folder: string): Router {
  const router = Router();
  router.use(
    express.static(folder, {
      index: false,
      redirect: false,
      setHeaders: (response, path) =>
        response.setHeader('Cache-Control', hashed.test(path) ? 'public, max-age=31536000, immutable' : 'no-cache'),
    }),
  );
  router.use(indexPage(folder));
  return router;
}
