import { randomUUID } from 'node:crypto';
import { exampleEdition } from '../../shared/antenna/example-edition';
import type { EditionSource } from '../../server/predictions/edition-source';
import { InMemoryEditionSource } from '../../server/predictions/in-memory-edition-source';
import { Api } from '../support/api';
import { acceptedEdition, publishedEdition } from '../support/published-edition';

/** Predictions run in the test's own thread here, several to a test. */
jest.setTimeout(30_000);

interface Sourced {
  readonly source: EditionSource;
  readonly teamId: string;
  readonly otherTeamId: string;
  readonly editionId: string;
}

/** What predictions rely on, whoever provides the editions. */
function keepsItsPromises(make: () => Promise<Sourced>): void {
  it('gives a published edition with its responses and the hash that names them', async () => {
    const { source, teamId, editionId } = await make();
    const { hash, cells, responses, description } = await source.editionForEngine(teamId, editionId);
    expect(hash).toMatch(/^[0-9a-f]{64}$/);
    expect(responses.cellCount).toBe(cells.length);
    const { frequenciesHz, thetasRad, phisRad } = responses;
    const points = cells.length * thetasRad.length * phisRad.length * frequenciesHz.length;
    expect([responses.values.length, responses.present.length]).toEqual([8 * points, points]);
    expect(description.parameters.length).toBeGreaterThan(0);
  });

  it('gives the same twice', async () => {
    const { source, teamId, editionId } = await make();
    expect(await source.editionForEngine(teamId, editionId)).toEqual(await source.editionForEngine(teamId, editionId));
  });

  it('says there is none to another team, and for an unknown id', async () => {
    const { source, teamId, otherTeamId, editionId } = await make();
    await expect(source.editionForEngine(otherTeamId, editionId)).rejects.toMatchObject({ kind: 'not-found' });
    await expect(source.editionForEngine(teamId, randomUUID())).rejects.toMatchObject({ kind: 'not-found' });
  });
}

describe('editions in memory', () => {
  keepsItsPromises(async () => {
    const source = new InMemoryEditionSource();
    const editionId = randomUUID();
    source.add('one', editionId, exampleEdition(), 'a'.repeat(64));
    return { source, teamId: 'one', otherTeamId: 'two', editionId };
  });
});

describe('editions of the library', () => {
  let api: Api;
  let given: Sourced;
  beforeAll(async () => {
    api = await Api.start();
    const { id: editionId } = await publishedEdition(api);
    const [teams] = await api.query<{ own: string; other: string }>(
      `SELECT (SELECT team_id FROM edition LIMIT 1) AS own, (SELECT id FROM team WHERE id <> (SELECT team_id FROM edition LIMIT 1) LIMIT 1) AS other`,
    );
    given = { source: api.house.library, teamId: teams?.own ?? '', otherTeamId: teams?.other ?? '', editionId };
  }, 60_000);
  afterAll(() => api.close());

  keepsItsPromises(async () => given);

  it('give no edition that is only accepted', async () => {
    const { id } = await acceptedEdition(api);
    await expect(api.house.library.editionForEngine(given.teamId, id)).rejects.toMatchObject({ kind: 'not-found' });
  });
});
