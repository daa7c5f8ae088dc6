import { colourMap } from './colour-maps';
import { uvImageWords } from './paint-uv-map';

describe('image of the hemisphere', () => {
  const scale = { map: 'sequential', from: -50, to: 0 } as const;
  const size = 33;
  const levelDb = Float32Array.from({ length: size * size }, (_, i) => (Math.floor(i / size) > size / 2 ? 0 : -50));
  const words = uvImageWords({ size, levelDb }, scale, 'light', 64);
  const map = colourMap('sequential', 'light');

  it('is clear outside the visible circle', () => {
    expect([words[0], words[63], words[64 * 64 - 1]]).toEqual([0, 0, 0]);
  });
  it('has v upwards: what radiates at positive v is drawn in the upper half', () => {
    expect(words[10 * 64 + 32]).toBe(map.words[255]);
    expect(words[54 * 64 + 32]).toBe(map.words[0]);
  });
});
