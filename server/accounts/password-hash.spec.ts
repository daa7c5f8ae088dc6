import { PasswordHasher, presentCost } from './password-hash';

const cheap = { logN: 6, r: 8, p: 1 };

describe('PasswordHasher', () => {
  it('hashes at the cost of N = 2^17, r = 8, p = 1, encoded with its parameters', async () => {
    expect(presentCost).toEqual({ logN: 17, r: 8, p: 1 });
    const hasher = new PasswordHasher();
    const hash = await hasher.hash('four quiet river stones');
    expect(hash).toMatch(/^\$scrypt\$ln=17,r=8,p=1\$[\w-]{22}\$[\w-]{43}$/);
    expect(await hasher.fits('four quiet river stones', hash)).toBe(true);
    expect(await hasher.fits('four quiet river stone', hash)).toBe(false);
  });

  it('gives the same password another hash each time', async () => {
    const hasher = new PasswordHasher(cheap);
    expect(await hasher.hash('same')).not.toBe(await hasher.hash('same'));
  });

  it('says no for an account that does not exist', async () => {
    const hasher = new PasswordHasher(cheap);
    expect(await hasher.fits('', null)).toBe(false);
    expect(await hasher.fits('anything', null)).toBe(false);
  });

  it('takes a password however its accents were typed', async () => {
    const hasher = new PasswordHasher(cheap);
    expect(await hasher.fits('cafe\u0301', await hasher.hash('caf\u00e9'))).toBe(true);
  });

  it('checks a hash of an older cost, and says that it should be renewed', async () => {
    const old = await new PasswordHasher({ logN: 5, r: 8, p: 1 }).hash('x');
    const hasher = new PasswordHasher(cheap);
    expect(await hasher.fits('x', old)).toBe(true);
    expect(hasher.isOutdated(old)).toBe(true);
    expect(hasher.isOutdated(await hasher.hash('x'))).toBe(false);
  });

  it('refuses when too many wait, and goes on with those in line', async () => {
    const hasher = new PasswordHasher({ logN: 12, r: 8, p: 1 });
    const results = await Promise.allSettled(Array.from({ length: 90 }, () => hasher.hash('x')));
    const refused = results.filter((result): result is PromiseRejectedResult => result.status === 'rejected');
    expect(results.length - refused.length).toBe(62);
    expect(refused[0]?.reason).toMatchObject({ kind: 'unavailable', retryAfterSeconds: 10 });
  });

  it('fails loudly on a stored hash it does not know', async () => {
    await expect(new PasswordHasher(cheap).fits('x', '$2b$10$abc')).rejects.toThrow('a stored password hash has an unknown form');
  });
});
