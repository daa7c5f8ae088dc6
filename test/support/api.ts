import { mkdtempSync, rmSync } from 'node:fs';
import { createServer, type Server } from 'node:http';
import { once } from 'node:events';
import type { AddressInfo } from 'node:net';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import type { DataSource } from 'typeorm';
import { role, type Role, type Scope } from '../../shared/contracts/common';
import type { Letter } from '../../shared/contracts/session';
import { ensureDemoAccounts } from '../../server/accounts/demo-account-service';
import { PasswordHasher } from '../../server/accounts/password-hash';
import { allRoutes, createApp } from '../../server/app';
import { readConfig, type Config } from '../../server/config';
import { apiDatabaseLimits, createDataSource } from '../../server/database/data-source';
import { isSchemaReady } from '../../server/database/schema-state';
import { TransactionRunner } from '../../server/database/transaction-runner';
import type { PredictionRunner } from '../../server/engine/prediction-runner';
import { createHouse, type House } from '../../server/house';
import type { RateLimit } from '../../server/http/rate-limits';
import type { RateClass, Route } from '../../server/http/route';
import { createLogger } from '../../server/log';
import { ApiClient } from './api-client';
import { createTestDatabase } from './postgres';

export const TEST_SECRET = 'a signing key only for tests, long enough';
export const TEST_PASSWORD = 'a password only for tests';
/** Holds every role, in the other team: whatever is refused to this account is refused because of the team. */
export const STRANGER = 'stranger@bench.example';

const plenty: RateLimit = { windowSeconds: 60, count: 1_000_000 };
const noLimits: Readonly<Record<RateClass, RateLimit>> = { general: plenty, 'sign-in': plenty, letter: plenty, upload: plenty, compute: plenty, export: plenty };

export interface ApiOptions {
  readonly rateLimits?: Readonly<Record<RateClass, RateLimit>>;
  /** True for the real cost of password hashing; else a cheap one. */
  readonly realHashing?: boolean;
  readonly moreRoutes?: readonly Route[];
  /** Computes predictions in place of the engine's own: to hold them, or to count them. */
  readonly predictionRunner?: PredictionRunner;
  readonly environment?: Readonly<Record<string, string>>;
}

/** The application on a database of its own, with the demonstration accounts and one stranger. */
export class Api {
  readonly url: string;
  readonly config: Config;
  readonly house: House;
  readonly dataSource: DataSource;
  readonly routes: readonly Route[];
  private readonly closers: readonly (() => Promise<unknown>)[];

  private constructor(parts: Pick<Api, 'url' | 'config' | 'house' | 'dataSource' | 'routes'>, closers: readonly (() => Promise<unknown>)[]) {
    this.url = parts.url;
    this.config = parts.config;
    this.house = parts.house;
    this.dataSource = parts.dataSource;
    this.routes = parts.routes;
    this.closers = closers;
  }

  static async start(options: ApiOptions = {}): Promise<Api> {
    const database = await createTestDatabase();
    const folder = mkdtempSync(join(tmpdir(), 'slantwise-api-'));
    const config = readConfig({
      DATABASE_URL: database.url,
      SLANTWISE_DATA: folder,
      SLANTWISE_SECRET: TEST_SECRET,
      SLANTWISE_DEMO: 'on',
      SLANTWISE_DEMO_PASSWORD: TEST_PASSWORD,
      LOG_LEVEL: 'silent',
      WORKERS: '1',
      ...options.environment,
    });
    const dataSource = createDataSource({ url: database.url, ...apiDatabaseLimits });
    await dataSource.initialize();
    await dataSource.runMigrations();
    const hasher = options.realHashing === true ? new PasswordHasher() : new PasswordHasher({ logN: 8, r: 8, p: 1 });
    const ground = { config, logger: createLogger(config), transactions: new TransactionRunner(dataSource), now: () => new Date() };
    const house = createHouse({ ground, hasher, isSchemaReady: () => isSchemaReady(dataSource), predictionRunner: options.predictionRunner });
    await house.start();
    await ensureDemoAccounts(house, TEST_PASSWORD);
    await addStranger(house);
    const app = createApp({ house, checkReplies: true, rateLimits: options.rateLimits ?? noLimits, moreRoutes: options.moreRoutes });
    const server = createServer(app).listen(0, '127.0.0.1');
    await once(server, 'listening');
    const { port } = server.address() as AddressInfo;
    const closers = [
      () => closeServer(server),
      () => house.close(),
      () => dataSource.destroy(),
      () => database.drop(),
      async () => rmSync(folder, { recursive: true, force: true }),
    ];
    const routes = allRoutes(house, options.moreRoutes);
    return new Api({ url: `http://127.0.0.1:${port}`, config, house, dataSource, routes }, closers);
  }

  anonymous(): ApiClient {
    return new ApiClient(this.url);
  }

  /** A browser signed in as this account: `designer@merrow.example` or, for short, `designer`. */
  async signedIn(account: string): Promise<ApiClient> {
    const client = this.anonymous();
    const email = account.includes('@') ? account : `${account}@merrow.example`;
    const answer = await client.post('/api/session', { email, password: TEST_PASSWORD });
    if (answer.status !== 200) throw new Error(`sign-in of ${email} answered ${answer.status}: ${answer.bytes.toString('utf8')}`);
    return client;
  }

  /** A script with a new personal token of this account. */
  async withToken(account: string, scopes: readonly Scope[]): Promise<ApiClient> {
    const client = await this.signedIn(account);
    const answer = await client.post('/api/tokens', { name: 'test', scopes, days: 1 });
    if (answer.status !== 201) throw new Error(`the token was refused: ${answer.bytes.toString('utf8')}`);
    return new ApiClient(this.url, (answer.json as { secret: string }).secret);
  }

  /** Everything the letter box received for an address, newest first. */
  async lettersTo(address: string): Promise<Letter[]> {
    await this.house.passwords.settled();
    await this.house.letters.settled();
    return this.house.letters.received(new Set([address]));
  }

  async query<Row = Record<string, unknown>>(statement: string, parameters: readonly unknown[] = []): Promise<Row[]> {
    return (await this.dataSource.query(statement, [...parameters])) as Row[];
  }

  async close(): Promise<void> {
    for (const closer of this.closers) await closer();
  }
}

async function closeServer(server: Server): Promise<void> {
  const closed = once(server, 'close');
  server.close();
  server.closeAllConnections();
  await closed;
}

async function addStranger({ ground, memberships, people, hasher }: House): Promise<void> {
  const passwordHash = await hasher.hash(TEST_PASSWORD);
  await ground.transactions.run(async (transaction) => {
    const team = await memberships.ensureTeam(transaction, 'Bench');
    const person = await people.create(transaction, { email: STRANGER, name: 'Stranger', passwordHash });
    await memberships.add(transaction, { teamId: team.id, personId: person.id, roles: role.options as Role[] });
  });
}
