import { Api, STRANGER } from '../support/api';
import type { ApiClient } from '../support/api-client';
import { routeSamples, type RouteSample } from '../support/route-samples';

/** Everybody who may stand before a route with an id, and what each is answered. */
const statusesOf = ({ okStatus, teammate }: RouteSample): Record<string, number> => ({
  owner: okStatus,
  teammate: teammate.status,
  'other team': 404,
  anonymous: 401,
  disabled: 401,
});

describe('access to objects by id', () => {
  let api: Api;
  beforeAll(async () => {
    api = await Api.start();
  }, 60_000);
  afterAll(() => api.close());

  it('has a sample for every route with an id', () => {
    const withId = api.routes.filter(({ path }) => path.includes(':')).map(({ method, path }) => `${method} ${path}`);
    expect(withId.filter((route) => routeSamples[route] === undefined)).toEqual([]);
    expect(Object.keys(routeSamples).filter((route) => !withId.includes(route))).toEqual([]);
  });

  const membership = `membership.person_id = person.id AND person.email = $1`;
  const setDisabled = (account: string, disabled: boolean): Promise<unknown> =>
    api.query(`UPDATE membership SET disabled_at = ${disabled ? 'now()' : 'NULL'} FROM person WHERE ${membership}`, [`${account}@merrow.example`]);

  async function statusFor(route: string, who: string, sample: RouteSample): Promise<number> {
    const { path, ...call } = await sample.prepare(api);
    const [method = ''] = route.split(' ');
    const send = async (client: ApiClient): Promise<number> => (await client.send(method.toUpperCase(), path, call)).status;
    if (who === 'anonymous') return send(api.anonymous());
    if (who === 'other team') return send(await api.signedIn(STRANGER));
    const client = await api.signedIn(who === 'teammate' ? sample.teammate.account : sample.owner);
    if (who !== 'disabled') return send(client);
    await setDisabled(sample.owner, true);
    try {
      return await send(client);
    } finally {
      await setDisabled(sample.owner, false);
    }
  }

  it.each(Object.entries(routeSamples))('%s answers each by who they are', async (route, sample) => {
    const statuses: Record<string, number> = {};
    for (const who of Object.keys(statusesOf(sample))) statuses[who] = await statusFor(route, who, sample);
    expect(statuses).toEqual(statusesOf(sample));
  }, 30_000);
});
