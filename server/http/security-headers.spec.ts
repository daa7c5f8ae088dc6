import { createHash } from 'node:crypto';
import { readFileSync } from 'node:fs';
import { runInNewContext } from 'node:vm';
import { nonceOf, styleHashes } from './security-headers';

describe('nonceOf', () => {
  it('is one per answer, 128 bits long', () => {
    const [first, second] = [{}, {}];
    expect(nonceOf(first)).toBe(nonceOf(first));
    expect(nonceOf(first)).not.toBe(nonceOf(second));
    expect(Buffer.from(nonceOf(first), 'base64')).toHaveLength(16);
  });
});

describe('styleHashes', () => {
  it('hold the style that the installed plotly.js adds without a nonce', () => {
    const source = readFileSync(require.resolve('plotly.js-dist-min/plotly.min.js'), 'utf8');
    const literal = /\.id="[0-9a-f]+",\w+\.textContent=('(?:[^'\\]|\\.)*'|"(?:[^"\\]|\\.)*")/.exec(source)?.[1];
    const css = runInNewContext(literal ?? '""') as string;
    expect(css).toContain('.maplibregl-map');
    expect(styleHashes).toEqual([`'sha256-${createHash('sha256').update(css).digest('base64')}'`]);
  });
});
