import { keyMarkup, keyStops, keyTicks } from './colour-key-scale';

describe('colour key', () => {
  it('says that both ends of a phase are one value and marks the wrap', () => {
    const ticks = keyTicks({ map: 'cyclic', from: -180, to: 180 }, 6);
    expect(ticks.map(({ text }) => text)).toEqual(['±180', '\u221290', '0', '90', '±180']);
    expect(ticks.map(({ wrap }) => wrap)).toEqual([true, false, false, false, true]);
  });
  it('signs a difference and leaves a magnitude unsigned', () => {
    expect(keyTicks({ map: 'diverging', from: -15, to: 15 }, 6).map(({ text }) => text)).toEqual(['\u221215', '\u221210', '\u22125', '0', '+5', '+10', '+15']);
    expect(keyTicks({ map: 'sequential', from: -50, to: 0 }, 6).map(({ text }) => text)).toEqual(['\u221250', '\u221240', '\u221230', '\u221220', '\u221210', '0']);
  });
  it('runs through the map of the theme from end to end', () => {
    const stops = keyStops({ map: 'diverging', from: -1, to: 1 }, 'light');
    expect([stops[0].colour, stops[32].colour]).toEqual(['rgb(2,91,117)', 'rgb(130,60,7)']);
  });
  it('goes with an exported picture under its title and unit', () => {
    const layer = { title: 'Phase error', unit: '°', scale: { map: 'diverging', from: -15, to: 15 } } as const;
    const { markup } = keyMarkup(layer, { name: 'light', ink: '#000', muted: '#555', ruleStrong: '#888' }, 300);
    expect(new DOMParser().parseFromString(`<svg xmlns="http://www.w3.org/2000/svg">${markup}</svg>`, 'image/svg+xml').querySelector('text')?.textContent).toBe('Phase error, °');
  });
});
