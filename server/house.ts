import type { Logger } from 'pino';
import type { Config } from './config';
import type { TransactionRunner } from './database/transaction-runner';

/** What the services of every feature stand on. */
export interface Ground {
  readonly config: Config;
  readonly logger: Logger;
  readonly transactions: TransactionRunner;
  /** Time comes from here, so that tests can move it. */
  readonly now: () => Date;
}

/** The services of all features, made once per process. A feature reaches another one only through these. */
export interface House extends Ground {
  /** Stops what a service keeps running: pools, timers, servers. Last made, first closed. */
  close(): Promise<void>;
}

export function createHouse(ground: Ground): House {
  const closers: (() => Promise<void>)[] = [];
  return {
    ...ground,
    close: async () => {
      for (const closer of closers.reverse()) await closer();
    },
  };
}
