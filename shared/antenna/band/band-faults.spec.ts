import { exampleDesign, planeWaveDesign } from '../example-design';
import { bandFaults } from './band-faults';

const inBand = exampleDesign({ requirement: { designFrequencyGHz: 10, bandGHz: [9.5, 10.5], beams: [{ thetaDeg: 20, phiDeg: 0 }], polarisation: 'x' } });

describe('bandFaults', () => {
  it('finds none where the requirement has a band', () => {
    expect(bandFaults({ design: inBand, parameters: { frequencyCount: 3 } })).toEqual([]);
  });

  it('asks for a band where neither has one, and for one that rises', () => {
    expect(bandFaults({ design: exampleDesign(), parameters: { frequencyCount: 3 } })).toEqual([{ pointer: '#/parameters/bandGHz', detail: 'say the band: the requirement names none' }]);
    expect(bandFaults({ design: inBand, parameters: { frequencyCount: 3, bandGHz: [10, 10] } })).toEqual([{ pointer: '#/parameters/bandGHz', detail: 'must rise; got 10 to 10 GHz' }]);
  });

  it('names every fault of a moving phase centre', () => {
    const phaseCentre: [number, number][] = [[10, 0], [10, 300]];
    expect(bandFaults({ design: inBand, parameters: { frequencyCount: 3, phaseCentre } })).toEqual([
      { pointer: '#/parameters/phaseCentre/1/0', detail: 'frequencies must rise; got 10 after 10 GHz' },
      { pointer: '#/parameters/phaseCentre/1/1', detail: '300 mm would take the phase centre to its aim or through the panel; the aim is 240 mm away' },
    ]);
    const wave = planeWaveDesign({ requirement: inBand.requirement });
    expect(bandFaults({ design: wave, parameters: { frequencyCount: 3, phaseCentre } })).toEqual([{ pointer: '#/parameters/phaseCentre', detail: 'only a horn has a phase centre that moves' }]);
  });
});
