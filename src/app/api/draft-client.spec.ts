import { provideHttpClient } from '@angular/common/http';
import { HttpTestingController, provideHttpClientTesting } from '@angular/common/http/testing';
import { TestBed } from '@angular/core/testing';
import { STARTING_DESIGN } from '../../../shared/model/starting-design';
import { DraftClient } from './draft-client';

const panel = {
  id: '6f9619ff-8b86-4d01-b42d-00cf4fc964ff',
  project: { id: '6f9619ff-8b86-4d01-b42d-00cf4fc964fe', name: 'Merrow Point sea-rescue link', invented: true },
  name: 'Panel A',
  design: STARTING_DESIGN,
  draftHash: 'b'.repeat(64),
  etag: '"v2"',
  changedAt: '2026-12-01T14:02:31Z',
  changedBy: { id: '6f9619ff-8b86-4d01-b42d-00cf4fc964fd', name: 'Second designer' },
  latestRevision: null,
  draftIsRevision: false,
};
const refusal = (status: number, more: object = {}) => ({ type: 'about:blank', title: 'Refused', status, detail: 'One value is not valid.', ...more });

describe('DraftClient', () => {
  let client: DraftClient;
  let server: HttpTestingController;
  beforeEach(() => {
    TestBed.configureTestingModule({ providers: [provideHttpClient(), provideHttpClientTesting()] });
    client = TestBed.inject(DraftClient);
    server = TestBed.inject(HttpTestingController);
  });
  afterEach(() => server.verify());

  const answer = (body: object, status = 200) => server.expectOne(`/api/panels/${panel.id}/draft`).flush(body, { status, statusText: String(status) });

  it('sends the ETag it was given and reads the new one', async () => {
    const saving = client.save(panel.id, STARTING_DESIGN, '"v1"');
    const request = server.expectOne(`/api/panels/${panel.id}/draft`);
    expect([request.request.method, request.request.headers.get('If-Match')]).toEqual(['PUT', '"v1"']);
    request.flush({ etag: '"v2"', draftHash: 'a'.repeat(64), changedAt: '2026-12-01T14:02:31Z', draftIsRevision: false });
    expect(await saving).toMatchObject({ kind: 'saved', saved: { etag: '"v2"' } });
  });

  it('brings the state of the others from a stale answer', async () => {
    const saving = client.save(panel.id, STARTING_DESIGN, '"v1"');
    answer(refusal(412, { current: panel }), 412);
    expect(await saving).toEqual({ kind: 'stale', current: panel });
  });

  it('brings the faults of a refused design by their place in it', async () => {
    const saving = client.save(panel.id, STARTING_DESIGN, '"v1"');
    answer(refusal(422, { errors: [{ pointer: '#/design/panel', detail: 'too many cells' }] }), 422);
    expect(await saving).toEqual({ kind: 'refused', detail: 'One value is not valid.', faults: [{ pointer: '/panel', detail: 'too many cells' }] });
  });

  it.each([401, 429, 500, 503])('keeps trying after an answer %d', async (status) => {
    const saving = client.save(panel.id, STARTING_DESIGN, '"v1"');
    answer(refusal(status), status);
    expect(await saving).toEqual({ kind: 'unreachable' });
  });

  it('keeps trying when nobody answers', async () => {
    const saving = client.save(panel.id, STARTING_DESIGN, '"v1"');
    server.expectOne(`/api/panels/${panel.id}/draft`).error(new ProgressEvent('error'));
    expect(await saving).toEqual({ kind: 'unreachable' });
  });

  it('tells a panel that is not there from a server that is not', async () => {
    const reading = client.read(panel.id);
    server.expectOne(`/api/panels/${panel.id}`).flush(refusal(404), { status: 404, statusText: 'Not Found' });
    expect(await reading).toMatchObject({ kind: 'refused', problem: { status: 404 } });
  });
});
