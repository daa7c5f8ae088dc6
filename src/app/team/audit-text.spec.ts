import { detailText, objectText } from './audit-text';

describe('a row of the audit log in words', () => {
  it('names the object by its kind and the start of its id', () => {
    expect(objectText('panel:42ae568d-9fdb-4718-8f0a-111111111111')).toBe('panel 42ae568d');
    expect(objectText('team')).toBe('team');
  });

  it('spells names, cuts hashes, joins lists', () => {
    expect(detailText({ hash: 'c53d4cd1b253'.padEnd(64, '0'), note: 'first measured set.', roles: ['designer', 'lab'] })).toBe(
      'hash c53d4cd1b253; note first measured set; roles designer + lab',
    );
    expect(detailText({ endOtherSessions: true, count: 2 })).toBe('end other sessions true; count 2');
  });

  it('shows what was before and after, and says "none" where there is nothing', () => {
    expect(detailText({ before: { name: 'A' }, after: { name: 'B', note: '' } })).toBe('before (name A); after (name B; note none)');
    expect(detailText({ roles: [], parent: null })).toBe('roles none; parent none');
    expect(detailText({})).toBe('');
  });
});
