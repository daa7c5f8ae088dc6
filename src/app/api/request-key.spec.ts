import { requestKey } from './request-key';

describe('key of a request', () => {
  it('has 32 hexadecimal digits and differs each time', () => {
    const keys = Array.from({ length: 100 }, () => requestKey());
    expect(keys.every((key) => /^[0-9a-f]{32}$/.test(key))).toBe(true);
    expect(new Set(keys).size).toBe(100);
  });
});
