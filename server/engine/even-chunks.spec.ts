import { evenChunks } from './even-chunks';

describe('evenChunks', () => {
  it('covers every item once, in chunks of about a second', () => {
    const chunks = evenChunks(101, 0.03);
    expect(chunks.map(({ chunk }) => [chunk.from, chunk.to])).toEqual([[0, 25], [25, 50], [50, 75], [75, 101]]);
    expect(chunks.every(({ seconds }) => seconds <= 1)).toBe(true);
  });

  it('gives a slow item a chunk of its own, and nothing no chunk', () => {
    expect(evenChunks(2, 5)).toEqual([{ chunk: { from: 0, to: 1 }, seconds: 5 }, { chunk: { from: 1, to: 2 }, seconds: 5 }]);
    expect(evenChunks(0, 1)).toEqual([]);
  });
});
