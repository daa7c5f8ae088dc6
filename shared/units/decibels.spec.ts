import { amplitudeRatioToDb, dbToAmplitudeRatio, dbToPowerRatio, powerRatioToDb } from './decibels';

describe('decibels', () => {
  it('gives a doubled power 3.0103 dB and a doubled amplitude 6.0206 dB', () => {
    expect(powerRatioToDb(2)).toBeCloseTo(3.0103, 5);
    expect(amplitudeRatioToDb(2)).toBeCloseTo(6.0206, 5);
  });

  it.each([-40, -3, 0, 0.1, 27])('returns %d dB to itself through both ratios', (db) => {
    expect(powerRatioToDb(dbToPowerRatio(db))).toBeCloseTo(db, 12);
    expect(amplitudeRatioToDb(dbToAmplitudeRatio(db))).toBeCloseTo(db, 12);
  });
});
