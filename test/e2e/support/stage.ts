import { ApiClient } from '../../support/api-client';
import { TestBrowser } from '../../support/browser';
import type { PageWish, WatchedPage } from '../../support/browser';
import { runningProduct } from '../../support/product';
import type { RunningProduct } from '../../support/product';

export type DemoName = 'admin' | 'designer' | 'lab' | 'reviewer' | 'fabricator' | 'range';

/** A build, a database and the demonstration data may have to be made first. */
export const STAGE_START_MS = 200_000;

export const demoAddress = (name: DemoName): string => `${name}@merrow.example`;

/** A word that no earlier run on the same data has used. */
export const freshWord = (): string => Date.now().toString(36).slice(-6);

/** The running product with a browser before it. */
export class Stage {
  private constructor(
    private readonly product: RunningProduct,
    readonly browser: TestBrowser,
  ) {}

  static async open(): Promise<Stage> {
    const product = await runningProduct();
    return new Stage(product, await TestBrowser.launch(product.url));
  }

  get origin(): string {
    return this.product.url;
  }

  get password(): string {
    return this.product.password;
  }

  /** A browser of its own in which this person has signed in already. */
  async pageOf(name: DemoName, wish?: PageWish): Promise<WatchedPage> {
    const watched = await this.browser.openPage(wish);
    const { email, password } = this.credentials(name);
    const answer = await watched.page.context().request.post('/api/session', { data: { email, password } });
    if (!answer.ok()) throw new Error(`${email} could not sign in: ${answer.status()} ${await answer.text()}`);
    return watched;
  }

  /** The same person as a script, to prepare what a test needs and to ask what the server holds. */
  async apiOf(name: DemoName): Promise<ApiClient> {
    const client = new ApiClient(this.product.url);
    const answer = await client.post('/api/session', this.credentials(name));
    if (answer.status >= 400) throw new Error(`${name} could not sign in: ${answer.status}`);
    return client;
  }

  private credentials(name: DemoName): { email: string; password: string } {
    return { email: demoAddress(name), password: this.product.password };
  }

  async close(): Promise<void> {
    await this.browser.close();
    await this.product.stop();
  }
}
