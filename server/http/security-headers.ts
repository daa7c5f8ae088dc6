import { randomBytes } from 'node:crypto';
import type { RequestHandler, Response } from 'express';
import helmet from 'helmet';

const nonces = new WeakMap<object, string>();

/** One nonce per answer: in the policy header, and in the index page for the client's style elements. */
export function nonceOf(response: object): string {
  const known = nonces.get(response);
  if (known !== undefined) return known;
  const nonce = randomBytes(16).toString('base64');
  nonces.set(response, nonce);
  return nonce;
}

/** plotly.js adds a style element for its maps by itself, without a nonce. Its hash changes with the version: a test compares. */
export const styleHashes: readonly string[] = ["'sha256-2GF9hCGTDj/GGFNlQA54jDdMGl2fvoeZmZjAvBSiAtM='"];

/**
 * Scripts only from us; styles from us or with the nonce. Plotly and Material set style attributes, which only
 * `style-src-attr` allows; images may be blobs (exports drawn in the page).
 */
export function securityHeaders(options: { secure: boolean }): RequestHandler {
  return helmet({
    contentSecurityPolicy: {
      useDefaults: false,
      directives: {
        defaultSrc: ["'self'"],
        scriptSrc: ["'self'"],
        styleSrc: ["'self'", (_request, response) => `'nonce-${nonceOf(response)}'`, ...styleHashes],
        styleSrcAttr: ["'unsafe-inline'"],
        imgSrc: ["'self'", 'data:', 'blob:'],
        fontSrc: ["'self'"],
        connectSrc: ["'self'"],
        workerSrc: ["'self'", 'blob:'],
        objectSrc: ["'none'"],
        baseUri: ["'none'"],
        formAction: ["'self'"],
        frameAncestors: ["'none'"],
      },
    },
    frameguard: { action: 'deny' },
    crossOriginOpenerPolicy: { policy: 'same-origin' },
    crossOriginResourcePolicy: { policy: 'same-origin' },
    referrerPolicy: { policy: 'no-referrer' },
    // One year; only where people reach us by https, or loopback http would be locked out.
    strictTransportSecurity: options.secure ? { maxAge: 31_536_000, includeSubDomains: true } : false,
    xPoweredBy: true,
  });
}

/** Answers of the API are for one person at one time. */
export const noStore: RequestHandler = (_request, response: Response, next) => {
  response.setHeader('Cache-Control', 'no-store');
  next();
};
