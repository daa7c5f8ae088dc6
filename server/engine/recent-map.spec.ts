import { RecentMap } from './recent-map';

describe('RecentMap', () => {
  it('forgets what was used longest ago, and reading counts as use', () => {
    const map = new RecentMap<number>(2);
    map.set('a', 1);
    map.set('b', 2);
    expect(map.get('a')).toBe(1);
    map.set('c', 3);
    expect([map.get('a'), map.get('b'), map.get('c')]).toEqual([1, undefined, 3]);
  });

  it('counts weights, and keeps one entry that alone is too heavy', () => {
    const map = new RecentMap<string>(10);
    map.set('light', 'l', 4);
    map.set('heavy', 'h', 20);
    expect([map.get('light'), map.get('heavy')]).toEqual([undefined, 'h']);
    map.set('next', 'n', 4);
    expect([map.get('heavy'), map.get('next')]).toEqual([undefined, 'n']);
  });

  it('replaces the weight of a key that is set again', () => {
    const map = new RecentMap<number>(3);
    for (let i = 0; i < 5; i++) map.set('same', i, 2);
    map.set('other', 9);
    expect([map.get('same'), map.get('other')]).toEqual([4, 9]);
  });
});
