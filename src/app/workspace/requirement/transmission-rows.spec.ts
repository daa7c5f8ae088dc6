import type { ExposureFigures } from '../../../../shared/model/transmission-figures';
import { SAMPLE_HEAD } from '../sample-prediction';
import { estimateText, limitRows, linkRows, receiverRows, transmitterRows, zoneRows } from './transmission-rows';

const limit = { limitWPerM2: 10, averagingMin: 30, distanceM: 29.34 };
const none = { kind: 'outside-table', reason: 'the table does not hold 140 GHz' };
const exposure: ExposureFigures = {
  averagePowerW: 7.9433,
  surfaceWPerM2: 794.3,
  nearFieldWPerM2: 385.2,
  nearFieldEndM: 1.8682,
  farFieldFromM: 4.4837,
  feedSpaceWPerM2: 51.234,
  fccPublic: limit,
  fccOccupational: { ...limit, limitWPerM2: 50, averagingMin: 6, distanceM: 0 },
  icnirpPublic: none,
  icnirpOccupational: limit,
  icnirpPublicLocal: { ...limit, limitWPerM2: 30.494, distanceM: { kind: 'focused', reason: 'the panel focuses' } },
  icnirpOccupationalLocal: limit,
};
const plain = (text: string): string => text.replace(/\u00a0/g, ' ');

describe('exposure as text', () => {
  it('claims three digits and no more', () => {
    expect([0, 0.012345, 1.8682, 51.234, 794.3, 18234].map((value) => plain(estimateText(value, 'm')))).toEqual(['0 m', '0.0123 m', '1.87 m', '51.2 m', '794 m', '18 200 m']);
  });

  it('names each limit with its source, mean and distance', () => {
    const rows = limitRows(exposure);
    expect(rows.map(({ source, audience }) => `${source}, ${audience}`)[0]).toBe('FCC 47 CFR 1.1310, public');
    expect(plain(`${rows[0].limit} ${rows[0].averaging} ${rows[0].distance}`)).toBe('10.0 W/m² 30 min 29.3 m');
  });

  it('says why there is no distance', () => {
    const rows = limitRows(exposure);
    expect([plain(rows[1].distance), rows[1].note]).toEqual(['0 m', null]);
    expect([rows[2].distance, rows[2].note]).toEqual(['–', 'the table does not hold 140 GHz']);
    expect([rows[4].distance, rows[4].note]).toEqual(['–', 'the panel focuses']);
  });

  it('tells the zones, the space between horn and panel and the focus', () => {
    const rows = zoneRows({ ...exposure, focusWPerM2: { kind: 'null', reason: 'no scale' } });
    expect(rows.map(({ name }) => plain(name))).toEqual(['Mean power to the antenna', 'At the surface, 4P/A', 'Near field, to 1.87 m', 'Far field from', 'Between horn and panel', 'At the focus']);
    expect(rows[5].value).toBe('no scale');
    expect(zoneRows(exposure)).toHaveLength(5);
  });

  it('never calls anything safe', () => {
    const words = [...limitRows(exposure), ...zoneRows(exposure)].map((row) => JSON.stringify(row)).join(' ');
    expect(words).not.toMatch(/\bsafe|compliant|approved|certified/i);
  });
});

describe('budgets as text', () => {
  const { figures } = SAMPLE_HEAD;

  it('hold a unit, or the reason why there is no value', () => {
    expect(transmitterRows({ ...figures, eirpDbw: 34.756, eirpDensityDbw: { kind: 'x', reason: 'why' } }).map(({ value }) => plain(value))).toEqual(['34.76 dBW', 'why']);
    expect(receiverRows({ ...figures, systemTemperatureK: 125.84, gainOverTemperatureDbPerK: 11.5 }).map(({ value }) => plain(value))).toEqual(['125.8 K', '11.50 dB/K']);
  });

  it('tell both hops of a way over the panel', () => {
    const link = { receivedDbm: -48.757, freeSpaceLossDb: [107.41, 99.45], crossSectionDbsm: 27.71, farFieldFromM: 33.62 };
    expect(linkRows({ ...figures, link }).map(({ name, value }) => `${name}: ${plain(value)}`)).toEqual([
      'Free-space loss, hop 1: 107.41 dB',
      'Free-space loss, hop 2: 99.45 dB',
      'Cross-section of the panel: 27.71 dBsm',
      'Far field of the panel from: 33.6 m',
      'Received power: \u221248.76 dBm',
    ]);
    expect(linkRows({ ...figures, link: { kind: 'own-feed', reason: 'the panel has a feed' } })).toEqual([{ name: 'Link', value: 'the panel has a feed' }]);
    expect(linkRows(figures)).toEqual([]);
  });
});
