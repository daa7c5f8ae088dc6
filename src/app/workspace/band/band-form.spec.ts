import { STARTING_DESIGN } from '../../../../shared/model/starting-design';
import { FIRST_FORM, bandParametersOf, formFault, formOf } from './band-form';

const bare = { ...STARTING_DESIGN, requirement: { ...STARTING_DESIGN.requirement, bandGHz: undefined } };
const banded = { ...STARTING_DESIGN, requirement: { ...STARTING_DESIGN.requirement, bandGHz: [27, 29] as [number, number] } };

describe('band form', () => {
  it('leaves the band to the requirement, so that equal questions have equal words', () => {
    expect(bandParametersOf(FIRST_FORM, banded)).toEqual({ frequencyCount: 21, spatialPart: true });
    expect(bandParametersOf({ ...FIRST_FORM, fromGHz: 26 }, banded)).toMatchObject({ bandGHz: [26, 29] });
  });

  it('reads back what it asked', () => {
    const form = { ...FIRST_FORM, fromGHz: 26, toGHz: 30, spatialPart: false, lowerOffsetMm: -2, upperOffsetMm: 2 };
    expect(formOf(bandParametersOf(form, banded))).toEqual(form);
    expect(formOf(bandParametersOf(FIRST_FORM, banded))).toEqual(FIRST_FORM);
  });

  it('asks for a band where there is none, and for one that rises', () => {
    expect(formFault(FIRST_FORM, bare)).toBe('Say the band here, or in the requirement');
    expect(formFault({ ...FIRST_FORM, fromGHz: 30 }, banded)).toBe('The band must rise; it goes from 30 to 29 GHz');
    expect(formFault(FIRST_FORM, banded)).toBeNull();
  });

  it('moves the phase centre of a horn between the edges, and of nothing else', () => {
    const form = { ...FIRST_FORM, upperOffsetMm: 4 };
    expect(bandParametersOf(form, banded).phaseCentre).toEqual([[27, 0], [29, 4]]);
    const wave = { ...banded, illumination: { kind: 'plane-wave' as const, thetaDeg: 0, phiDeg: 0, polarisation: 'x' as const } };
    expect(bandParametersOf(form, wave).phaseCentre).toBeUndefined();
  });
});
