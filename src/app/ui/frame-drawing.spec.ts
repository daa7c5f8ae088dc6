import { frameDrawing } from './frame-drawing';

describe('drawing frame', () => {
  it('numbers eight zones along a wide sheet and letters its height, on both edges', () => {
    const frame = frameDrawing({ width: 1240, height: 760 });
    expect(frame?.labels.filter(({ key }) => key.startsWith('top')).map(({ text }) => text)).toEqual(['1', '2', '3', '4', '5', '6', '7', '8']);
    expect(frame?.labels.filter(({ key }) => key.startsWith('right')).map(({ text }) => text)).toEqual(['A', 'B', 'C', 'D']);
  });

  it('draws fewer zones on a narrow sheet and none before there is a sheet', () => {
    expect(frameDrawing({ width: 380, height: 800 })?.labels.filter(({ key }) => key.startsWith('top'))).toHaveLength(4);
    expect(frameDrawing({ width: 0, height: 0 })).toBeNull();
  });
});
