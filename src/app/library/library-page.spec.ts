import { readSearch } from './library-page';

describe('search of the library', () => {
  it('reads quantities with their units', () => {
    const { search, refused } = readSearch({ text: ' ring ', frequency: '28000 MHz', period: '0.5 cm', angle: '30°' });
    expect(search).toEqual({ text: 'ring', frequencyGHz: 28, periodMm: 5, thetaDeg: 30 });
    expect(refused).toEqual([]);
  });

  it('leaves out what it cannot read, and says so', () => {
    const { search, refused } = readSearch({ text: '', frequency: '28 m', period: '', angle: '' });
    expect(search.frequencyGHz).toBeUndefined();
    expect(refused).toEqual([expect.stringMatching(/^28 m: /)]);
  });
});
