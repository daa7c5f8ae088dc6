import { oneTabAtATime } from './one-tab-at-a-time';

describe('work of one tab at a time', () => {
  afterEach(() => Reflect.deleteProperty(navigator, 'locks'));

  it('runs at once where the browser has no locks', async () => {
    expect(await oneTabAtATime(() => Promise.resolve('done'))).toBe('done');
  });

  it('waits for the lock that all tabs share', async () => {
    const order: string[] = [];
    const request = async (name: string, work: () => Promise<string>): Promise<string> => {
      order.push(`held ${name}`);
      const answer = await work();
      order.push('freed');
      return answer;
    };
    Object.defineProperty(navigator, 'locks', { configurable: true, value: { request } });
    await oneTabAtATime(() => {
      order.push('work');
      return Promise.resolve('done');
    });
    expect(order).toEqual(['held slantwise-session', 'work', 'freed']);
  });
});
