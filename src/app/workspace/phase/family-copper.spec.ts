import { SAMPLE_EDITION } from './sample-phase';
import { familyCopper } from './family-copper';

it('puts the parameters of a cell into the shapes of its family', () => {
  expect(familyCopper(SAMPLE_EDITION.description, [2.3])).toEqual([
    { kind: 'ring', outerMm: 2.3, stripMm: 0.15 },
    { kind: 'rectangle', widthMm: 0.62 * 2.3, heightMm: 0.62 * 2.3, hole: false },
  ]);
});

it('adds a constant and never makes a length negative', () => {
  const description = { ...SAMPLE_EDITION.description, shapes: [{ kind: 'disc' as const, diameterMm: { parameter: 'a', factor: 1, plusMm: -0.5 }, hole: true }] };
  expect(familyCopper(description, [2])).toEqual([{ kind: 'disc', diameterMm: 1.5, hole: true }]);
  expect(familyCopper(description, [0.2])).toEqual([{ kind: 'disc', diameterMm: 0, hole: true }]);
});
