import { provideHttpClient } from '@angular/common/http';
import { HttpTestingController, provideHttpClientTesting } from '@angular/common/http/testing';
import { TestBed } from '@angular/core/testing';
import { LibraryClient } from './library-client';

const EDITION = '6f9619ff-8b86-4d01-b42d-00cf4fc964ff';

describe('LibraryClient', () => {
  let client: LibraryClient;
  let server: HttpTestingController;
  beforeEach(() => {
    TestBed.configureTestingModule({ providers: [provideHttpClient(), provideHttpClientTesting()] });
    client = TestBed.inject(LibraryClient);
    server = TestBed.inject(HttpTestingController);
  });
  afterEach(() => server.verify());

  const refuse = (status: number): void => {
    server.expectOne(`/api/library/editions/${EDITION}/responses`).error(new ProgressEvent('error'), { status, statusText: 'Refused' });
    server.match(`/api/library/editions/${EDITION}`);
  };

  it('asks once for an edition that two sheets want', async () => {
    const both = Promise.all([client.edition(EDITION), client.edition(EDITION)]);
    refuse(404);
    expect((await both).map(({ kind }) => kind)).toEqual(['missing', 'missing']);
  });

  it('asks again after a failure', async () => {
    const first = client.edition(EDITION);
    refuse(0);
    expect(await first).toEqual({ kind: 'missing', reason: 'The server is out of reach' });
    const second = client.edition(EDITION);
    refuse(404);
    expect((await second).kind).toBe('missing');
  });

  it('narrows the list of families by what is given only', async () => {
    const families = client.families({ frequencyGHz: 28, periodMm: 5 });
    const request = server.expectOne(({ url }) => url === '/api/library/families');
    expect(request.request.params.toString()).toBe('frequencyGHz=28&periodMm=5');
    request.flush({ items: [] });
    expect(await families).toEqual([]);
  });
});
