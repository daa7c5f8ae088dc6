import { readConfig, type Config } from './config';
import { apiDatabaseLimits, createDataSource } from './database/data-source';
import { migrateDatabase } from './database/migrate-database';
import { isSchemaReady } from './database/schema-state';
import { TransactionRunner } from './database/transaction-runner';
import { createHouse, type House, type HouseOptions } from './house';
import { createLogger } from './log';

export interface OpenedHouse {
  readonly house: House;
  readonly config: Config;
  /** Closes services and database. */
  close(): Promise<void>;
}

/** The house on the database that the environment names; for every program of the server. @throws ConfigFaults */
export async function openHouse(env: NodeJS.ProcessEnv, options: Pick<HouseOptions, 'predictionRunner'> = {}): Promise<OpenedHouse> {
  const config = readConfig(env);
  const logger = createLogger(config);
  if (config.migrateAtStart) await migrateDatabase(config.databaseUrl);
  const dataSource = createDataSource({ url: config.databaseUrl, ...apiDatabaseLimits });
  await dataSource.initialize();
  const ground = { config, logger, transactions: new TransactionRunner(dataSource), now: () => new Date() };
  const house = createHouse({ ...options, ground, isSchemaReady: () => isSchemaReady(dataSource) });
  const close = async (): Promise<void> => {
    await house.close();
    await dataSource.destroy();
  };
  return { house, config, close };
}

/** Runs a program to its end; a failure is one message on standard error and exit code 1. */
export async function runProgram(work: () => Promise<void>): Promise<void> {
  try {
    await work();
  } catch (error) {
    process.stderr.write(`${error instanceof Error ? error.message : String(error)}\n`);
    process.exitCode = 1;
  }
}
