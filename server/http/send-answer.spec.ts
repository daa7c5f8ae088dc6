import { attachmentHeader } from './send-answer';

describe('attachmentHeader', () => {
  it('gives a plain name and the exact one, as RFC 6266 and RFC 5987 want', () => {
    expect(attachmentHeader('panel 7.zip')).toBe(`attachment; filename="panel 7.zip"; filename*=UTF-8''panel%207.zip`);
    expect(attachmentHeader('€ rates.txt')).toBe(`attachment; filename="_ rates.txt"; filename*=UTF-8''%E2%82%AC%20rates.txt`);
  });

  it.each(['a"b.txt', 'a\r\nSet-Cookie: x=1', '../../etc/passwd', "it's (new)*.csv"])('keeps %j inside the header', (name) => {
    const header = attachmentHeader(name);
    expect(header).not.toMatch(/[\r\n]/);
    const [, plain, exact] = /^attachment; filename="([\w.\- ]*)"; filename\*=UTF-8''([\w%.!~-]*)$/.exec(header) ?? [];
    expect(plain).toMatch(/^[\w.\- ]+$/);
    expect(decodeURIComponent(exact ?? '')).toBe(name);
  });
});
