import { seal, unseal } from './seal';

describe('seal', () => {
  it('gives the text back to who has the secret, and shows nothing of it', () => {
    const sealed = seal('a secret', 'https://slantwise.example/new-password#token');
    expect(sealed.toString('latin1')).not.toContain('token');
    expect(unseal('a secret', sealed)).toBe('https://slantwise.example/new-password#token');
  });

  it('looks different each time', () => {
    expect(seal('a secret', 'x').equals(seal('a secret', 'x'))).toBe(false);
  });

  it('does not open with another secret or after a change', () => {
    const sealed = seal('a secret', 'text');
    expect(() => unseal('another secret', sealed)).toThrow();
    sealed[sealed.length - 1] = (sealed.at(-1) ?? 0) ^ 1;
    expect(() => unseal('a secret', sealed)).toThrow();
  });
});
