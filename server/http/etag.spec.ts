import { contentTag, refuseStale, requireIfMatch, versionTag } from './etag';
import { StaleVersion, VersionRequired } from './problems';

describe('entity tags', () => {
  it('are strong: quoted, and equal exactly for equal content', () => {
    expect(versionTag(3)).toBe('"v3"');
    expect(contentTag('abc')).toBe(contentTag(Buffer.from('abc')));
    expect(contentTag('abc')).not.toBe(contentTag('abd'));
    expect(contentTag('abc')).toMatch(/^"[\w-]{43}"$/);
  });

  it.each([undefined, '', '*', 'W/"v1"', '"v1", "v2"', 'v1', '""'])('are missing when If-Match is %j', (header) => {
    expect(() => requireIfMatch(header)).toThrow(VersionRequired);
  });

  it('are read from If-Match with white space around them', () => {
    expect(requireIfMatch(' "v1" ')).toBe('"v1"');
  });

  it('refuse a stale one and say the present one', () => {
    expect(() => refuseStale('"v1"', '"v1"')).not.toThrow();
    expect(() => refuseStale('"v1"', '"v2"', { some: 'body' })).toThrow(expect.objectContaining({ current: '"v2"', body: { some: 'body' } }) as StaleVersion);
  });
});
