import { requirementText, requirementWord, revisionRows } from './revision-rows';
import { sampleRevision } from './sample-comparison';

describe('list of revisions', () => {
  const verdict = { line: 'gain', sense: 'at-least', limit: 34, unit: 'dBi', value: 34.76, margin: 0.76, verdict: 'meets' } as const;
  const [row, unpredicted] = revisionRows([
    { ...sampleRevision(4), restoredFromNumber: 2, summary: { cellCount: 1600, gainDbi: 34.76, verdicts: [verdict], overall: 'meets' } },
    { ...sampleRevision(1), summary: null },
  ]);

  it('dates in UTC, shortens the hash and keeps it whole beside', () => {
    expect([row.time, row.hash, row.fullHash.length]).toEqual(['2026-11-24 09:12', '444444444444', 64]);
  });
  it('tells where the content came from', () => {
    expect([row.lineage, unpredicted.lineage]).toEqual(['child of 3, content of 2', 'first']);
  });
  it('gives gain and requirement of what can be predicted, and says what cannot', () => {
    expect([row.gain, row.requirement, row.overall]).toEqual(['34.76', '1 met', 'meets']);
    expect([unpredicted.gain, unpredicted.requirement, unpredicted.overall]).toEqual(['–', 'cannot be predicted', 'not-evaluated']);
  });
  it('never shows what is open as met', () => {
    expect([requirementWord({ met: 3, short: 0, open: 1 }), requirementWord({ met: 0, short: 0, open: 0 }), requirementWord({ met: 3, short: 1, open: 0 })]).toEqual(['not-evaluated', 'not-evaluated', 'falls-short']);
    expect([requirementText({ met: 0, short: 2, open: 0 }), requirementText({ met: 0, short: 0, open: 0 })]).toEqual(['2 fall short', 'no limit set']);
  });
});
