import { convertToParamMap } from '@angular/router';
import type { PanelDetail } from '../../../../shared/contracts/projects';
import { draftSide, firstSides, readCompareLink, revisionSide, writeCompareLink } from './compare-link';
import { SAMPLE_ID, sampleRevision } from './sample-comparison';

const panel = { id: SAMPLE_ID(2), latestRevision: sampleRevision(3), draftIsRevision: false } as PanelDetail;
const nothing = { before: null, after: null };

describe('sides of a comparison', () => {
  it('are read from the address and written into it', () => {
    const link = { before: revisionSide(SAMPLE_ID(103)), after: draftSide(SAMPLE_ID(2)) };
    expect(readCompareLink(convertToParamMap(writeCompareLink(link)))).toEqual(link);
    expect(readCompareLink(convertToParamMap({ before: 'revision:3', after: '<script>' }))).toEqual(nothing);
  });
  it('are the latest revision and the draft when the address names none', () => {
    expect(firstSides(nothing, panel)).toEqual({ before: revisionSide(SAMPLE_ID(103)), after: draftSide(SAMPLE_ID(2)) });
  });
  it('are the latest revision and its parent while the draft equals it', () => {
    expect(firstSides(nothing, { ...panel, draftIsRevision: true })).toEqual({ before: revisionSide(SAMPLE_ID(102)), after: revisionSide(SAMPLE_ID(103)) });
  });
  it('do not exist before the first revision', () => {
    expect(firstSides(nothing, { ...panel, latestRevision: null })).toEqual({ reason: expect.stringContaining('no revision yet') });
  });
});
