import * as fc from 'fast-check';
import { coPolarResponse, incidenceWeigher, type PolarResponse } from './cell-response';
import { chooseListed, editionChooser } from './edition-choice';
import { EXAMPLE_DESIGN, exampleDesign } from './example-design';
import { exampleEdition } from './example-edition';
import { placeCells } from './place-cells';
import { copyStates, keptPositionStates, listPositionStates, type PositionStates } from './position-states';
import { prepareEdition } from './prepare-edition';
import { newCellStates, type CellStates } from './reference-search';

const prepared = prepareEdition(exampleEdition());
const at = prepared.atFrequency(10.1e9);
/** Incidence and azimuth, and how many of the first cells may be used there. */
const places = [
  { incidenceRad: 0, azimuthRad: 0, allowedCount: 24 },
  { incidenceRad: 0.4, azimuthRad: 1.1, allowedCount: 7 },
  { incidenceRad: 0.9, azimuthRad: -2.5, allowedCount: 0 },
  { incidenceRad: 1.0, azimuthRad: 3, allowedCount: 24 },
] as const;
const weigh = incidenceWeigher(prepared, 'x');

function statesAt(n: number, states: CellStates): void {
  const { incidenceRad, azimuthRad, allowedCount } = places[n];
  const weights = weigh(incidenceRad, azimuthRad);
  const response: PolarResponse = { magnitude: 0, phaseRad: 0 };
  states.count = allowedCount;
  for (let k = 0; k < allowedCount; k++) {
    coPolarResponse(at, k, weights, response);
    [states.index[k], states.phaseRad[k], states.magnitude[k]] = [k, response.phaseRad, response.magnitude];
  }
}

const listed = listPositionStates({ positionCount: places.length, capacity: 24, statesAt }, newCellStates(24));

describe('states listed by position', () => {
  it('gives every position its own states back, and none where none is allowed', () => {
    const [found, direct] = [newCellStates(24), newCellStates(24)];
    places.forEach((_, n) => {
      copyStates(listed, n, found);
      statesAt(n, direct);
      expect(found.count).toBe(places[n].allowedCount);
      expect(found.phaseRad.slice(0, found.count)).toEqual(direct.phaseRad.slice(0, direct.count));
      expect(found.magnitude.slice(0, found.count)).toEqual(direct.magnitude.slice(0, direct.count));
    });
    expect(chooseListed(listed, 2, 'nearest-phase', 1)).toBe(-1);
  });

  it.each(['nearest-phase', 'least-error'] as const)('gives by %s the cell that is chosen without a list', (rule) => {
    const choose = editionChooser(at, rule);
    fc.assert(
      fc.property(fc.double({ min: -40, max: 40, noNaN: true }), fc.constantFrom(0, 1, 3), (target, n) => {
        const { incidenceRad, azimuthRad, allowedCount } = places[n];
        const allowed = Int32Array.from({ length: allowedCount }, (_, k) => k);
        expect(listed.index[chooseListed(listed, n, rule, target)]).toBe(choose(target, weigh(incidenceRad, azimuthRad), allowed));
      }),
      { numRuns: 500 },
    );
  });
});

describe('states kept while the beam is steered', () => {
  it('lists a panel once, and forgets the one not asked for the longest of three', () => {
    const edition = prepareEdition(exampleEdition());
    const lists: string[] = [];
    const light = { incidenceRad: Float64Array.of(0.1, 0.2), azimuthRad: Float64Array.of(1, 2) };
    const ask = (key: string, lit = light): PositionStates =>
      keptPositionStates(edition, key, lit, () => {
        lists.push(key);
        return listed;
      });
    for (const key of ['a', 'b', 'a', 'c', 'a', 'b']) ask(key);
    expect(lists).toEqual(['a', 'b', 'c', 'b']);
    ask('b', { ...light, incidenceRad: Float64Array.of(0.1, 0.2) });
    ask('b', { ...light, incidenceRad: Float64Array.of(0.1, 0.3) });
    ask('b', { incidenceRad: Float64Array.of(0.1), azimuthRad: Float64Array.of(1) });
    expect(lists).toEqual(['a', 'b', 'c', 'b', 'b', 'b']);
  });

  it('places after any other beam, panel or horn what a fresh edition places', () => {
    const cells = { kind: 'edition', editionId: '00000000-0000-4000-8000-000000000001', rule: 'nearest-phase', excludedCells: [] as string[] } as const;
    const base = exampleDesign({ cells: { ...cells, excludedCells: [] }, referencePhaseDeg: 'search' });
    const { requirement, panel, illumination } = EXAMPLE_DESIGN;
    const steered = exampleDesign({ ...base, requirement: { ...requirement, beams: [{ thetaDeg: 31, phiDeg: 40 }] } });
    const smaller = exampleDesign({ ...base, panel: { ...panel, outline: { kind: 'rectangle', widthMm: 150, heightMm: 150 } } });
    const moved = exampleDesign({ ...base, illumination: { ...illumination, kind: 'horn', positionMm: [-40, 10, 210], aimMm: [0, 0, 0], exponentE: 4, exponentH: 5 } });
    const fewer = exampleDesign({ ...base, cells: { ...cells, excludedCells: ['cell-3'] } });
    const shared = prepareEdition(exampleEdition());
    for (const design of [base, steered, smaller, moved, fewer, base]) {
      const fresh = placeCells(design, prepareEdition(exampleEdition()));
      const again = placeCells(design, shared);
      expect(again.assignment).toEqual(fresh.assignment);
      expect(again.referencePhaseRad).toBe(fresh.referencePhaseRad);
    }
  });
});
