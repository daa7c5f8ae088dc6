import { TestBed } from '@angular/core/testing';
import { Subject } from 'rxjs';
import type { Inspection } from '../../../shared/contracts/library';
import { LibraryDesk } from '../api/library-desk';
import type { UploadStep } from '../api/library-desk';
import { ImportJob } from './import-job';

const found: Inspection = {
  files: [], messages: [], quality: null, refusals: [], preview: null, acceptable: false,
  detected: { portCount: 1, parameterNames: ['ringOuterSide'], thetasDeg: [0], phisDeg: [0], frequencyRangeGHz: { from: 24, to: 32 }, frequencyCount: 41, cellCount: 4, portsHint: 'either', provenanceHint: 'simulated', timeConventionHint: 'exp(+jwt)', descriptionHint: { periodXMm: 5, provenance: 'simulated' } },
};

describe('import', () => {
  let steps: Subject<UploadStep<Inspection>>;
  let job: ImportJob;
  beforeEach(() => {
    steps = new Subject();
    TestBed.configureTestingModule({ providers: [ImportJob, { provide: LibraryDesk, useValue: { inspect: () => steps } }] });
    job = TestBed.inject(ImportJob);
    job.take([new File(['x'], 'a.s1p')]);
  });

  it('tells how far the upload is, then that the server reads, then what was found', () => {
    steps.next({ kind: 'sending', share: 0.4 });
    expect(job.progress()).toEqual({ kind: 'sending', share: 0.4 });
    steps.next({ kind: 'reading' });
    expect(job.busy()).toBe(true);
    steps.next({ kind: 'done', answer: found });
    expect(job.busy()).toBe(false);
    expect(job.inspection()?.detected.cellCount).toBe(4);
  });

  it('fills the description from the files but never over what a person typed', () => {
    job.type('periodXMm', '5.2');
    steps.next({ kind: 'done', answer: found });
    expect(job.entries()['periodXMm']).toBe('5.2');
    expect(job.entries()['provenance']).toBe('simulated');
    expect(job.parts().parameters).toEqual([{ id: 'ringOuterSide', label: 'Ring outer side', unit: 'mm' }]);
  });
});
