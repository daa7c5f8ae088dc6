import { commonPasswords } from './common-passwords';
import { passwordFaults } from './password-rules';

const context = ['Greta Holm', 'greta.holm@merrow.example', 'Merrow Point'];
const reasons = (password: string): string => passwordFaults(password, context).join(' ');

describe('passwordFaults', () => {
  it('knows at least 3000 common passwords', () => {
    expect(commonPasswords.size).toBeGreaterThanOrEqual(3000);
    for (const known of ['password', '123456', 'qwerty', 'letmein', 'dragon']) expect(commonPasswords.has(known)).toBe(true);
  });

  it.each(['four quiet river stones', 'Zq8#vLm2!pRt6&Xw', 'ünïcödé wörter überall', 'correct horse battery staple', 'gull-lantern-orbit-mustard', '五月の雨が静かに窓を叩いている夜に'])(
    'takes %j',
    (password) => {
      expect(reasons(password)).toBe('');
    },
  );

  it('asks for no kinds of characters: lower case letters alone are fine', () => {
    expect(reasons('heronswadeslowlyhome')).toBe('');
  });

  it.each([
    ['14 characters....'.slice(0, 14), 'must have at least 15 characters; this has 14'],
    ['x'.repeat(257), 'must have at most 256 characters'],
    ['aaaaaaaaaaaaaaaaaa', 'uses fewer than five different characters'],
    ['abcabcabcabcabcabc', 'uses fewer than five different characters'],
    ['lantern!lantern!', 'repeats the same piece'],
  ])('refuses %j: %s', (password, reason) => {
    expect(reasons(password)).toBe(reason);
  });

  it.each([
    'passwordletmein1',
    'Password123456789!',
    'p@ssw0rdp@ssw0rd1',
    'qwertyuiopasdfghjkl',
    'abcdefghijklmnopq',
    '1234567890987654321',
    'slantwise antenna',
    'SlantwisePanel2027!',
    'merrowpoint2027!!',
    'greta.holm@merrow',
    'dragonmonkey2024!',
  ])('refuses %j because it is what is guessed first', (password) => {
    expect(reasons(password)).toMatch(/tried first|repeats the same piece/);
  });

  it('counts characters as people see them, not code units', () => {
    expect(passwordFaults('🌊'.repeat(14), [])).toEqual(['must have at least 15 characters; this has 14']);
  });
});
