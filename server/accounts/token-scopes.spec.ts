import { role, scope } from '../../shared/contracts/common';
import { scopesOfRoles } from './token-scopes';

describe('scopesOfRoles', () => {
  it('lets every role read', () => {
    for (const one of role.options) expect(scopesOfRoles([one])).toContain('read');
  });

  it('gives design, library and team to those whose work it is', () => {
    const who = (wanted: (typeof scope.options)[number]) => role.options.filter((one) => scopesOfRoles([one]).includes(wanted));
    expect(who('design')).toEqual(['designer', 'reviewer']);
    expect(who('library')).toEqual(['lab']);
    expect(who('team')).toEqual(['administrator']);
  });

  it('adds up over roles without repeating, and gives nothing to nobody', () => {
    expect(scopesOfRoles(['designer', 'lab', 'administrator']).sort()).toEqual([...scope.options].sort());
    expect(scopesOfRoles([])).toEqual([]);
  });
});
