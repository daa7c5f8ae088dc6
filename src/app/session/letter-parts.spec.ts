import { letterParts } from './letter-parts';

describe('parts of a letter', () => {
  const origin = 'http://127.0.0.1:4600';

  it('makes links to this server followable and keeps every other sign', () => {
    const text = 'Hello,\nfollow http://127.0.0.1:4600/invitation#abc-123 soon.';
    const parts = letterParts(text, origin);
    expect(parts.map((part) => part.text).join('')).toBe(text);
    expect(parts[1]).toEqual({ text: 'http://127.0.0.1:4600/invitation#abc-123', link: { path: '/invitation', fragment: 'abc-123' } });
  });

  it('leaves addresses of others as text', () => {
    expect(letterParts('see https://elsewhere.example/x', origin)).toEqual([{ text: 'see https://elsewhere.example/x', link: null }]);
  });
});
